using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Losses;

/// <summary>The time around a loss on one axis: what was read, what the water was, what was said, and what people and devices did. Facts only; it gives no verdict.</summary>
public sealed record LossReview
{
    /// <summary>How long before the loss was found.</summary>
    public static readonly TimeSpan Before = TimeSpan.FromHours(48);

    /// <summary>How long after.</summary>
    public static readonly TimeSpan After = TimeSpan.FromHours(12);

    /// <summary>The loss.</summary>
    public required LossRecord Loss { get; init; }

    /// <summary>Start of the axis.</summary>
    public required DateTimeOffset From { get; init; }

    /// <summary>End of the axis.</summary>
    public required DateTimeOffset To { get; init; }

    /// <summary>One track per quantity: computed ones first, then read ones.</summary>
    public required IReadOnlyList<ReviewTrack> Tracks { get; init; }

    /// <summary>When each device was off.</summary>
    public required IReadOnlyList<DeviceBand> Devices { get; init; }

    /// <summary>Alarm journal of the window, as known then.</summary>
    public required IReadOnlyList<AlarmJournalEntry> Alarms { get; init; }

    /// <summary>Logbook of the window, oldest first; doses are in it.</summary>
    public required IReadOnlyList<LogEntry> Log { get; init; }

    /// <summary>What happened in which order, one plain sentence each.</summary>
    public required IReadOnlyList<ReviewFact> Facts { get; init; }

    /// <summary>Lays a window out.</summary>
    /// <param name="loss">The loss.</param>
    /// <param name="readings">Readings of the place (and of its loop for device states), any order.</param>
    /// <param name="states">Kept water states of the place.</param>
    /// <param name="alarms">Alarm journal of the place and its loop.</param>
    /// <param name="log">Logbook of the place and its loop.</param>
    public static LossReview Of(LossRecord loss, IReadOnlyList<Reading> readings, IReadOnlyList<StateValue> states, IReadOnlyList<AlarmJournalEntry> alarms, IReadOnlyList<LogEntry> log)
    {
        ArgumentNullException.ThrowIfNull(loss);
        ArgumentNullException.ThrowIfNull(readings);
        ArgumentNullException.ThrowIfNull(states);
        ArgumentNullException.ThrowIfNull(alarms);
        ArgumentNullException.ThrowIfNull(log);
        DateTimeOffset from = loss.FoundAt - Before, to = loss.FoundAt + After;
        ReviewTrack[] computed = [.. states.Where(s => QuantityCatalog.Get(s.Quantity).Computed).GroupBy(s => s.Quantity, StringComparer.Ordinal)
            .Select(g => ReviewTrack.Of(g.Key, true, g.Select(s => (s.Time, s.Value))))];
        ReviewTrack[] read = [.. readings.Where(r => r.IsUsable && r.Series.Quantity != SeriesKey.DeviceState && r.Series.Place == loss.Place).GroupBy(r => r.Series.Quantity, StringComparer.Ordinal)
            .Select(g => ReviewTrack.Of(g.Key, false, g.Select(r => (r.Time, r.Value!.Value))))];
        DeviceBand[] devices = [.. readings.Where(r => r.Series.Quantity == SeriesKey.DeviceState).GroupBy(r => r.Series.Probe, StringComparer.Ordinal)
            .Select(g => DeviceBand.Of(g.Key, [.. g.OrderBy(r => r.Time)], to)).OrderBy(b => b.Device, StringComparer.Ordinal)];
        AlarmJournalEntry[] journal = [.. alarms.Where(a => a.At >= from && a.At < to).OrderBy(a => a.At)];
        LogEntry[] entries = [.. log.Where(e => e.At >= from && e.At < to).OrderBy(e => e.At)];
        return new LossReview
        {
            Loss = loss,
            From = from,
            To = to,
            Tracks = [.. computed, .. read],
            Devices = devices,
            Alarms = journal,
            Log = entries,
            Facts = [.. FactsOf(loss, journal, devices, entries, read)],
        };
    }

    private static IEnumerable<ReviewFact> FactsOf(LossRecord loss, IEnumerable<AlarmJournalEntry> alarms, IEnumerable<DeviceBand> devices, IEnumerable<LogEntry> log, IEnumerable<ReviewTrack> read)
    {
        IEnumerable<ReviewFact> facts = alarms.Where(a => a.Change is AlarmChange.Raised or AlarmChange.Acknowledged or AlarmChange.ReturnedToNormal or AlarmChange.Shelved).Select(FactOf)
            .Concat(devices.SelectMany(d => d.Off.SelectMany(o => FactsOf(d.Device, o.From, o.To))))
            .Concat(log.Where(e => e.Kind is LogKind.Dose or LogKind.WaterExchange or LogKind.Note or LogKind.Cleaning or LogKind.Calibration or LogKind.Titration).Select(e => new ReviewFact(e.At, $"{e.Who}: {e.Text}", ReviewFactKind.Person)))
            .Concat(read.SelectMany(t => t.Gaps.Select(g => new ReviewFact(g.From, $"No reading of {QuantityCatalog.Get(t.Quantity).Name} for {Words(g.To - g.From)}", ReviewFactKind.Gap))))
            .Append(new ReviewFact(loss.FoundAt, loss.Count is { } count ? $"Found: {count} {loss.Stock} lost" : $"Found: {loss.Stock} lost, not counted", ReviewFactKind.Loss));
        return facts.OrderBy(f => f.At);
    }

    private static ReviewFact FactOf(AlarmJournalEntry entry) => entry.Change switch
    {
        AlarmChange.Acknowledged => new ReviewFact(entry.At, $"{entry.Who} acknowledged \"{entry.Title}\"{(entry.Why is { Length: > 0 } why ? $": {why}" : "")}", ReviewFactKind.Person),
        AlarmChange.Shelved => new ReviewFact(entry.At, $"{entry.Who} shelved \"{entry.Title}\"{(entry.Why is { Length: > 0 } why ? $": {why}" : "")}", ReviewFactKind.Person),
        AlarmChange.ReturnedToNormal => new ReviewFact(entry.At, $"\"{entry.Title}\" returned to normal", ReviewFactKind.Alarm),
        _ => new ReviewFact(entry.At, $"Alarm: {entry.Sentence}", ReviewFactKind.Alarm),
    };

    private static IEnumerable<ReviewFact> FactsOf(string device, DateTimeOffset from, DateTimeOffset? to)
    {
        yield return new ReviewFact(from, $"{device} off", ReviewFactKind.Device);
        if (to is { } end)
            yield return new ReviewFact(end, $"{device} on again after {Words(end - from)}", ReviewFactKind.Device);
    }

    private static string Words(TimeSpan span) => span.TotalHours >= 2 ? $"{span.TotalHours:0.#} h" : $"{span.TotalMinutes:0} min";
}
