namespace TankChem.Chemistry;

/// <summary>Smooth passage from one model to another.</summary>
internal static class Blend
{
    private const double Ln5 = 1.6094379124341003;

    /// <summary>3x² − 2x³: from 0 to 1 with no slope at either end.</summary>
    public static double Smooth(double x) => x <= 0 ? 0 : x >= 1 ? 1 : x * x * (3 - 2 * x);

    /// <summary>Share of the sea-water model at a salinity: 0 up to 1, 1 from 5, smooth in log S.</summary>
    public static double ShareOfSea(double s) => s <= 1 ? 0 : s >= 5 ? 1 : Smooth(Math.Log(s) / Ln5);
}
