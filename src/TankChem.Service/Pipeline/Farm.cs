using System.Collections.Concurrent;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;

namespace TankChem.Service.Pipeline;

/// <summary>The live farm: written by the pipeline after each commit, read by everybody.</summary>
public sealed class Farm : IFarm
{
    private readonly ConcurrentDictionary<PlaceKey, PlaceSnapshot> places = new();
    private readonly ConcurrentDictionary<string, string> troubles = new(StringComparer.Ordinal);
    private readonly TimeProvider clock;
    private long version;
    private long unreadable;
    private Sorted sorted = new(-1, []);

    /// <summary>An empty farm.</summary>
    public Farm(TimeProvider clock, bool isDemo)
    {
        this.clock = clock;
        IsDemo = isDemo;
    }

    /// <inheritdoc/>
    public bool IsDemo { get; }

    /// <inheritdoc/>
    public long Version => Interlocked.Read(ref version);

    /// <inheritdoc/>
    public long UnreadableCount => Interlocked.Read(ref unreadable);

    /// <inheritdoc/>
    public DateTimeOffset Now => clock.GetUtcNow();

    /// <inheritdoc/>
    public IReadOnlyList<string> ServiceTroubles => [.. troubles.OrderBy(t => t.Key, StringComparer.Ordinal).Select(t => t.Value)];

    /// <inheritdoc/>
    public IReadOnlyList<PlaceSnapshot> Places
    {
        get
        {
            long current = Version;
            Sorted known = Volatile.Read(ref sorted);
            if (known.Version == current)
                return known.Places;

            PlaceSnapshot[] fresh = [.. places.Values];
            Array.Sort(fresh, WorstFirst);
            Volatile.Write(ref sorted, new Sorted(current, fresh));
            return fresh;
        }
    }

    /// <inheritdoc/>
    public PlaceSnapshot? Find(PlaceKey key) => places.GetValueOrDefault(key);

    /// <summary>Puts a place's newest state in.</summary>
    public void Put(PlaceSnapshot snapshot)
    {
        places[snapshot.Definition.Key] = snapshot;
        Interlocked.Increment(ref version);
    }

    /// <summary>Says what is wrong with the service itself, or (null) that it is no longer.</summary>
    public void SetTrouble(string about, string? sentence)
    {
        bool changed = sentence is null ? troubles.TryRemove(about, out _) : !troubles.TryGetValue(about, out string? old) || old != sentence;
        if (sentence is not null)
            troubles[about] = sentence;
        if (changed)
            Interlocked.Increment(ref version);
    }

    /// <summary>Counts messages that could not be read.</summary>
    public void CountUnreadable(int count)
    {
        if (count == 0)
            return;
        Interlocked.Add(ref unreadable, count);
        Interlocked.Increment(ref version);
    }

    private static int WorstFirst(PlaceSnapshot a, PlaceSnapshot b)
    {
        int byUrgency = b.Urgency.CompareTo(a.Urgency);
        if (byUrgency != 0)
            return byUrgency;
        int bySite = string.CompareOrdinal(a.Definition.Key.Site, b.Definition.Key.Site);
        return bySite != 0 ? bySite : string.CompareOrdinal(a.Definition.Key.Place, b.Definition.Key.Place);
    }

    private sealed record Sorted(long Version, IReadOnlyList<PlaceSnapshot> Places);
}
