namespace TankChem.Chemistry.Sea;

/// <summary>Solubility and fugacity of CO2. −1…45 °C, S 0…45. Source: W74.</summary>
internal static class CarbonDioxideW74
{
    /// <summary>Gas constant, cm³ bar/(mol K) (CODATA 2018).</summary>
    private const double GasConstant = 83.14462618;
    private const double BarPerAtm = 1.01325;

    /// <summary>ln K0 = −60.2409 + 93.4517·(100/T) + 23.3585·ln(T/100) + S·[0.023517 − 0.023656·(T/100) + 0.0047036·(T/100)²], mol/(kg atm).</summary>
    public static double K0(double tK, double s)
    {
        double h = tK / 100;
        return Math.Exp(-60.2409 + 93.4517 / h + 23.3585 * Math.Log(h) + s * (0.023517 + h * (-0.023656 + 0.0047036 * h)));
    }

    /// <summary>Fugacity over partial pressure of CO2 in air at a total pressure, virial coefficients B and δ of the paper.</summary>
    public static double FugacityFactor(double tK, double pressureAtm)
    {
        double b = -1636.75 + tK * (12.0408 + tK * (-0.0327957 + tK * 3.16528e-5));
        double delta = 57.7 - 0.118 * tK;
        return Math.Exp((b + 2 * delta) * pressureAtm * BarPerAtm / (GasConstant * tK));
    }
}
