using System.Text.Json;

namespace TankChem.Mqtt.Payloads;

/// <summary>Watches that no JSON object names a member twice: which of the two counts would be a guess.</summary>
internal struct JsonNames
{
    private HashSet<string>? seen;

    /// <summary>Reader options of all payloads: no comments, no trailing commas, shallow.</summary>
    public static JsonReaderOptions Options { get; } = new() { MaxDepth = 16 };

    /// <summary>The fault of a member that stands twice.</summary>
    public static string Twice(string name) => $"payload: the member \"{Topics.TopicText.Shown(name)}\" stands twice; once would be right.";

    /// <summary>Notes a member that this service has no use for, and skips its value.</summary>
    /// <returns>The fault, or null.</returns>
    public string? SkipUnknown(ref Utf8JsonReader reader)
    {
        string name = reader.GetString()!;
        seen ??= new HashSet<string>(StringComparer.Ordinal);
        if (!seen.Add(name))
            return Twice(name);
        reader.Read();
        return SkipValue(ref reader);
    }

    private static string? SkipValue(ref Utf8JsonReader reader)
    {
        if (reader.TokenType is not (JsonTokenType.StartObject or JsonTokenType.StartArray))
            return null;
        var open = new Stack<HashSet<string>?>();
        do
        {
            switch (reader.TokenType)
            {
                case JsonTokenType.StartObject:
                    open.Push(new HashSet<string>(StringComparer.Ordinal));
                    break;
                case JsonTokenType.StartArray:
                    open.Push(null);
                    break;
                case JsonTokenType.EndObject or JsonTokenType.EndArray:
                    open.Pop();
                    break;
                case JsonTokenType.PropertyName when reader.GetString() is { } name && !open.Peek()!.Add(name):
                    return Twice(name);
            }
        }
        while (open.Count > 0 && reader.Read());
        return null;
    }
}
