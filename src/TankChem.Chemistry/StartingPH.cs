namespace TankChem.Chemistry;

/// <summary>Where the search for a pH starts: the answer of a water whose alkalinity is carbonate only.</summary>
internal static class StartingPH
{
    private const double Unknown = 7.5;

    /// <summary>From alkalinity and DIC: the positive root of h² + K1 (1 − 1/γ) h + K1 K2 (1 − 2/γ) = 0 with γ = alkalinity/DIC.</summary>
    public static double Closed(double alkalinity, double dic, double k1, double k2)
    {
        if (!(alkalinity > 0 && dic > 0 && alkalinity < 2 * dic))
            return Unknown;
        double inverse = dic / alkalinity;
        double b = k1 * (1 - inverse), c = k1 * k2 * (1 - 2 * inverse);
        return -Math.Log10(0.5 * (Math.Sqrt(b * b - 4 * c) - b));
    }

    /// <summary>From alkalinity and dissolved CO2: all alkalinity as bicarbonate.</summary>
    public static double Open(double alkalinity, double co2, double k1) => alkalinity > 0 ? -Math.Log10(k1 * co2 / alkalinity) : Unknown;

    /// <summary>From DIC and dissolved CO2, carbonate left out.</summary>
    public static double Ratio(double dic, double co2, double k1) => dic > co2 ? -Math.Log10(k1 * co2 / (dic - co2)) : Unknown;
}
