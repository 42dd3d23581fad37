namespace TankChem.Simulation.Waters;

/// <summary>What a virtual water holds, or how it changes: amounts per litre of water (a rate: per litre and hour).</summary>
/// <remarks>mmol per litre equals mol per m³, so times a volume in m³ it is mol.</remarks>
/// <param name="Dic">Dissolved inorganic carbon, mmol/L.</param>
/// <param name="Alkalinity">Total alkalinity, mmol/L.</param>
/// <param name="Tan">Total ammonia nitrogen, mmol/L as N.</param>
/// <param name="Nitrate">Nitrate, mmol/L as N.</param>
/// <param name="Oxygen">Dissolved oxygen, mmol/L as O2.</param>
/// <param name="Calcium">Calcium, mmol/L.</param>
public readonly record struct WaterAmounts(double Dic, double Alkalinity, double Tan, double Nitrate, double Oxygen, double Calcium)
{
    /// <summary>Sum of two, member by member.</summary>
    public static WaterAmounts operator +(WaterAmounts left, WaterAmounts right) => left.Add(right);

    /// <summary>Difference of two, member by member.</summary>
    public static WaterAmounts operator -(WaterAmounts left, WaterAmounts right) => left.Subtract(right);

    /// <summary>All members times a factor.</summary>
    public static WaterAmounts operator *(WaterAmounts amounts, double factor) => amounts.Multiply(factor);

    /// <summary>Sum of two, member by member.</summary>
    public WaterAmounts Add(WaterAmounts other) =>
        new(Dic + other.Dic, Alkalinity + other.Alkalinity, Tan + other.Tan, Nitrate + other.Nitrate, Oxygen + other.Oxygen, Calcium + other.Calcium);

    /// <summary>Difference of two, member by member.</summary>
    public WaterAmounts Subtract(WaterAmounts other) => Add(other.Multiply(-1));

    /// <summary>All members times a factor.</summary>
    public WaterAmounts Multiply(double factor) =>
        new(Dic * factor, Alkalinity * factor, Tan * factor, Nitrate * factor, Oxygen * factor, Calcium * factor);
}
