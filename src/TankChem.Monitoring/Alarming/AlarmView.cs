using TankChem.Alarms;

namespace TankChem.Monitoring.Alarming;

/// <summary>An alarm as people and programs see it.</summary>
public sealed record AlarmView
{
    /// <summary>Which alarm.</summary>
    public required AlarmKey Key { get; init; }

    /// <summary>The place's name.</summary>
    public required string PlaceName { get; init; }

    /// <summary>What it is about, a few words: "CO2 high".</summary>
    public required string Title { get; init; }

    /// <summary>The quantity it watches.</summary>
    public required string Quantity { get; init; }

    /// <summary>How much it matters.</summary>
    public required AlarmPriority Priority { get; init; }

    /// <summary>Its state.</summary>
    public required AlarmState State { get; init; }

    /// <summary>The value now (or when last known), canonical unit; null when there is none.</summary>
    public double? Value { get; init; }

    /// <summary>Unit of value and set-point.</summary>
    public string Unit { get; init; } = "";

    /// <summary>The set-point; null for rules without one.</summary>
    public double? SetPoint { get; init; }

    /// <summary>The stock group (or groups) that set it; empty when none did.</summary>
    public string SetBy { get; init; } = "";

    /// <summary>One plain sentence: what is, against what.</summary>
    public required string Sentence { get; init; }

    /// <summary>First safe action.</summary>
    public required string FirstAction { get; init; }

    /// <summary>What happens if nobody does.</summary>
    public required string Consequence { get; init; }

    /// <summary>Whether people are in danger, not only stock.</summary>
    public bool DangerToPeople { get; init; }

    /// <summary>Whether the sentence is about our knowledge (probe silent, cannot vouch) and not about the water.</summary>
    public bool AboutKnowledge { get; init; }

    /// <summary>Condition present and not suppressed.</summary>
    public bool IsActive => State.Phase is AlarmPhase.Unacknowledged or AlarmPhase.Acknowledged && State.Suppression == AlarmSuppression.None;

    /// <summary>Whether it waits for somebody to confirm it.</summary>
    public bool NeedsAcknowledgement => State.Phase is AlarmPhase.Unacknowledged or AlarmPhase.ReturnedUnacknowledged or AlarmPhase.LatchedUnacknowledged && State.Suppression == AlarmSuppression.None;
}
