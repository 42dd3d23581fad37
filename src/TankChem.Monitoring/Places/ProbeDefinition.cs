namespace TankChem.Monitoring.Places;

/// <summary>What is known of one probe (or test kit) at a place.</summary>
public sealed record ProbeDefinition
{
    /// <summary>The quantity it measures.</summary>
    public required string Quantity { get; init; }

    /// <summary>Its id at the place; <c>main</c> when not named.</summary>
    public string Probe { get; init; } = "main";

    /// <summary>The unit of its bare numbers, confirmed by a person or the configuration; null when nobody has.</summary>
    public string? Unit { get; init; }

    /// <summary>Standard uncertainty of a fresh reading, canonical unit; null for the default of its quantity.</summary>
    public double? StandardUncertainty { get; init; }

    /// <summary>Added uncertainty per day of age, canonical unit; null for the default.</summary>
    public double? DriftPerDay { get; init; }

    /// <summary>Oldest age at which its reading is used; null for the default.</summary>
    public TimeSpan? OldestUsed { get; init; }

    /// <summary>When it was calibrated last; null when no calibration is on record.</summary>
    public DateTimeOffset? CalibratedAt { get; init; }
}
