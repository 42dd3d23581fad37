using TankChem.Alarms;

namespace TankChem.Monitoring.Alarming;

/// <summary>One line of the alarm journal: what was known then. Never changed, never deleted.</summary>
public sealed record AlarmJournalEntry
{
    /// <summary>Which alarm.</summary>
    public required AlarmKey Key { get; init; }

    /// <summary>When it happened.</summary>
    public required DateTimeOffset At { get; init; }

    /// <summary>What happened.</summary>
    public required AlarmChange Change { get; init; }

    /// <summary>How much it mattered.</summary>
    public required AlarmPriority Priority { get; init; }

    /// <summary>The alarm in a few words.</summary>
    public required string Title { get; init; }

    /// <summary>The sentence as it was then.</summary>
    public required string Sentence { get; init; }

    /// <summary>The value then, canonical unit; null when there was none.</summary>
    public double? Value { get; init; }

    /// <summary>The set-point then; null for rules without one.</summary>
    public double? SetPoint { get; init; }

    /// <summary>Who did it; null for the service itself. Not verified until sign-in exists.</summary>
    public string? Who { get; init; }

    /// <summary>Why, in that person's words.</summary>
    public string? Why { get; init; }
}
