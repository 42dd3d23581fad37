using System.Net;
using System.Text.Json;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Configuration;

/// <summary>Reads and validates a configuration text; pure.</summary>
public static class ConfigurationReader
{
    private const string NoSignIn = "other machines could reach it, and there is no sign-in yet: anybody on the network could acknowledge alarms; right would be 127.0.0.1";

    private static readonly JsonDocumentOptions Options = new() { CommentHandling = JsonCommentHandling.Skip, AllowTrailingCommas = true, MaxDepth = 32 };

    /// <summary>Reads a configuration; finds every fault at once.</summary>
    /// <param name="json">The file's text; comments and trailing commas are allowed.</param>
    public static ConfigurationResult Read(string json)
    {
        ArgumentNullException.ThrowIfNull(json);
        var notes = new ConfigurationNotes();
        try
        {
            using JsonDocument document = JsonDocument.Parse(json.TrimStart('\uFEFF'), Options);
            ServiceConfiguration configuration = Read(document.RootElement, notes);
            return new ConfigurationResult(notes.Faults.Count == 0 ? configuration : null, notes.Faults, notes.Warnings);
        }
        catch (JsonException e)
        {
            notes.Fault("$", $"not JSON: line {e.LineNumber + 1}, character {e.BytePositionInLine + 1}: {e.Message.Split(" LineNumber:")[0]}");
            return new ConfigurationResult(null, notes.Faults, notes.Warnings);
        }
    }

    private static ServiceConfiguration Read(JsonElement element, ConfigurationNotes notes)
    {
        var root = new ConfigurationNode(element, "$", notes, "sites", "mqtt", "http", "storage");
        var sites = new List<SiteDefinition>();
        foreach ((JsonElement item, string path) in root.Items("sites"))
        {
            if (SiteSection.Read(item, path, notes) is not { } site)
                continue;
            if (sites.Exists(s => s.Id == site.Id))
                notes.Fault($"{path}.id", $"\"{site.Id}\" stands twice");
            else
                sites.Add(site);
        }

        if (sites.Count == 0)
            notes.Warning("$.sites", "no site: whatever is published is kept, but no alarm can be raised");
        var mqtt = Section(root, "mqtt", notes, "embedded", "outside", "mappings");
        var http = Section(root, "http", notes, "url");
        var storage = Section(root, "storage", notes, "sqlite");
        var defaults = new ServiceConfiguration();
        return new ServiceConfiguration
        {
            Sites = sites,
            EmbeddedBroker = Embedded(mqtt, notes),
            OutsideBroker = Outside(mqtt, notes),
            Mappings = mqtt is null ? [] : [.. mqtt.Items("mappings").Select(m => Mapping(m.Element, m.Path, notes)).OfType<TopicMapping>()],
            HttpUrl = Url(http, notes) ?? defaults.HttpUrl,
            SqliteFile = storage?.Text("sqlite") ?? defaults.SqliteFile,
        };
    }

    private static ConfigurationNode? Section(ConfigurationNode parent, string key, ConfigurationNotes notes, params string[] keys) =>
        parent.Element(key) is { } element ? new ConfigurationNode(element, parent.PathOf(key), notes, keys) : null;

    private static EmbeddedBrokerOptions? Embedded(ConfigurationNode? mqtt, ConfigurationNotes notes)
    {
        var defaults = new EmbeddedBrokerOptions();
        if (mqtt?.Element("embedded") is not { } element)
            return mqtt is not null && mqtt.Has("outside") ? null : defaults;
        if (element.ValueKind == JsonValueKind.False)
            return null;
        var node = new ConfigurationNode(element, mqtt.PathOf("embedded"), notes, "port", "bind");
        string bind = node.Text("bind") ?? defaults.Bind;
        if (!IsLoopback(bind))
            notes.Fault(node.PathOf("bind"), $"\"{bind}\": {NoSignIn}");
        return new EmbeddedBrokerOptions { Port = Port(node, defaults.Port, notes), Bind = bind };
    }

