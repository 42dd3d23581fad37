namespace TankChem.Chemistry;

/// <summary>Standard uncertainties of a <see cref="CarbonateState"/>, first order, in the units of its members.</summary>
public readonly record struct CarbonateUncertainty
{
    /// <summary>Of pH (NBS).</summary>
    public double PhNbs { get; init; }

    /// <summary>Of alkalinity, µmol/kg.</summary>
    public double AlkalinityUmolKg { get; init; }

    /// <summary>Of dissolved inorganic carbon, µmol/kg.</summary>
    public double DicUmolKg { get; init; }

    /// <summary>Of dissolved CO2, µmol/kg.</summary>
    public double Co2UmolKg { get; init; }

    /// <summary>Of dissolved CO2, mg/L.</summary>
    public double Co2MgL { get; init; }

    /// <summary>Of bicarbonate, µmol/kg.</summary>
    public double Hco3UmolKg { get; init; }

    /// <summary>Of carbonate, µmol/kg.</summary>
    public double Co3UmolKg { get; init; }

    /// <summary>Of pCO2, µatm.</summary>
    public double Pco2Uatm { get; init; }

    /// <summary>Of the un-ionised share of ammonia.</summary>
    public double Nh3Fraction { get; init; }

    /// <summary>Of the buffer intensity at constant DIC, µmol/kg per pH.</summary>
    public double BufferClosedUmolKg { get; init; }

    /// <summary>Of the buffer intensity at constant pCO2, µmol/kg per pH.</summary>
    public double BufferOpenUmolKg { get; init; }

    /// <summary>Of the saturation state of calcite.</summary>
    public double OmegaCalcite { get; init; }

    /// <summary>Of the saturation state of aragonite.</summary>
    public double OmegaAragonite { get; init; }
}
