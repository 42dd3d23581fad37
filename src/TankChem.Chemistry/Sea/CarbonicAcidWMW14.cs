namespace TankChem.Chemistry.Sea;

/// <summary>Carbonic acid, total scale, mol per kg of solution. S 0…45, 0…45 °C. Source: WMW14 (corrigendum of the authors' 2013 paper).</summary>
internal static class CarbonicAcidWMW14
{
    private static readonly CarbonicAcidFit K1Fit = new(13.568513, 0.031645, -5.3834e-5, -539.2304, -5.635, -2.0901396);
    private static readonly CarbonicAcidFit K2Fit = new(21.389248, 0.12452358, -3.7447e-4, -787.3736, -19.84233, -3.3773006);

    public static double PK1(double tK, double lnT, double s, double sqrtS) => CarbonicAcidFit.PK1PureWater(tK, lnT) + K1Fit.Salt(tK, lnT, s, sqrtS);

    public static double PK2(double tK, double lnT, double s, double sqrtS) => CarbonicAcidFit.PK2PureWater(tK, lnT) + K2Fit.Salt(tK, lnT, s, sqrtS);

    public static bool InFittedRange(double tC, double s) => tC is >= 0 and <= 45 && s is >= 0 and <= 45;
}
