namespace TankChem.Monitoring.Places;

/// <summary>One place as somebody set it up (or as it showed up by publishing).</summary>
public sealed record PlaceDefinition
{
    /// <summary>Site and place id.</summary>
    public required PlaceKey Key { get; init; }

    /// <summary>What it is.</summary>
    public required PlaceKind Kind { get; init; }

    /// <summary>The name people use.</summary>
    public required string Name { get; init; }

    /// <summary>False for a place that only showed up by publishing: its readings are kept, its water computed, but it has no alarm, permit or advice.</summary>
    public bool Assigned { get; init; } = true;

    /// <summary>Id of the loop whose water it shares; null for a place of its own.</summary>
    public string? Loop { get; init; }

    /// <summary>Water volume, m³; a loop's counts its tanks. Null when not on record.</summary>
    public double? VolumeM3 { get; init; }

    /// <summary>Practical salinity that serves until a probe reports; null when nobody said.</summary>
    public double? Salinity { get; init; }

    /// <summary>Major ions; null when not known.</summary>
    public IonContent? Ions { get; init; }

    /// <summary>Hardness as mmol/L of Ca + Mg; null when not known.</summary>
    public double? HardnessMmolL { get; init; }

    /// <summary>Stock group ids; the strictest limit of all counts.</summary>
    public IReadOnlyList<string> Stock { get; init; } = [];

    /// <summary>Whether CO2 is injected here.</summary>
    public bool Co2Injection { get; init; }

    /// <summary>Hours in which CO2 may flow, site's local time; null when not scheduled.</summary>
    public DailyHours? GasHours { get; init; }

    /// <summary>Hours of light; null when not on record.</summary>
    public DailyHours? LightHours { get; init; }

    /// <summary>CO2 of the air above it, ppm dry; null for the site's.</summary>
    public double? AirCo2Ppm { get; init; }

    /// <summary>What is known of its probes.</summary>
    public IReadOnlyList<ProbeDefinition> Probes { get; init; } = [];
}
