using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Dashboard.Tests.Doubles;

/// <summary>A store with nothing in it.</summary>
internal sealed class EmptyHistory : IHistory
{
    public Task<IReadOnlyList<TrendBucket>> TrendAsync(PlaceKey place, string quantity, DateTimeOffset from, DateTimeOffset to, int points, CancellationToken cancellationToken) => None<TrendBucket>();

    public Task<IReadOnlyList<Reading>> ReadingsAsync(PlaceKey place, string quantity, DateTimeOffset from, DateTimeOffset to, ReadingCursor? after, int limit, CancellationToken cancellationToken) => None<Reading>();

    public Task<IReadOnlyList<Reading>> AllReadingsAsync(PlaceKey place, DateTimeOffset from, DateTimeOffset to, int limit, CancellationToken cancellationToken) => None<Reading>();

    public Task<IReadOnlyList<StateValue>> StateValuesAsync(PlaceKey place, DateTimeOffset from, DateTimeOffset to, CancellationToken cancellationToken) => None<StateValue>();

    public Task<IReadOnlyList<AlarmJournalEntry>> AlarmJournalAsync(PlaceKey? place, DateTimeOffset from, DateTimeOffset to, CancellationToken cancellationToken) => None<AlarmJournalEntry>();

    public Task<IReadOnlyList<LogEntry>> LogAsync(PlaceKey? place, DateTimeOffset from, DateTimeOffset to, int limit, CancellationToken cancellationToken) => None<LogEntry>();

    public Task<IReadOnlyList<LossRecord>> LossesAsync(CancellationToken cancellationToken) => None<LossRecord>();

    public Task<LossRecord?> LossAsync(long id, CancellationToken cancellationToken) => Task.FromResult<LossRecord?>(null);

    public Task<IReadOnlyList<UnreadablePayload>> UnreadableAsync(int limit, CancellationToken cancellationToken) => None<UnreadablePayload>();

    private static Task<IReadOnlyList<T>> None<T>() => Task.FromResult<IReadOnlyList<T>>([]);
}
