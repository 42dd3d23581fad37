namespace TankChem.Chemistry.Fresh;

/// <summary>Constants between amounts instead of activities, at one ionic strength and one hydrogen activity: what the free ions are substituted into again and again.</summary>
internal readonly struct ConditionalConstants
{
    public ConditionalConstants(in FreshConstants k, in Activities g, double aH)
    {
        Co2PerHco3 = aH * g.Bicarbonate / (k.K1 * g.Neutral);
        Co3PerHco3 = k.K2 * g.Bicarbonate / (aH * g.Carbonate);
        Hydrogen = aH / g.Hydrogen;
        Hydroxide = k.KW / (aH * g.Hydroxide);
        double ratio = k.KNh4 * g.Ammonium / (aH * g.Neutral);
        Nh3Fraction = ratio / (1 + ratio);
        CaHco3 = k.CaHco3 * g.Calcium * g.Bicarbonate / g.CalciumPair;
        CaCo3 = k.CaCo3 * g.Calcium * g.Carbonate / g.Neutral;
        MgHco3 = k.MgHco3 * g.Magnesium * g.Bicarbonate / g.MagnesiumPair;
        MgCo3 = k.MgCo3 * g.Magnesium * g.Carbonate / g.Neutral;
        NaHco3 = k.NaHco3 * g.Sodium * g.Bicarbonate / g.Neutral;
        NaCo3 = k.NaCo3 * g.Sodium * g.Carbonate / g.Single;
        CaSo4 = k.CaSo4 * g.Calcium * g.Sulfate / g.Neutral;
        MgSo4 = k.MgSo4 * g.Magnesium * g.Sulfate / g.Neutral;
        NaSo4 = k.NaSo4 * g.Sodium * g.Sulfate / g.Single;
        KSo4 = k.KSo4 * g.Potassium * g.Sulfate / g.Single;
        CaOh = k.CaOh * g.Calcium / (g.CalciumPair * aH);
        MgOh = k.MgOh * g.Magnesium / (g.MagnesiumPair * aH);
    }

    /// <summary>CO2 per HCO3⁻.</summary>
    public double Co2PerHco3 { get; }

    /// <summary>CO3²⁻ per HCO3⁻.</summary>
    public double Co3PerHco3 { get; }

    /// <summary>Free hydrogen ion, mol/kg.</summary>
    public double Hydrogen { get; }

    /// <summary>Free hydroxide, mol/kg.</summary>
    public double Hydroxide { get; }

    /// <summary>Un-ionised share of ammonia.</summary>
    public double Nh3Fraction { get; }

    public double CaHco3 { get; }

    public double CaCo3 { get; }

    public double MgHco3 { get; }

    public double MgCo3 { get; }

    public double NaHco3 { get; }

    public double NaCo3 { get; }

    public double CaSo4 { get; }

    public double MgSo4 { get; }

    public double NaSo4 { get; }

    public double KSo4 { get; }

    /// <summary>CaOH⁺ per Ca²⁺ at this hydrogen activity.</summary>
    public double CaOh { get; }

    /// <summary>MgOH⁺ per Mg²⁺ at this hydrogen activity.</summary>
    public double MgOh { get; }
}
