namespace TankChem.Chemistry;

/// <summary>Density of water after EOS-80 at one atmosphere (UNESCO 1983).</summary>
public static class Density
{
    /// <summary>Density, kg/L. Valid −2…40 °C, S 0…42.</summary>
    public static double KgPerL(double temperatureC, double salinity) => throw new NotSupportedException();
}
