namespace TankChem.Chemistry;

/// <summary>Major ions of a fresh water, mmol per kg of water. Each 0…1,000; sodium closes the balance of charges with the alkalinity, chloride where there is none to take away.</summary>
public sealed record IonComposition
{
    /// <summary>Total calcium, mmol/kg.</summary>
    public double CalciumMmolKg { get; init; }

    /// <summary>Total magnesium, mmol/kg.</summary>
    public double MagnesiumMmolKg { get; init; }

    /// <summary>Total sodium, mmol/kg.</summary>
    public double SodiumMmolKg { get; init; }

    /// <summary>Total potassium, mmol/kg.</summary>
    public double PotassiumMmolKg { get; init; }

    /// <summary>Total chloride, mmol/kg.</summary>
    public double ChlorideMmolKg { get; init; }

    /// <summary>Total sulfate, mmol/kg.</summary>
    public double SulfateMmolKg { get; init; }
}
