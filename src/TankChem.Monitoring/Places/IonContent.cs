namespace TankChem.Monitoring.Places;

/// <summary>Major ions of a place's water as configured, mg/L; null where not given.</summary>
public sealed record IonContent
{
    /// <summary>Calcium, mg/L.</summary>
    public double? CalciumMgL { get; init; }

    /// <summary>Magnesium, mg/L.</summary>
    public double? MagnesiumMgL { get; init; }

    /// <summary>Sodium, mg/L.</summary>
    public double? SodiumMgL { get; init; }

    /// <summary>Potassium, mg/L.</summary>
    public double? PotassiumMgL { get; init; }

    /// <summary>Chloride, mg/L.</summary>
    public double? ChlorideMgL { get; init; }

    /// <summary>Sulfate, mg/L.</summary>
    public double? SulfateMgL { get; init; }
}
