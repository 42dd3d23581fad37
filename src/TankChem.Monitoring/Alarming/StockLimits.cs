using System.Collections.Frozen;
using System.Reflection;
using System.Text.Json;
using System.Text.Json.Serialization;

namespace TankChem.Monitoring.Alarming;

/// <summary>The stock groups and their limits, from the data file <c>stock-limits.json</c> beside this type; docs/alarms.md shows them with their sources.</summary>
public static class StockLimits
{
    private static readonly JsonSerializerOptions Json = new(JsonSerializerDefaults.Web)
    {
        UnmappedMemberHandling = JsonUnmappedMemberHandling.Disallow,
        RespectRequiredConstructorParameters = true,
        Converters = { new JsonStringEnumConverter(JsonNamingPolicy.CamelCase) },
    };

    /// <summary>All groups, in the order of the data file.</summary>
    public static IReadOnlyList<StockGroup> Groups { get; } = Load();

    private static FrozenDictionary<string, StockGroup> ById { get; } = Groups.ToFrozenDictionary(group => group.Id, StringComparer.Ordinal);

    /// <summary>A group by its id, or null when there is none.</summary>
    public static StockGroup? Find(string id) => ById.GetValueOrDefault(id);

    /// <summary>The limits of several groups together: of each rule the strictest, with the groups that set it.</summary>
    /// <param name="stock">Group ids; an unknown one is a programmer's error, the configuration has checked them.</param>
    public static IReadOnlyList<EffectiveLimit> Strictest(IReadOnlyList<string> stock)
    {
        ArgumentNullException.ThrowIfNull(stock);
        var strictest = new List<EffectiveLimit>();
        foreach (string id in stock.Distinct(StringComparer.Ordinal))
        {
            StockGroup group = Find(id)
                ?? throw new ArgumentException($"There is no stock group \"{id}\". The groups are {string.Join(", ", Groups.Select(known => known.Id))}.", nameof(stock));
            foreach (StockLimit limit in group.Limits)
                Merge(strictest, group, limit);
        }

        return strictest;
    }

    private static void Merge(List<EffectiveLimit> strictest, StockGroup group, StockLimit limit)
    {
        int index = strictest.FindIndex(known => known.Limit.Rule == limit.Rule);
        if (index < 0)
        {
            strictest.Add(new EffectiveLimit(limit, group.InSentence));
            return;
        }

        EffectiveLimit known = strictest[index];
        double stricterBy = limit.Side == LimitSide.High ? known.Limit.Value - limit.Value : limit.Value - known.Limit.Value;
        if (stricterBy > 0)
            strictest[index] = new EffectiveLimit(limit, group.InSentence);
        else if (stricterBy == 0)
            strictest[index] = new EffectiveLimit(limit.RaiseAt < known.Limit.RaiseAt ? limit : known.Limit, $"{known.SetBy} and {group.InSentence}");
    }

    private static List<StockGroup> Load()
    {
        using Stream stream = Assembly.GetExecutingAssembly().GetManifestResourceStream("stock-limits.json")
            ?? throw new InvalidOperationException("The resource stock-limits.json is not built into TankChem.Monitoring.");
        return JsonSerializer.Deserialize<List<StockGroup>>(stream, Json)
            ?? throw new InvalidOperationException("The resource stock-limits.json is empty.");
    }
}

/// <summary>A limit that holds at a place.</summary>
/// <param name="Limit">The limit.</param>
/// <param name="SetBy">The groups that set it, as in a sentence.</param>
public sealed record EffectiveLimit(StockLimit Limit, string SetBy);
