namespace TankChem.Chemistry.Sea;

/// <summary>Apparent activity coefficient of hydrogen ion that takes the seawater scale to the NBS scale; measured near S 35. Source: T82.</summary>
internal static class HydrogenActivityT82
{
    /// <summary>fH = 1.2948 − 0.002036·T + (0.0004607 − 0.000001475·T)·S²; a(H, NBS) = fH·[H]SWS.</summary>
    public static double FH(double tK, double s) => 1.2948 - 0.002036 * tK + (0.0004607 - 0.000001475 * tK) * s * s;
}
