namespace TankChem.Chemistry.Sea;

/// <summary>Saturation pressure of water vapour over sea water. 0…40 °C, S 0…40. Source: WP80.</summary>
internal static class WaterVapourWP80
{
    /// <summary>ln p = 24.4543 − 67.4509·(100/T) − 4.8489·ln(T/100) − 0.000544·S, atm.</summary>
    public static double PressureAtm(double tK, double s)
    {
        double h = tK / 100;
        return Math.Exp(24.4543 - 67.4509 / h - 4.8489 * Math.Log(h) - 0.000544 * s);
    }
}
