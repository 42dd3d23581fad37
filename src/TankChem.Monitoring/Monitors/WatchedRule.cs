using System.Globalization;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Monitors;

/// <summary>One alarm rule as it is watched at one place: what it says, and the state of its alarm.</summary>
internal abstract class WatchedRule
{
    protected WatchedRule(AlarmKey key, AlarmState state)
    {
        Key = key;
        State = state;
    }

    public AlarmKey Key { get; }

    public AlarmState State { get; set; }

    public abstract AlarmSettings Settings { get; }

    public abstract AlarmPriority Priority { get; }

    public abstract string Title { get; }

    public abstract string Quantity { get; }

    public abstract string FirstAction { get; }

    public abstract string Consequence { get; }

    public virtual string Unit => "";

    public virtual double? SetPoint => null;

    public virtual string SetBy => "";

    public virtual bool DangerToPeople => false;

    public virtual bool AboutKnowledge => false;

    /// <summary>The value now, or when last known; null when there was none since the start.</summary>
    public double? Value { get; protected set; }

    /// <summary>Whether the condition holds, does not, or cannot be told: <see cref="AlarmEventKind.ConditionPresent"/>, <c>Absent</c> or <c>Unknown</c>.</summary>
    public abstract AlarmEventKind Assess(PlaceWatch watch);

    /// <summary>Why logic keeps it back now; null when it does not.</summary>
    public virtual string? SuppressedBecause(PlaceWatch watch) => null;

    /// <summary>One plain sentence: what is, against what.</summary>
    public abstract string Sentence(DateTimeOffset now);

    /// <summary>Condition present, confirmed or not.</summary>
    public bool IsActive => State.Phase is AlarmPhase.Unacknowledged or AlarmPhase.Acknowledged;

    /// <summary>Whether the condition held at the step before, for the deadband.</summary>
    protected bool HeldBefore => State.PendingSince is not null || (IsActive && State.ClearSince is null);

    public AlarmView View(string placeName, DateTimeOffset now) => new()
    {
        Key = Key,
        PlaceName = placeName,
        Title = Title,
        Quantity = Quantity,
        Priority = Priority,
        State = State,
        Value = Value,
        Unit = Unit.Trim(),
        SetPoint = SetPoint,
        SetBy = SetBy,
        Sentence = Sentence(now),
        FirstAction = FirstAction,
        Consequence = Consequence,
        DangerToPeople = DangerToPeople,
        AboutKnowledge = AboutKnowledge,
    };

    protected static string Number(double value, int digits) => value.ToString(digits switch
    {
        0 => "#,0",
        1 => "#,0.#",
        2 => "0.00",
        3 => "0.000",
        _ => "0.0000",
    }, CultureInfo.InvariantCulture);

    protected static string Limit(double value) => value.ToString("#,0.####", CultureInfo.InvariantCulture);
}

/// <summary>What the rules look at: the place's water and what was heard.</summary>
internal sealed class PlaceWatch
{
    public required WaterSetup Setup { get; init; }

    public required ReadingBook Book { get; init; }

    public required WaterAssessment Water { get; init; }

    public required DateTimeOffset Now { get; init; }

    /// <summary>Whether the loop this place is in watches its own water, so that what is inherited is told there.</summary>
    public required bool LoopIsWatched { get; init; }

    /// <summary>Whether the mains of this place is known to be off.</summary>
    public required bool MainsIsOff { get; init; }

    /// <summary>The doubts found while the limits were judged: one sentence part each.</summary>
    public List<KnowledgeGap> Doubts { get; } = [];
}
