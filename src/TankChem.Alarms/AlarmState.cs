namespace TankChem.Alarms;

/// <summary>Everything that is remembered of one alarm; small, explicit, serialisable. <c>default</c> is normal.</summary>
public sealed record AlarmState
{
    /// <summary>An alarm that was never raised.</summary>
    public static AlarmState Normal { get; } = new();

    /// <summary>Where it stands.</summary>
    public AlarmPhase Phase { get; init; }

    /// <summary>How it is kept back.</summary>
    public AlarmSuppression Suppression { get; init; }

    /// <summary>Since when the condition has held without being raised yet (the on-delay runs), or null.</summary>
    public DateTimeOffset? PendingSince { get; init; }

    /// <summary>Since when the condition has been gone without being returned yet (the off-delay runs), or null.</summary>
    public DateTimeOffset? ClearSince { get; init; }

    /// <summary>When it was raised last, or null.</summary>
    public DateTimeOffset? RaisedAt { get; init; }

    /// <summary>When <see cref="Phase"/> or <see cref="Suppression"/> changed last, or null.</summary>
    public DateTimeOffset? ChangedAt { get; init; }

    /// <summary>When it was acknowledged, or null.</summary>
    public DateTimeOffset? AcknowledgedAt { get; init; }

    /// <summary>Who acknowledged it, or null.</summary>
    public string? AcknowledgedBy { get; init; }

    /// <summary>Why, in that person's words, or null.</summary>
    public string? AcknowledgedReason { get; init; }

    /// <summary>When a shelf ends, or null.</summary>
    public DateTimeOffset? ShelvedUntil { get; init; }

    /// <summary>Who keeps it back and why, or null.</summary>
    public string? SuppressionReason { get; init; }
}
