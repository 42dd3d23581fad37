using System.Globalization;
using System.Text.Json;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Configuration;

/// <summary>Reads a tank or a loop.</summary>
internal static class PlaceSection
{
    private static readonly string[] Keys =
        ["id", "name", "loop", "volume", "salinity", "stock", "ions", "hardness", "co2Injection", "gasHours", "lightHours", "airCo2Ppm", "probes"];

    private static readonly string[] IonKeys = ["calcium", "magnesium", "sodium", "potassium", "chloride", "sulfate"];

    private static readonly string[] ProbeKeys = ["quantity", "probe", "unit", "u", "driftPerDay", "oldestUsed", "calibratedAt"];

    public static PlaceDefinition? Read(JsonElement element, string path, PlaceKind kind, string siteId, ConfigurationNotes notes)
    {
        var node = new ConfigurationNode(element, path, notes, Keys);
        string? id = node.Text("id", required: true);
        if (id is null || !IsUsableId(id, node.PathOf("id"), notes))
            return null;
        if (kind == PlaceKind.Loop && node.Has("loop"))
            notes.Fault(node.PathOf("loop"), "a loop is in no other loop");
        if (node.Has("ions") && node.Has("hardness"))
            notes.Fault(node.PathOf("hardness"), "give the ions or the hardness, not both");
        IReadOnlyList<string> stock = Stock(node, notes);
        bool injection = node.Flag("co2Injection");
        if (kind == PlaceKind.Tank && stock.Count == 0)
            notes.Warning(node.Path, $"{id} has no stock: no limit holds there, so it can raise no alarm about its water");
        if (injection && !node.Has("gasHours"))
            notes.Warning(node.Path, $"{id} has CO2 injection without gasHours: no alarm can tell a valve that is stuck open from one that should be open");
        return new PlaceDefinition
        {
            Key = new PlaceKey(siteId, id),
            Kind = kind,
            Name = node.Text("name") ?? id,
            Loop = node.Text("loop"),
            VolumeM3 = Measure(node, "volume", notes, MeasureText.TryVolume),
            Salinity = node.Number("salinity", 0, 60),
            Ions = Ions(node, notes),
            HardnessMmolL = Measure(node, "hardness", notes, MeasureText.TryHardness),
            Stock = stock,
            Co2Injection = injection,
            GasHours = Hours(node, "gasHours", notes),
            LightHours = Hours(node, "lightHours", notes),
            AirCo2Ppm = node.Number("airCo2Ppm", 1, 100_000),
            Probes = [.. node.Items("probes").Select(p => Probe(p.Element, p.Path, notes)).OfType<ProbeDefinition>()],
        };
    }

    public static bool IsUsableId(string id, string path, ConfigurationNotes notes)
    {
        if (!PlaceNames.IsValidId(id))
        {
            notes.Fault(path, $"\"{id}\" is no id: 1 to 64 of a-z 0-9 - _");
            return false;
        }

        if (id != PlaceKey.WholeSite)
            return true;
        notes.Fault(path, $"\"{id}\" is reserved for what holds for the whole site");
        return false;
    }

    private static double? Measure(ConfigurationNode node, string key, ConfigurationNotes notes, TryMeasure read)
    {
        if (node.Text(key) is not { } text)
            return null;
        if (!read(text, out double value, out string? fault))
        {
            notes.Fault(node.PathOf(key), fault!);
            return null;
        }

        if (value > 0)
            return value;
        notes.Fault(node.PathOf(key), "must be more than 0");
        return null;
    }

    private static List<string> Stock(ConfigurationNode node, ConfigurationNotes notes)
    {
        if (node.Element("stock") is not { } element)
            return [];
        IEnumerable<(JsonElement Element, string Path)> items = element.ValueKind == JsonValueKind.Array ? node.Items("stock") : [(element, node.PathOf("stock"))];
        var stock = new List<string>();
        foreach ((JsonElement item, string path) in items)
        {
            string? id = item.ValueKind == JsonValueKind.String ? item.GetString() : null;
            if (id is null || !StockLimits.Groups.Any(g => g.Id == id))
                notes.Fault(path, $"{(id is null ? "must be a stock group" : $"\"{id}\" is no stock group")}; known are {string.Join(", ", StockLimits.Groups.Select(g => g.Id))}");
            else if (!stock.Contains(id, StringComparer.Ordinal))
                stock.Add(id);
        }

