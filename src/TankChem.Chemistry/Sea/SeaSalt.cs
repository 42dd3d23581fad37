namespace TankChem.Chemistry.Sea;

/// <summary>Amounts that go with salinity, mol per kg of solution, and the ionic strength of sea salt.</summary>
internal static class SeaSalt
{
    private const double ChlorinityPerSalinity = 1 / 1.80655;

    /// <summary>Total boron. 0.0004157·S/35. Source: Upp74.</summary>
    public static double Boron(double s) => 0.0004157 * s / 35;

    /// <summary>Total sulfate. 0.14/96.062·Cl. Source: MR66.</summary>
    public static double Sulfate(double s) => 0.14 / 96.062 * s * ChlorinityPerSalinity;

    /// <summary>Total fluoride. 0.000067/18.998·Cl. Source: Ril65.</summary>
    public static double Fluoride(double s) => 0.000067 / 18.998 * s * ChlorinityPerSalinity;

    /// <summary>Total calcium. 0.02128/40.087·Cl. Source: RT67.</summary>
    public static double Calcium(double s) => 0.02128 / 40.087 * s * ChlorinityPerSalinity;

    /// <summary>Ionic strength, mol per kg of water. 19.924·S/(1000 − 1.005·S). Source: DOE94.</summary>
    public static double IonicStrength(double s) => 19.924 * s / (1000 - 1.005 * s);

    /// <summary>kg of water per kg of solution. 1 − 0.001005·S. Source: DOE94.</summary>
    public static double WaterShare(double s) => 1 - 0.001005 * s;
}
