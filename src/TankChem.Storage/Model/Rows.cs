namespace TankChem.Storage.Model;

/// <summary>A series of readings.</summary>
internal sealed class SeriesRow
{
    public long Id { get; set; }

    public string Site { get; set; } = "";

    public string Place { get; set; } = "";

    public string Quantity { get; set; } = "";

    public string Probe { get; set; } = "";
}

/// <summary>A reading; identity is series and time.</summary>
internal sealed class ReadingRow
{
    public long SeriesId { get; set; }

    public long TimeMs { get; set; }

    public long ReceivedMs { get; set; }

    public double RawValue { get; set; }

    public string? RawUnit { get; set; }

    public double? Value { get; set; }

    public int Flag { get; set; }

    public string? Reason { get; set; }

    public int Origin { get; set; }
}

/// <summary>What stood under a reading's identity before another value came for it.</summary>
internal sealed class CorrectionRow
{
    public long Id { get; set; }

    public long SeriesId { get; set; }

    public long TimeMs { get; set; }

    public long ReceivedMs { get; set; }

    public double RawValue { get; set; }

    public string? RawUnit { get; set; }

    public double? Value { get; set; }

    public int Flag { get; set; }

    public string? Reason { get; set; }

    public int Origin { get; set; }

    public long SupersededMs { get; set; }
}

/// <summary>A named value of water states at a place.</summary>
internal sealed class StateSeriesRow
{
    public long Id { get; set; }

    public string Site { get; set; } = "";

    public string Place { get; set; } = "";

    public string Quantity { get; set; } = "";
}

/// <summary>A kept value of a water state, canonical unit.</summary>
internal sealed class StateValueRow
{
    public long StateSeriesId { get; set; }

    public long TimeMs { get; set; }

    public double Value { get; set; }

    public double? U { get; set; }
}

/// <summary>What a series' values come to over an hour or a day, UTC.</summary>
internal abstract class RollupRow
{
    /// <summary>1 or 24.</summary>
    public int StepH { get; set; }

    /// <summary>Its first hour, since 1970.</summary>
    public long StartH { get; set; }

    public double Lowest { get; set; }

    public double Highest { get; set; }

    /// <summary>Sum of the values.</summary>
    public double Total { get; set; }

    /// <summary>How many there are.</summary>
    public long Counted { get; set; }
}

/// <summary>Of the readings of good quality.</summary>
internal sealed class ReadingRollupRow : RollupRow
{
    public long SeriesId { get; set; }
}

/// <summary>Of the values of water states.</summary>
internal sealed class StateRollupRow : RollupRow
{
    public long StateSeriesId { get; set; }
}

/// <summary>An alarm's state.</summary>
internal sealed class AlarmStateRow
{
    public string Site { get; set; } = "";

    public string Place { get; set; } = "";

    public string Rule { get; set; } = "";

    public string Phase { get; set; } = "";

    public string Suppression { get; set; } = "";

    public long? PendingSinceMs { get; set; }

    public long? ClearSinceMs { get; set; }

    public long? RaisedMs { get; set; }

    public long? ChangedMs { get; set; }

    public long? AcknowledgedMs { get; set; }

    public string? AcknowledgedBy { get; set; }

    public string? AcknowledgedReason { get; set; }

    public long? ShelvedUntilMs { get; set; }

    public string? SuppressionReason { get; set; }
}

/// <summary>A line of the alarm journal.</summary>
internal sealed class AlarmEntryRow
{
    public long Id { get; set; }

    public string Site { get; set; } = "";

    public string Place { get; set; } = "";

    public string Rule { get; set; } = "";

    public long AtMs { get; set; }

    public string Change { get; set; } = "";

    public string Priority { get; set; } = "";

    public string Title { get; set; } = "";

    public string Sentence { get; set; } = "";

    public double? Value { get; set; }

    public double? SetPoint { get; set; }

    public string? Who { get; set; }

    public string? Why { get; set; }
}

/// <summary>A payload that could not be read.</summary>
internal sealed class UnreadableRow
{
    public long Id { get; set; }

    public string Topic { get; set; } = "";

    public long ReceivedMs { get; set; }

    public long LengthBytes { get; set; }

    public byte[] Head { get; set; } = [];

    public string Reason { get; set; } = "";

    public string? Client { get; set; }
}

/// <summary>A logbook entry.</summary>
internal sealed class LogRow
{
    public long Id { get; set; }

    public string Site { get; set; } = "";

    public string Place { get; set; } = "";

    public long AtMs { get; set; }

    public long RecordedMs { get; set; }

    public int Kind { get; set; }

    public string Who { get; set; } = "";

    public string Text { get; set; } = "";

    public double? Amount { get; set; }

    public string? Unit { get; set; }

    public string? Subject { get; set; }
}

/// <summary>Stock lost.</summary>
internal sealed class LossRow
{
    public long Id { get; set; }

    public string Site { get; set; } = "";

    public string Place { get; set; } = "";

    public long FoundMs { get; set; }

    public int? AnimalsLost { get; set; }

    public string Stock { get; set; } = "";

    public string Who { get; set; } = "";

    public string Notes { get; set; } = "";

    public long RecordedMs { get; set; }
}

/// <summary>A place as it was set up in the dashboard.</summary>
internal sealed class PlaceRow
{
    public string Site { get; set; } = "";

    public string Place { get; set; } = "";

    /// <summary>The definition as JSON; its members are the names of the domain type.</summary>
    public string Definition { get; set; } = "";
}