    private static OutsideBrokerOptions? Outside(ConfigurationNode? mqtt, ConfigurationNotes notes)
    {
        if (mqtt?.Element("outside") is not { } element)
            return null;
        var node = new ConfigurationNode(element, mqtt.PathOf("outside"), notes, "host", "port", "clientId", "user", "password", "tls");
        bool tls = node.Flag("tls");
        if (node.Has("password") && !tls)
            notes.Warning(node.PathOf("password"), "the password goes over the network in the clear; tls: true keeps it secret");
        return node.Text("host", required: true) is not { } host
            ? null
            : new OutsideBrokerOptions
            {
                Host = host,
                Port = Port(node, tls ? 8883 : 1883, notes),
                ClientId = node.Text("clientId") ?? "tankchem",
                User = node.Text("user"),
                Password = node.Text("password"),
                Tls = tls,
            };
    }

    private static TopicMapping? Mapping(JsonElement element, string path, ConfigurationNotes notes)
    {
        var node = new ConfigurationNode(element, path, notes, "topic", "site", "place", "quantity", "probe", "value", "time", "unit", "factor", "offset");
        string? topic = node.Text("topic", required: true);
        string? site = Id(node, "site", notes), place = Id(node, "place", notes), quantity = Id(node, "quantity", notes);
        string probe = node.Has("probe") ? Id(node, "probe", notes) ?? SeriesKey.MainProbe : SeriesKey.MainProbe;
        string? unit = node.Text("unit");
        if (unit is not null && quantity is not null && !UnitConverter.TryConvert(quantity, unit, 1, out _, out string? fault))
            notes.Fault(node.PathOf("unit"), fault!);
        if (topic is not null && topic.StartsWith("tankchem/", StringComparison.Ordinal))
            notes.Fault(node.PathOf("topic"), "topics under tankchem/ have their own meaning and are not mapped");
        string value = node.Text("value") ?? "";
        string? time = node.Text("time");
        foreach ((string key, string? pointer) in new[] { ("value", value), ("time", time) })
        {
            if (pointer is { Length: > 0 } && pointer[0] != '/')
                notes.Fault(node.PathOf(key), $"\"{pointer}\" is no JSON Pointer; right would be like /data/ph");
        }

        double factor = node.Number("factor", -1e12, 1e12) ?? 1;
        if (factor == 0)
            notes.Fault(node.PathOf("factor"), "0 would make every value the same");
        return topic is null || site is null || place is null || quantity is null
            ? null
            : new TopicMapping
            {
                Topic = topic,
                Series = new SeriesKey(new PlaceKey(site, place), quantity, probe),
                Value = value,
                Time = time,
                Unit = unit,
                Factor = factor,
                Offset = node.Number("offset", -1e12, 1e12) ?? 0,
            };
    }

    private static string? Id(ConfigurationNode node, string key, ConfigurationNotes notes)
    {
        if (node.Text(key, required: true) is not { } id)
            return null;
        if (PlaceNames.IsValidId(id))
            return id;
        notes.Fault(node.PathOf(key), $"\"{id}\" is no id: 1 to 64 of a-z 0-9 - _");
        return null;
    }

    private static int Port(ConfigurationNode node, int fallback, ConfigurationNotes notes)
    {
        double port = node.Number("port", 1, 65535) ?? fallback;
        if (port != Math.Floor(port))
            notes.Fault(node.PathOf("port"), "must be a whole number");
        return (int)port;
    }

    private static string? Url(ConfigurationNode? http, ConfigurationNotes notes)
    {
        if (http?.Text("url") is not { } text)
            return null;
        if (!Uri.TryCreate(text, UriKind.Absolute, out Uri? uri) || uri.Scheme != Uri.UriSchemeHttp)
            notes.Fault(http.PathOf("url"), $"\"{text}\" is no address to listen on; right would be like http://127.0.0.1:5080");
        else if (!IsLoopback(uri.Host))
            notes.Fault(http.PathOf("url"), $"\"{text}\": {NoSignIn}");
        else
            return text;
        return null;
    }

    private static bool IsLoopback(string host) => host == "localhost" || (IPAddress.TryParse(host.Trim('[', ']'), out IPAddress? address) && IPAddress.IsLoopback(address));
}