        return stock;
    }

    private static IonContent? Ions(ConfigurationNode place, ConfigurationNotes notes)
    {
        if (place.Element("ions") is not { } element)
            return null;
        var node = new ConfigurationNode(element, place.PathOf("ions"), notes, IonKeys);
        double? Ion(string key)
        {
            if (node.Text(key) is not { } text)
                return null;
            if (MeasureText.TryMassPerLitre(text, out double value, out string? fault))
                return value;
            notes.Fault(node.PathOf(key), fault!);
            return null;
        }

        return new IonContent
        {
            CalciumMgL = Ion("calcium"),
            MagnesiumMgL = Ion("magnesium"),
            SodiumMgL = Ion("sodium"),
            PotassiumMgL = Ion("potassium"),
            ChlorideMgL = Ion("chloride"),
            SulfateMgL = Ion("sulfate"),
        };
    }

    private static DailyHours? Hours(ConfigurationNode place, string key, ConfigurationNotes notes)
    {
        if (place.Element(key) is not { } element)
            return null;
        var node = new ConfigurationNode(element, place.PathOf(key), notes, "start", "end");
        TimeOnly? Time(string end)
        {
            if (node.Text(end, required: true) is not { } text)
                return null;
            if (TimeOnly.TryParseExact(text, ["HH:mm", "H:mm"], CultureInfo.InvariantCulture, DateTimeStyles.None, out TimeOnly time))
                return time;
            notes.Fault(node.PathOf(end), $"\"{text}\" is not a time of day; right would be like 09:00");
            return null;
        }

        return Time("start") is { } from && Time("end") is { } to ? new DailyHours(from, to) : null;
    }

    private static ProbeDefinition? Probe(JsonElement element, string path, ConfigurationNotes notes)
    {
        var node = new ConfigurationNode(element, path, notes, ProbeKeys);
        string? quantity = node.Text("quantity", required: true);
        if (quantity is null)
            return null;
        string probe = node.Text("probe") ?? SeriesKey.MainProbe;
        if (!PlaceNames.IsValidId(quantity))
            notes.Fault(node.PathOf("quantity"), $"\"{quantity}\" is no quantity: 1 to 64 of a-z 0-9 - _");
        if (!PlaceNames.IsValidId(probe))
            notes.Fault(node.PathOf("probe"), $"\"{probe}\" is no id: 1 to 64 of a-z 0-9 - _");
        string? unit = node.Text("unit");
        if (unit is not null && !UnitConverter.TryConvert(quantity, unit, 1, out _, out string? fault))
            notes.Fault(node.PathOf("unit"), fault!);
        TimeSpan? oldest = null;
        if (node.Text("oldestUsed") is { } text)
        {
            if (MeasureText.TryDuration(text, out TimeSpan span, out string? durationFault))
                oldest = span;
            else
                notes.Fault(node.PathOf("oldestUsed"), durationFault!);
        }

        DateTimeOffset? calibrated = null;
        if (node.Text("calibratedAt") is { } when)
        {
            if (DateTimeOffset.TryParse(when, CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal | DateTimeStyles.AdjustToUniversal, out DateTimeOffset at))
                calibrated = at;
            else
                notes.Fault(node.PathOf("calibratedAt"), $"\"{when}\" is not a time; right would be like 2026-05-01T10:00:00Z");
        }

        return new ProbeDefinition
        {
            Quantity = quantity,
            Probe = probe,
            Unit = unit,
            StandardUncertainty = node.Number("u", 0, 1e9),
            DriftPerDay = node.Number("driftPerDay", 0, 1e9),
            OldestUsed = oldest,
            CalibratedAt = calibrated,
        };
    }

    private delegate bool TryMeasure(string text, out double value, out string? fault);
}
