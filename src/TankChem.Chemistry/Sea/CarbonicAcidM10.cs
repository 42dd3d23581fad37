namespace TankChem.Chemistry.Sea;

/// <summary>Carbonic acid, seawater scale, mol per kg of solution. S 1…50, 0…50 °C. Source: M10.</summary>
/// <remarks>The seawater-scale rows are used and converted. The paper's total- and free-scale rows do not agree with them by the known scale factors
/// (its total-scale K1 is off by 0.009 in pK at S 35 and 25 °C), so they are not used.</remarks>
internal static class CarbonicAcidM10
{
    private static readonly CarbonicAcidFit K1Fit = new(13.4038, 0.03206, -5.242e-5, -530.659, -5.8210, -2.0664);
    private static readonly CarbonicAcidFit K2Fit = new(21.3728, 0.1218, -3.688e-4, -788.289, -19.189, -3.374);

    public static double PK1(double tK, double lnT, double s, double sqrtS) => CarbonicAcidFit.PK1PureWater(tK, lnT) + K1Fit.Salt(tK, lnT, s, sqrtS);

    public static double PK2(double tK, double lnT, double s, double sqrtS) => CarbonicAcidFit.PK2PureWater(tK, lnT) + K2Fit.Salt(tK, lnT, s, sqrtS);

    public static bool InFittedRange(double tC, double s) => tC is >= 0 and <= 50 && s is >= 1 and <= 50;
}
