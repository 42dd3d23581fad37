namespace TankChem.Chemistry;

/// <summary>Density of water after EOS-80 at one atmosphere. −2…40 °C, S 0…42. Source: FM83.</summary>
public static class Density
{
    private const double T68PerT90 = 1.00024;

    /// <summary>Density, kg/L.</summary>
    /// <param name="temperatureC">°C, ITS-90.</param>
    /// <param name="salinity">Practical salinity.</param>
    public static double KgPerL(double temperatureC, double salinity)
    {
        double t = temperatureC * T68PerT90, s = salinity;
        double water = 999.842594 + t * (6.793952e-2 + t * (-9.095290e-3 + t * (1.001685e-4 + t * (-1.120083e-6 + t * 6.536332e-9))));
        double a = 0.824493 + t * (-4.0899e-3 + t * (7.6438e-5 + t * (-8.2467e-7 + t * 5.3875e-9)));
        double b = -5.72466e-3 + t * (1.0227e-4 - t * 1.6546e-6);
        return (water + a * s + b * s * Math.Sqrt(s) + 4.8314e-4 * s * s) / 1000;
    }
}
