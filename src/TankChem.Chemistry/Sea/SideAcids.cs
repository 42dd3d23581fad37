namespace TankChem.Chemistry.Sea;

/// <summary>Boric acid, water, bisulfate, hydrogen fluoride, phosphoric, silicic acid and ammonium in sea water; ln K unless said.</summary>
internal static class SideAcids
{
    /// <summary>Boric acid, total scale. 0…45 °C, S 5…45. Source: D90b.</summary>
    public static double LnKB(double tK, double lnT, double s, double sqrtS) =>
        (-8966.9 - 2890.53 * sqrtS - 77.942 * s + 1.728 * s * sqrtS - 0.0996 * s * s) / tK
        + 148.0248 + 137.1942 * sqrtS + 1.62142 * s
        + (-24.4344 - 25.085 * sqrtS - 0.2474 * s) * lnT + 0.053105 * sqrtS * tK;

    /// <summary>Ion product of water, seawater scale. Source: M95.</summary>
    public static double LnKW(double tK, double lnT, double s, double sqrtS) =>
        148.9802 - 13847.26 / tK - 23.6521 * lnT + (-5.977 + 118.67 / tK + 1.0495 * lnT) * sqrtS - 0.01615 * s;

    /// <summary>Bisulfate, free scale, mol per kg of solution. 0…45 °C, S 5…45. Source: D90a.</summary>
    public static double KS(double tK, double lnT, double s, double iS)
    {
        double sqrtI = Math.Sqrt(iS);
        return Math.Exp(
            -4276.1 / tK + 141.328 - 23.093 * lnT
            + (-13856 / tK + 324.57 - 47.986 * lnT) * sqrtI
            + (35474 / tK - 771.54 + 114.723 * lnT) * iS
            - 2698 / tK * iS * sqrtI + 1776 / tK * iS * iS) * SeaSalt.WaterShare(s);
    }

    /// <summary>Hydrogen fluoride, free scale, mol per kg of solution. Source: DR79.</summary>
    public static double KF(double tK, double s, double iS) => Math.Exp(1590.2 / tK - 12.641 + 1.525 * Math.Sqrt(iS)) * SeaSalt.WaterShare(s);

    /// <summary>First dissociation of phosphoric acid, seawater scale. Source: YM95.</summary>
    public static double LnKP1(double tK, double lnT, double s, double sqrtS) =>
        -4576.752 / tK + 115.54 - 18.453 * lnT + (-106.736 / tK + 0.69171) * sqrtS + (-0.65643 / tK - 0.01844) * s;

    /// <summary>Second dissociation of phosphoric acid, seawater scale. Source: YM95.</summary>
    public static double LnKP2(double tK, double lnT, double s, double sqrtS) =>
        -8814.715 / tK + 172.1033 - 27.927 * lnT + (-160.34 / tK + 1.3566) * sqrtS + (0.37335 / tK - 0.05778) * s;

    /// <summary>Third dissociation of phosphoric acid, seawater scale. Source: YM95.</summary>
    public static double LnKP3(double tK, double s, double sqrtS) =>
        -3070.75 / tK - 18.126 + (17.27039 / tK + 2.81197) * sqrtS + (-44.99486 / tK - 0.09984) * s;

    /// <summary>Silicic acid, seawater scale, mol per kg of solution. Source: YM95.</summary>
    public static double KSi(double tK, double lnT, double s, double iS) => Math.Exp(
        -8904.2 / tK + 117.4 - 19.334 * lnT
        + (-458.79 / tK + 3.5913) * Math.Sqrt(iS) + (188.74 / tK - 1.5998) * iS + (-12.1652 / tK + 0.07871) * iS * iS) * SeaSalt.WaterShare(s);

    /// <summary>Ammonium, pK on the total scale, mol per kg of water. −2…40 °C, S 0…40. Source: CW95.</summary>
    public static double PKAmmonium(double tK, double s)
    {
        double sqrtT = Math.Sqrt(tK), sqrtS = Math.Sqrt(s);
        return 9.244605 - 2729.33 * (1 / 298.15 - 1 / tK)
            + (0.04203362 - 11.24742 / tK) * Math.Sqrt(sqrtS)
            + (-13.6416 + 1.176949 * sqrtT - 0.02860785 * tK + 545.4834 / tK) * sqrtS
            + (-0.1462507 + 0.0090226468 * sqrtT - 0.0001471361 * tK + 10.5425 / tK) * s * sqrtS
            + (0.004669309 - 0.0001691742 * sqrtT - 0.5677934 / tK) * s * s
            + (-2.354039e-5 + 0.009698623 / tK) * s * s * sqrtS;
    }
}
