using System.Text.Json;

namespace TankChem.Monitoring.Configuration;

/// <summary>A place in the file, its path, and where its faults go. Every getter notes what is wrong and lets the reading go on.</summary>
internal sealed class ConfigurationNode
{
    private readonly Dictionary<string, JsonElement> members = new(StringComparer.Ordinal);
    private readonly ConfigurationNotes notes;

    public ConfigurationNode(JsonElement element, string path, ConfigurationNotes notes, params string[] keys)
    {
        Path = path;
        this.notes = notes;
        if (element.ValueKind != JsonValueKind.Object)
        {
            notes.Fault(path, $"must be an object with {string.Join(", ", keys)}");
            return;
        }

        foreach (JsonProperty member in element.EnumerateObject())
        {
            if (!keys.Contains(member.Name, StringComparer.Ordinal))
                notes.Fault($"{path}.{member.Name}", $"unknown key; {Nearest(member.Name, keys)}");
            else if (!members.TryAdd(member.Name, member.Value))
                notes.Fault($"{path}.{member.Name}", "the key stands twice");
        }
    }

    /// <summary>JSON path of this object.</summary>
    public string Path { get; }

    public string PathOf(string key) => $"{Path}.{key}";

    public bool Has(string key) => members.ContainsKey(key);

    public JsonElement? Element(string key) => members.TryGetValue(key, out JsonElement element) ? element : null;

    public string? Text(string key, bool required = false)
    {
        if (!members.TryGetValue(key, out JsonElement element))
        {
            if (required)
                notes.Fault(PathOf(key), "missing");
            return null;
        }

        if (element.ValueKind == JsonValueKind.String && !string.IsNullOrWhiteSpace(element.GetString()))
            return element.GetString();
        notes.Fault(PathOf(key), "must be a text");
        return null;
    }

    public double? Number(string key, double min, double max)
    {
        if (!members.TryGetValue(key, out JsonElement element))
            return null;
        if (element.ValueKind == JsonValueKind.Number && element.TryGetDouble(out double value) && value >= min && value <= max)
            return value;
        notes.Fault(PathOf(key), string.Create(System.Globalization.CultureInfo.InvariantCulture, $"must be a number from {min} to {max}"));
        return null;
    }

    public bool Flag(string key)
    {
        if (!members.TryGetValue(key, out JsonElement element))
            return false;
        if (element.ValueKind is JsonValueKind.True or JsonValueKind.False)
            return element.GetBoolean();
        notes.Fault(PathOf(key), "must be true or false");
        return false;
    }

    public IEnumerable<(JsonElement Element, string Path)> Items(string key)
    {
        if (!members.TryGetValue(key, out JsonElement element))
            return [];
        if (element.ValueKind == JsonValueKind.Array)
            return element.EnumerateArray().Select((item, at) => (item, $"{PathOf(key)}[{at}]"));
        notes.Fault(PathOf(key), "must be a list");
        return [];
    }

    private static string Nearest(string key, string[] known)
    {
        string? near = known.Select(k => (k, d: Distance(key, k))).Where(c => c.d <= 3).OrderBy(c => c.d).Select(c => c.k).FirstOrDefault();
        return near is null ? $"known here are {string.Join(", ", known)}" : $"is {near} meant?";
    }

    private static int Distance(string a, string b)
    {
        int[] row = [.. Enumerable.Range(0, b.Length + 1)];
        for (int i = 1; i <= a.Length; i++)
        {
            int diagonal = row[0];
            row[0] = i;
            for (int j = 1; j <= b.Length; j++)
            {
                int cost = char.ToLowerInvariant(a[i - 1]) == char.ToLowerInvariant(b[j - 1]) ? 0 : 1;
                (diagonal, row[j]) = (row[j], Math.Min(Math.Min(row[j] + 1, row[j - 1] + 1), diagonal + cost));
            }
        }

        return row[b.Length];
    }
}
