namespace TankChem.Chemistry;

/// <summary>Standard uncertainties of what a state is computed from. Zero means exact.</summary>
public readonly record struct InputUncertainty
{
    /// <summary>Of pH.</summary>
    public double PH { get; init; }

    /// <summary>Of alkalinity, µmol/kg.</summary>
    public double AlkalinityUmolKg { get; init; }

    /// <summary>Of dissolved inorganic carbon, µmol/kg.</summary>
    public double DicUmolKg { get; init; }

    /// <summary>Of pCO2, µatm.</summary>
    public double Pco2Uatm { get; init; }

    /// <summary>Of temperature, °C.</summary>
    public double TemperatureC { get; init; }

    /// <summary>Of practical salinity.</summary>
    public double Salinity { get; init; }

    /// <summary>Whether the published uncertainty of the constants (and of an assumed composition) counts.</summary>
    public bool IncludeConstants { get; init; }
}
