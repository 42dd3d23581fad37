using System.Globalization;
using System.Text.Json;
using TankChem.Monitoring.Configuration;
using TankChem.Monitoring.Readings;
using TankChem.Mqtt.Topics;

namespace TankChem.Mqtt.Payloads;

/// <summary>Reads a payload of another form with the mappings of the configuration.</summary>
internal static class MappedPayload
{
    private static readonly JsonDocumentOptions Options = new() { MaxDepth = 32, AllowDuplicateProperties = false };

    /// <summary>Reads one; throws <see cref="JsonException"/> where it is no JSON.</summary>
    /// <returns>What could not be taken, or null.</returns>
    public static string? Read(ReadOnlyMemory<byte> utf8, IReadOnlyList<TopicMapping> mappings, out List<ParsedReading> readings)
    {
        readings = new List<ParsedReading>(mappings.Count);
        string? fault = null;
        using JsonDocument document = JsonDocument.Parse(utf8, Options);
        foreach (TopicMapping mapping in mappings)
        {
            string? wrong = ReadOne(document.RootElement, mapping, out ParsedReading reading);
            if (wrong is null)
                readings.Add(reading);
            else
                fault ??= $"payload: mapping \"{mapping.Topic}\": {wrong}.";
        }

        return fault;
    }

    private static string? ReadOne(JsonElement root, TopicMapping mapping, out ParsedReading reading)
    {
        reading = default;
        if (Find(root, mapping.Value, out JsonElement valueElement) is { } noValue)
            return noValue;
        if (ReadValue(valueElement, mapping, out double value) is { } wrongValue)
            return wrongValue;
        DateTimeOffset? time = null;
        if (mapping.Time is { } pointer)
        {
            if (Find(root, pointer, out JsonElement timeElement) is { } noTime)
                return noTime;
            if (ReadTime(timeElement, pointer, out time) is { } wrongTime)
                return wrongTime;
        }

        reading = new ParsedReading(mapping.Series, value, mapping.Unit, time);
        return null;
    }

    private static string? ReadValue(JsonElement element, TopicMapping mapping, out double value)
    {
        string? fault = null;
        value = 0;
        switch (element.ValueKind)
        {
            case JsonValueKind.Number:
                value = element.GetDouble();
                break;
            case JsonValueKind.True or JsonValueKind.False:
                value = element.GetBoolean() ? 1 : 0;
                break;
            case JsonValueKind.String when PlainNumber.TryRead(System.Text.Encoding.UTF8.GetBytes(element.GetString()!), out value, out fault):
                break;
            case JsonValueKind.String:
                return $"at \"{mapping.Value}\" {fault["payload: ".Length..].TrimEnd('.')}";
            default:
                return $"at \"{mapping.Value}\" stands {element.ValueKind}; a number would be right";
        }

        value = value * mapping.Factor + mapping.Offset;
        return double.IsFinite(value) ? null : $"the number at \"{mapping.Value}\", by factor and offset, is larger than any number here can be";
    }

    private static string? ReadTime(JsonElement element, string pointer, out DateTimeOffset? time)
    {
        time = null;
        if (element.ValueKind == JsonValueKind.Number)
        {
            if (!TimeText.TryUnix(element.GetDouble(), out DateTimeOffset unix, out string? fault))
                return $"time at \"{pointer}\": {fault}";
            time = unix;
            return null;
        }

        if (element.ValueKind != JsonValueKind.String || !TimeText.TryRfc3339(System.Text.Encoding.UTF8.GetBytes(element.GetString()!), out DateTimeOffset stamp))
            return $"time at \"{pointer}\" is neither RFC 3339 with its zone nor Unix seconds";
        time = stamp;
        return null;
    }

    /// <summary>Follows a JSON Pointer (RFC 6901).</summary>
    private static string? Find(JsonElement root, string pointer, out JsonElement found)
    {
        found = root;
        if (pointer.Length == 0)
            return null;
        foreach (string token in pointer[1..].Split('/'))
        {
            string name = token.Replace("~1", "/", StringComparison.Ordinal).Replace("~0", "~", StringComparison.Ordinal);
            bool there = found.ValueKind switch
            {
                JsonValueKind.Object => found.TryGetProperty(name, out found),
                JsonValueKind.Array => TryItem(name, ref found),
                _ => false,
            };
            if (!there)
                return $"there is nothing at \"{TopicText.Shown(pointer)}\"";
        }

        return null;
    }

    private static bool TryItem(string name, ref JsonElement element)
    {
        // RFC 6901: digits without a leading zero.
        if (!int.TryParse(name, NumberStyles.None, CultureInfo.InvariantCulture, out int index) || (name.Length > 1 && name[0] == '0') || index >= element.GetArrayLength())
            return false;
        element = element[index];
        return true;
    }
}
