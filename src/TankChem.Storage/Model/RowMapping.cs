using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Storage.Model;

/// <summary>Domain values to rows and back.</summary>
internal static class RowMapping
{
    public static AlarmEntryRow ToRow(AlarmJournalEntry entry) => new()
    {
        Site = entry.Key.Place.Site,
        Place = entry.Key.Place.Place,
        Rule = entry.Key.Rule,
        AtMs = Ms(entry.At),
        Change = Codes.Of(entry.Change),
        Priority = Codes.Of(entry.Priority),
        Title = entry.Title,
        Sentence = entry.Sentence,
        Value = Finite(entry.Value),
        SetPoint = Finite(entry.SetPoint),
        Who = entry.Who,
        Why = entry.Why,
    };

    public static AlarmJournalEntry FromRow(AlarmEntryRow row) => new()
    {
        Key = new AlarmKey(new PlaceKey(row.Site, row.Place), row.Rule),
        At = Time(row.AtMs),
        Change = Codes.Change(row.Change),
        Priority = Codes.Priority(row.Priority),
        Title = row.Title,
        Sentence = row.Sentence,
        Value = row.Value,
        SetPoint = row.SetPoint,
        Who = row.Who,
        Why = row.Why,
    };

    public static void Fill(AlarmStateRow row, AlarmState state)
    {
        row.Phase = Codes.Of(state.Phase);
        row.Suppression = Codes.Of(state.Suppression);
        row.PendingSinceMs = Ms(state.PendingSince);
        row.ClearSinceMs = Ms(state.ClearSince);
        row.RaisedMs = Ms(state.RaisedAt);
        row.ChangedMs = Ms(state.ChangedAt);
        row.AcknowledgedMs = Ms(state.AcknowledgedAt);
        row.AcknowledgedBy = state.AcknowledgedBy;
        row.AcknowledgedReason = state.AcknowledgedReason;
        row.ShelvedUntilMs = Ms(state.ShelvedUntil);
        row.SuppressionReason = state.SuppressionReason;
    }

    public static KeyValuePair<AlarmKey, AlarmState> FromRow(AlarmStateRow row) => new(
        new AlarmKey(new PlaceKey(row.Site, row.Place), row.Rule),
        new AlarmState
        {
            Phase = Codes.Phase(row.Phase),
            Suppression = Codes.Suppression(row.Suppression),
            PendingSince = Time(row.PendingSinceMs),
            ClearSince = Time(row.ClearSinceMs),
            RaisedAt = Time(row.RaisedMs),
            ChangedAt = Time(row.ChangedMs),
            AcknowledgedAt = Time(row.AcknowledgedMs),
            AcknowledgedBy = row.AcknowledgedBy,
            AcknowledgedReason = row.AcknowledgedReason,
            ShelvedUntil = Time(row.ShelvedUntilMs),
            SuppressionReason = row.SuppressionReason,
        });

    public static UnreadableRow ToRow(UnreadablePayload payload) => new()
    {
        Topic = payload.Topic,
        ReceivedMs = Ms(payload.ReceivedAt),
        LengthBytes = payload.Length,
        Head = payload.Head.ToArray(),
        Reason = payload.Reason,
        Client = payload.Client,
    };

    public static UnreadablePayload FromRow(UnreadableRow row) => new(row.Topic, Time(row.ReceivedMs), row.LengthBytes, row.Head, row.Reason, row.Client);

    public static LogRow ToRow(LogEntry entry) => new()
    {
        Site = entry.Place.Site,
        Place = entry.Place.Place,
        AtMs = Ms(entry.At),
        RecordedMs = Ms(entry.RecordedAt),
        Kind = (int)entry.Kind,
        Who = entry.Who,
        Text = entry.Text,
        Amount = entry.Amount,
        Unit = entry.Unit,
        Subject = entry.Subject,
    };

    public static LogEntry FromRow(LogRow row) => new()
    {
        Id = row.Id,
        Place = new PlaceKey(row.Site, row.Place),
        At = Time(row.AtMs),
        RecordedAt = Time(row.RecordedMs),
        Kind = (LogKind)row.Kind,
        Who = row.Who,
        Text = row.Text,
        Amount = row.Amount,
        Unit = row.Unit,
        Subject = row.Subject,
    };

    public static LossRow ToRow(LossRecord loss) => new()
    {
        Site = loss.Place.Site,
        Place = loss.Place.Place,
        FoundMs = Ms(loss.FoundAt),
        AnimalsLost = loss.Count,
        Stock = loss.Stock,
        Who = loss.Who,
        Notes = loss.Notes,
        RecordedMs = Ms(loss.RecordedAt),
    };

    public static LossRecord FromRow(LossRow row) => new()
    {
        Id = row.Id,
        Place = new PlaceKey(row.Site, row.Place),
        FoundAt = Time(row.FoundMs),
        Count = row.AnimalsLost,
        Stock = row.Stock,
        Who = row.Who,
        Notes = row.Notes,
        RecordedAt = Time(row.RecordedMs),
    };

    public static long Ms(DateTimeOffset time) => time.ToUnixTimeMilliseconds();

    /// <summary>An end of a range, from ≤ t &lt; to: the first millisecond that is not before it, so that a part of a millisecond neither takes in a row from before nor leaves out the newest.</summary>
    public static long EdgeMs(DateTimeOffset edge)
    {
        long ms = Ms(edge);
        return edge.UtcTicks % TimeSpan.TicksPerMillisecond == 0 || ms == Ms(DateTimeOffset.MaxValue) ? ms : ms + 1;
    }

    public static DateTimeOffset Time(long ms) => DateTimeOffset.FromUnixTimeMilliseconds(ms);

    /// <summary>A line of the alarm journal is never lost for a number that is none: its sentence says what there is to say.</summary>
    private static double? Finite(double? number) => number is { } value && double.IsFinite(value) ? value : null;

    private static long? Ms(DateTimeOffset? time) => time?.ToUnixTimeMilliseconds();

    private static DateTimeOffset? Time(long? ms) => ms is { } value ? DateTimeOffset.FromUnixTimeMilliseconds(value) : null;
}
