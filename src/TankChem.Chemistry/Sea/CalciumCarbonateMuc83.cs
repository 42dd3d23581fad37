namespace TankChem.Chemistry.Sea;

/// <summary>Solubility products of CaCO3 in sea water, (mol per kg of solution)². 5…40 °C, S 5…44. Source: Muc83.</summary>
internal static class CalciumCarbonateMuc83
{
    private const double LogE = 0.43429448190325182;

    public static double Calcite(double tK, double lnT, double s, double sqrtS) => Math.Pow(10,
        -171.9065 - 0.077993 * tK + 2839.319 / tK + 71.595 * lnT * LogE
        + (-0.77712 + 0.0028426 * tK + 178.34 / tK) * sqrtS - 0.07711 * s + 0.0041249 * s * sqrtS);

    public static double Aragonite(double tK, double lnT, double s, double sqrtS) => Math.Pow(10,
        -171.945 - 0.077993 * tK + 2903.293 / tK + 71.595 * lnT * LogE
        + (-0.068393 + 0.0017276 * tK + 88.135 / tK) * sqrtS - 0.10018 * s + 0.0059415 * s * sqrtS);
}
