namespace TankChem.Chemistry.Sea;

/// <summary>pK = pK0(T) + A + B/T + C·ln T with A = a1·√S + a2·S + a3·S², B = b1·√S + b2·S, C = c1·√S: the form of M10 and WMW14.</summary>
internal readonly record struct CarbonicAcidFit(double A1, double A2, double A3, double B1, double B2, double C1)
{
    /// <summary>pK1 of pure water: −126.34048 + 6320.813/T + 19.568224·ln T. Source: M10.</summary>
    public static double PK1PureWater(double tK, double lnT) => -126.34048 + 6320.813 / tK + 19.568224 * lnT;

    /// <summary>pK2 of pure water: −90.18333 + 5143.692/T + 14.613358·ln T. Source: M10.</summary>
    public static double PK2PureWater(double tK, double lnT) => -90.18333 + 5143.692 / tK + 14.613358 * lnT;

    /// <summary>What salt adds to the pK.</summary>
    public double Salt(double tK, double lnT, double s, double sqrtS) =>
        A1 * sqrtS + A2 * s + A3 * s * s + (B1 * sqrtS + B2 * s) / tK + C1 * sqrtS * lnT;
}
