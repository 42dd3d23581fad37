namespace TankChem.Chemistry;

/// <summary>Two of pH, alkalinity, dissolved inorganic carbon and pCO2; together with a <see cref="Solution"/> they fix the carbonate system.</summary>
/// <remarks>Exactly two are not null. Their valid ranges: pH 2…12, alkalinity −5,000…200,000 µmol/kg, DIC 0…500,000 µmol/kg, pCO2 &gt; 0…2,000,000 µatm.</remarks>
public readonly record struct CarbonateInput
{
    /// <summary>pH on <see cref="Scale"/>, or null.</summary>
    public double? PH { get; init; }

    /// <summary>Total alkalinity, µmol/kg, or null.</summary>
    public double? AlkalinityUmolKg { get; init; }

    /// <summary>Dissolved inorganic carbon, µmol/kg, or null.</summary>
    public double? DicUmolKg { get; init; }

    /// <summary>Partial pressure of CO2 in gas in equilibrium with the water, µatm, or null.</summary>
    public double? Pco2Uatm { get; init; }

    /// <summary>The scale of <see cref="PH"/>.</summary>
    public PhScale Scale { get; init; }
}
