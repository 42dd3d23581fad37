using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Ports;

/// <summary>What is on disk. All times UTC; ranges are half open, from ≤ t &lt; to.</summary>
public interface IHistory
{
    /// <summary>Minimum, mean and maximum of a quantity (read or computed) in at most <paramref name="points"/> equal buckets; empty ones left out.</summary>
    Task<IReadOnlyList<TrendBucket>> TrendAsync(PlaceKey place, string quantity, DateTimeOffset from, DateTimeOffset to, int points, CancellationToken cancellationToken);

    /// <summary>Raw readings of a quantity, oldest first, at most <paramref name="limit"/>, after <paramref name="after"/> when it is given (the last reading of the page before).</summary>
    Task<IReadOnlyList<Reading>> ReadingsAsync(PlaceKey place, string quantity, DateTimeOffset from, DateTimeOffset to, ReadingCursor? after, int limit, CancellationToken cancellationToken);

    /// <summary>All readings of a place (all quantities, device states too), oldest first, at most <paramref name="limit"/>.</summary>
    Task<IReadOnlyList<Reading>> AllReadingsAsync(PlaceKey place, DateTimeOffset from, DateTimeOffset to, int limit, CancellationToken cancellationToken);

    /// <summary>Kept water-state values of a place, all names, oldest first.</summary>
    Task<IReadOnlyList<StateValue>> StateValuesAsync(PlaceKey place, DateTimeOffset from, DateTimeOffset to, CancellationToken cancellationToken);

    /// <summary>Alarm journal of a place (null: of all), oldest first.</summary>
    Task<IReadOnlyList<AlarmJournalEntry>> AlarmJournalAsync(PlaceKey? place, DateTimeOffset from, DateTimeOffset to, CancellationToken cancellationToken);

    /// <summary>Logbook of a place (null: of all), newest first, at most <paramref name="limit"/>.</summary>
    Task<IReadOnlyList<LogEntry>> LogAsync(PlaceKey? place, DateTimeOffset from, DateTimeOffset to, int limit, CancellationToken cancellationToken);

    /// <summary>All losses, newest first.</summary>
    Task<IReadOnlyList<LossRecord>> LossesAsync(CancellationToken cancellationToken);

    /// <summary>One loss, or null.</summary>
    Task<LossRecord?> LossAsync(long id, CancellationToken cancellationToken);

    /// <summary>Unreadable payloads, newest first, at most <paramref name="limit"/>.</summary>
    Task<IReadOnlyList<UnreadablePayload>> UnreadableAsync(int limit, CancellationToken cancellationToken);
}

/// <summary>One bucket of a trend.</summary>
/// <param name="From">Start.</param>
/// <param name="To">End.</param>
/// <param name="Min">Lowest value.</param>
/// <param name="Mean">Mean of the values.</param>
/// <param name="Max">Highest value.</param>
/// <param name="Count">How many values.</param>
public readonly record struct TrendBucket(DateTimeOffset From, DateTimeOffset To, double Min, double Mean, double Max, long Count);

/// <summary>Where a page of readings ended.</summary>
/// <param name="Time">Time of its last reading.</param>
/// <param name="Probe">Probe of its last reading.</param>
public readonly record struct ReadingCursor(DateTimeOffset Time, string Probe);

/// <summary>A kept value of a water state.</summary>
/// <param name="Time">The state's time.</param>
/// <param name="Quantity">Its name.</param>
/// <param name="Value">Canonical unit.</param>
/// <param name="U">Standard uncertainty; null where none exists.</param>
public readonly record struct StateValue(DateTimeOffset Time, string Quantity, double Value, double? U);
