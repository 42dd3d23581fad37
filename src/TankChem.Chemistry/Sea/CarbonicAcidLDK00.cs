namespace TankChem.Chemistry.Sea;

/// <summary>Carbonic acid, total scale, mol per kg of solution. S 19…43, 2…35 °C. Source: LDK00.</summary>
internal static class CarbonicAcidLDK00
{
    /// <summary>pK1 = 3633.86/T − 61.2172 + 9.67770·ln T − 0.011555·S + 0.0001152·S².</summary>
    public static double PK1(double tK, double lnT, double s) => 3633.86 / tK - 61.2172 + 9.67770 * lnT - 0.011555 * s + 0.0001152 * s * s;

    /// <summary>pK2 = 471.78/T + 25.9290 − 3.16967·ln T − 0.01781·S + 0.0001122·S².</summary>
    public static double PK2(double tK, double lnT, double s) => 471.78 / tK + 25.9290 - 3.16967 * lnT - 0.01781 * s + 0.0001122 * s * s;

    public static bool InFittedRange(double tC, double s) => tC is >= 2 and <= 35 && s is >= 19 and <= 43;
}
