using TankChem.Simulation.Tanks;

namespace TankChem.Simulation.Demo;

/// <summary>What kind of place it is.</summary>
public enum DemoPlaceKind
{
    /// <summary>Holds stock.</summary>
    Tank,

    /// <summary>Water shared by tanks.</summary>
    Loop,
}

/// <summary>What a probe or test kit of the demo is.</summary>
/// <param name="Quantity">Quantity id.</param>
/// <param name="Probe">Probe id.</param>
/// <param name="Unit">Unit of its bare numbers, or in which people type it.</param>
/// <param name="StandardUncertainty">Standard uncertainty of a fresh reading, canonical unit; null for the service's default.</param>
/// <param name="DriftPerDay">Added uncertainty per day of age, canonical unit; null for the service's default.</param>
/// <param name="OldestUsed">Oldest age at which its reading is used; null for the service's default.</param>
/// <param name="CalibratedAt">Last calibration before the end of the history; null when none is on record.</param>
public sealed record DemoProbe(
    string Quantity,
    string Probe,
    string Unit,
    double? StandardUncertainty = null,
    double? DriftPerDay = null,
    TimeSpan? OldestUsed = null,
    DateTimeOffset? CalibratedAt = null);

/// <summary>Major ions of a place's water, mg/L.</summary>
/// <param name="CalciumMgL">Calcium, mg/L.</param>
/// <param name="MagnesiumMgL">Magnesium, mg/L.</param>
/// <param name="SodiumMgL">Sodium, mg/L.</param>
/// <param name="PotassiumMgL">Potassium, mg/L.</param>
/// <param name="ChlorideMgL">Chloride, mg/L.</param>
/// <param name="SulfateMgL">Sulfate, mg/L.</param>
public sealed record DemoIons(double CalciumMgL, double MagnesiumMgL, double SodiumMgL, double PotassiumMgL, double ChlorideMgL, double SulfateMgL);

/// <summary>A place of the demo site, as its owner would set it up.</summary>
public sealed record DemoPlace
{
    /// <summary>Id.</summary>
    public required string Id { get; init; }

    /// <summary>The name people use.</summary>
    public required string Name { get; init; }

    /// <summary>What it is.</summary>
    public DemoPlaceKind Kind { get; init; }

    /// <summary>False for the place that publishes although nobody has set it up: leave it out of the configuration.</summary>
    public bool Assigned { get; init; } = true;

    /// <summary>Id of its loop; null for a place of its own.</summary>
    public string? Loop { get; init; }

    /// <summary>Water volume, m³; a loop's counts its tanks.</summary>
    public required double VolumeM3 { get; init; }

    /// <summary>Practical salinity.</summary>
    public double Salinity { get; init; }

    /// <summary>Ids of the stock groups whose limits apply.</summary>
    public IReadOnlyList<string> Stock { get; init; } = [];

    /// <summary>Whether CO2 is injected.</summary>
    public bool Co2Injection { get; init; }

    /// <summary>Hours in which CO2 may flow, UTC.</summary>
    public Hours? GasHours { get; init; }

    /// <summary>Hours of light, UTC.</summary>
    public Hours? LightHours { get; init; }

    /// <summary>Major ions; null for the sea's.</summary>
    public DemoIons? Ions { get; init; }

    /// <summary>Its probes and test kits.</summary>
    public IReadOnlyList<DemoProbe> Probes { get; init; } = [];
}
