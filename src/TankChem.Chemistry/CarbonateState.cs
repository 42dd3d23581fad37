namespace TankChem.Chemistry;

/// <summary>A solved carbonate system. Amounts in µmol per kg of solution (with fresh-water constants per kg of water).</summary>
/// <remarks><c>default</c> is not a solved state: check <see cref="Status"/> (its <see cref="FaultyArgument"/> is null).</remarks>
public readonly record struct CarbonateState
{
    /// <summary>How the computation ended; the numbers hold only for <see cref="SolveStatus.Solved"/>.</summary>
    public SolveStatus Status { get; init; }

    /// <summary>For <see cref="SolveStatus.InvalidInput"/> and <see cref="SolveStatus.Impossible"/>: which argument and why, for a person; otherwise null.</summary>
    public string? FaultyArgument { get; init; }

    /// <summary>What to tell beside the numbers.</summary>
    public Caveats Caveats { get; init; }

    /// <summary>pH on the NBS (activity) scale.</summary>
    public double PhNbs { get; init; }

    /// <summary>pH on the total scale.</summary>
    public double PhTotal { get; init; }

    /// <summary>pH on the seawater scale.</summary>
    public double PhSeawater { get; init; }

    /// <summary>pH on the free scale.</summary>
    public double PhFree { get; init; }

    /// <summary>Total alkalinity, µmol/kg.</summary>
    public double AlkalinityUmolKg { get; init; }

    /// <summary>Dissolved inorganic carbon, µmol/kg.</summary>
    public double DicUmolKg { get; init; }

    /// <summary>Dissolved CO2 (aq, with H2CO3), µmol/kg.</summary>
    public double Co2UmolKg { get; init; }

    /// <summary>Bicarbonate ion without its ion pairs, µmol/kg.</summary>
    public double Hco3UmolKg { get; init; }

    /// <summary>Carbonate ion without its ion pairs, µmol/kg.</summary>
    public double Co3UmolKg { get; init; }

    /// <summary>Partial pressure of CO2, µatm.</summary>
    public double Pco2Uatm { get; init; }

    /// <summary>Fugacity of CO2, µatm.</summary>
    public double Fco2Uatm { get; init; }

    /// <summary>Buffer intensity at constant DIC, µmol/kg per pH unit.</summary>
    public double BufferClosedUmolKg { get; init; }

    /// <summary>Buffer intensity at constant pCO2, µmol/kg per pH unit.</summary>
    public double BufferOpenUmolKg { get; init; }

    /// <summary>Saturation state of calcite.</summary>
    public double OmegaCalcite { get; init; }

    /// <summary>Saturation state of aragonite.</summary>
    public double OmegaAragonite { get; init; }

    /// <summary>Un-ionised share of total ammonia, 0…1.</summary>
    public double Nh3Fraction { get; init; }

    /// <summary>Ionic strength, mol/kg.</summary>
    public double IonicStrengthMolKg { get; init; }

    /// <summary>Density of the water, kg/L, at its own temperature (EOS-80, 1 atm).</summary>
    public double DensityKgPerL { get; init; }

    /// <summary>Dissolved CO2, mg/L.</summary>
    public double Co2MgL => Co2UmolKg * MolarMass.Co2 * DensityKgPerL * 1e-3;
}
