namespace TankChem.Chemistry;

/// <summary>Molar masses, g/mol (IUPAC 2021 standard atomic weights, abridged).</summary>
public static class MolarMass
{
    /// <summary>Carbon dioxide.</summary>
    public const double Co2 = 44.009;

    /// <summary>Nitrogen, as in "mg/L as N".</summary>
    public const double Nitrogen = 14.007;

    /// <summary>Calcium.</summary>
    public const double Calcium = 40.078;

    /// <summary>Magnesium.</summary>
    public const double Magnesium = 24.305;

    /// <summary>Calcium carbonate.</summary>
    public const double CalciumCarbonate = 100.086;

    /// <summary>Sodium bicarbonate.</summary>
    public const double SodiumBicarbonate = 84.006;

    /// <summary>Sodium carbonate, without water.</summary>
    public const double SodiumCarbonate = 105.988;
}
