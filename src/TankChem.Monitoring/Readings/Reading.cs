namespace TankChem.Monitoring.Readings;

/// <summary>A valid reading: identity, raw and canonical value, quality.</summary>
public sealed record Reading
{
    /// <summary>Which series.</summary>
    public required SeriesKey Series { get; init; }

    /// <summary>When it was measured, UTC, whole milliseconds; with <see cref="Series"/> its identity.</summary>
    public required DateTimeOffset Time { get; init; }

    /// <summary>When it was received, UTC.</summary>
    public required DateTimeOffset ReceivedAt { get; init; }

    /// <summary>The number as it came. Never changed.</summary>
    public required double RawValue { get; init; }

    /// <summary>The unit as it came; null for a bare number. Never changed.</summary>
    public string? RawUnit { get; init; }

    /// <summary>The value in the quantity's canonical unit; null while the unit is not confirmed or the value is not usable.</summary>
    public double? Value { get; init; }

    /// <summary>Quality.</summary>
    public required QualityFlag Flag { get; init; }

    /// <summary>Why it is not <see cref="QualityFlag.Pass"/>; null when it is.</summary>
    public string? Reason { get; init; }

    /// <summary>How it came in.</summary>
    public required ReadingOrigin Origin { get; init; }

    /// <summary>Whether it may drive water states, alarms and advice.</summary>
    public bool IsUsable => Flag == QualityFlag.Pass && Value is not null;
}
