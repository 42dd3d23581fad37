using System.Text.Json;

namespace TankChem.Monitoring.Bodies;

/// <summary>Reads a small JSON object strictly: no member twice, none unknown, a fault in words instead of an exception.</summary>
internal static class JsonObjectReader
{
    private static readonly JsonDocumentOptions Options = new() { MaxDepth = 8 };

    /// <summary>Reads the object's members.</summary>
    /// <param name="utf8">The body.</param>
    /// <param name="known">Names that may stand in it.</param>
    /// <param name="members">Its members.</param>
    /// <param name="fault">What is wrong and what would be right; null when read.</param>
    public static bool TryRead(ReadOnlyMemory<byte> utf8, IReadOnlyList<string> known, out Dictionary<string, JsonElement> members, out string? fault)
    {
        members = new Dictionary<string, JsonElement>(StringComparer.Ordinal);
        try
        {
            using JsonDocument document = JsonDocument.Parse(utf8, Options);
            return TryRead(document.RootElement, "the body", known, members, out fault);
        }
        catch (JsonException e)
        {
            fault = $"The body is not JSON: {e.Message}";
            return false;
        }
    }

    /// <summary>Reads an object inside another.</summary>
    public static bool TryRead(JsonElement element, string what, IReadOnlyList<string> known, Dictionary<string, JsonElement> members, out string? fault)
    {
        fault = null;
        if (element.ValueKind != JsonValueKind.Object)
        {
            fault = $"{what} must be a JSON object with {string.Join(", ", known)}.";
            return false;
        }

        foreach (JsonProperty member in element.EnumerateObject())
        {
            if (!known.Contains(member.Name, StringComparer.Ordinal))
                fault = $"{member.Name}: not known in {what}; right would be {string.Join(", ", known)}.";
            else if (!members.TryAdd(member.Name, member.Value.Clone()))
                fault = $"{member.Name}: stands twice in {what}.";
            if (fault is not null)
                return false;
        }

        return true;
    }

    /// <summary>A member as text; null when it is absent or null.</summary>
    public static bool TryText(Dictionary<string, JsonElement> members, string name, out string? text, out string? fault)
    {
        text = null;
        fault = null;
        if (!members.TryGetValue(name, out JsonElement element) || element.ValueKind == JsonValueKind.Null)
            return true;
        if (element.ValueKind != JsonValueKind.String)
        {
            fault = $"{name}: must be a text.";
            return false;
        }

        text = element.GetString();
        return true;
    }
}
