using System.Diagnostics.CodeAnalysis;
using System.Text;
using System.Text.Json;

namespace TankChem.Mqtt.Payloads;

/// <summary>Reads a JSON object <c>{"value": 7.24, "unit": "pH", "time": "2026-05-01T10:00:00Z"}</c>.</summary>
internal static class JsonReading
{
    private const int UnitLengthMax = 32;
    private const string Right = "{\"value\": 7.24, \"unit\": \"pH\", \"time\": \"2026-05-01T10:00:00Z\"}, unit and time optional, would be right";

    /// <summary>Reads one; throws <see cref="JsonException"/> where it is no JSON.</summary>
    public static bool TryRead(ReadOnlySpan<byte> utf8, out double value, out string? unit, out DateTimeOffset? time, [NotNullWhen(false)] out string? fault)
    {
        double? found = null;
        value = 0;
        unit = null;
        time = null;
        fault = null;
        bool unitSeen = false, timeSeen = false;
        var names = default(JsonNames);
        var reader = new Utf8JsonReader(utf8, JsonNames.Options);
        reader.Read();
        while (fault is null && reader.Read() && reader.TokenType == JsonTokenType.PropertyName)
        {
            if (reader.ValueTextEquals("value"u8))
                fault = found is null ? ReadValue(ref reader, out found) : JsonNames.Twice("value");
            else if (reader.ValueTextEquals("unit"u8))
                fault = Once(ref unitSeen, "unit") ?? ReadUnit(ref reader, out unit);
            else if (reader.ValueTextEquals("time"u8))
                fault = Once(ref timeSeen, "time") ?? ReadTime(ref reader, out time);
            else
                fault = names.SkipUnknown(ref reader);
        }

        // Anything behind the closing brace makes the reader throw.
        if (fault is null)
            reader.Read();
        if (fault is null && found is null)
            fault = $"payload: has no member \"value\"; {Right}.";
        value = found ?? 0;
        return fault is null;
    }

    /// <summary>Reads a unit; null stands for none.</summary>
    public static string? ReadUnit(ref Utf8JsonReader reader, out string? unit)
    {
        unit = null;
        reader.Read();
        if (reader.TokenType == JsonTokenType.Null)
            return null;
        if (reader.TokenType != JsonTokenType.String)
            return $"payload: the unit is {Kind(reader.TokenType)}; a text, as \"mg/L\", would be right.";
        unit = reader.GetString()!;
        return unit.Length is > 0 and <= UnitLengthMax ? null : $"payload: the unit is {unit.Length} characters long; 1 to {UnitLengthMax} would be right, or none at all.";
    }

    /// <summary>What a JSON value is, in words.</summary>
    public static string Kind(JsonTokenType token) => token switch
    {
        JsonTokenType.String => "a text",
        JsonTokenType.Number => "a number",
        JsonTokenType.True or JsonTokenType.False => "true or false",
        JsonTokenType.Null => "null",
        JsonTokenType.StartArray => "an array",
        JsonTokenType.StartObject => "an object",
        _ => "no value",
    };

    private static string? Once(ref bool seen, string name)
    {
        if (seen)
            return JsonNames.Twice(name);
        seen = true;
        return null;
    }

    private static string? ReadValue(ref Utf8JsonReader reader, out double? value)
    {
        value = null;
        reader.Read();
        if (reader.TokenType != JsonTokenType.Number)
            return $"payload: \"value\" is {Kind(reader.TokenType)}; a number without quotes would be right.";
        double number = reader.GetDouble();
        if (!double.IsFinite(number))
            return "payload: \"value\" is larger than any number here can be.";
        value = number;
        return null;
    }

    private static string? ReadTime(ref Utf8JsonReader reader, out DateTimeOffset? time)
    {
        time = null;
        reader.Read();
        switch (reader.TokenType)
        {
            case JsonTokenType.Null:
                return null;
            case JsonTokenType.Number:
                if (!TimeText.TryUnix(reader.GetDouble(), out DateTimeOffset unix, out string? fault))
                    return $"payload: \"time\" {fault}.";
                time = unix;
                return null;
            case JsonTokenType.String:
                ReadOnlySpan<byte> text = reader.ValueIsEscaped ? Encoding.UTF8.GetBytes(reader.GetString()!) : reader.ValueSpan;
                if (!TimeText.TryRfc3339(text, out DateTimeOffset stamp))
                    return $"payload: \"time\" is \"{Topics.TopicText.Shown(Encoding.UTF8.GetString(text[..Math.Min(text.Length, 40)]))}\"; RFC 3339 with its zone, as 2026-05-01T10:00:00Z, or Unix seconds would be right.";
                time = stamp;
                return null;
            default:
                return $"payload: \"time\" is {Kind(reader.TokenType)}; RFC 3339 or Unix seconds would be right.";
        }
    }
}
