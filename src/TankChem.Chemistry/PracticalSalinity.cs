namespace TankChem.Chemistry;

/// <summary>Practical salinity from conductivity. Sources: FM83 (PSS-78), HDW86 below 2.</summary>
public static class PracticalSalinity
{
    private const double T68PerT90 = 1.00024;

    /// <summary>C(35, 15 °C, 0), mS/cm.</summary>
    private const double Standard = 42.914;

    /// <summary>Salinity from conductivity at the water's own temperature. −2…35 °C; below 2 with the correction of HDW86.</summary>
    /// <param name="conductivityMilliSiemensPerCm">mS/cm at that temperature.</param>
    /// <param name="temperatureC">°C, ITS-90.</param>
    public static double FromConductivity(double conductivityMilliSiemensPerCm, double temperatureC)
    {
        double t = temperatureC * T68PerT90;
        double rt = 0.6766097 + t * (2.00564e-2 + t * (1.104259e-4 + t * (-6.9698e-7 + t * 1.0031e-9)));
        double ratio = conductivityMilliSiemensPerCm / Standard / rt;
        if (!(ratio > 0))
            return 0;
        double x = Math.Sqrt(ratio);
        double ft = (t - 15) / (1 + 0.0162 * (t - 15));
        double s = 0.0080 + x * (-0.1692 + x * (25.3851 + x * (14.0941 + x * (-7.0261 + x * 2.7081))))
            + ft * (0.0005 + x * (-0.0056 + x * (-0.0066 + x * (-0.0375 + x * (0.0636 - x * 0.0144)))));
        if (s >= 2)
            return s;
        double low = 400 * ratio, high = 100 * ratio;
        return Math.Max(0, s - 0.008 / (1 + 1.5 * low + low * low) - 0.0005 * ft / (1 + Math.Sqrt(high) + high + high * Math.Sqrt(high)));
    }

    /// <summary>Salinity from conductivity referred to 25 °C, µS/cm.</summary>
    public static double FromConductivityAt25C(double conductivityMicroSiemensPerCmAt25C) => FromConductivity(conductivityMicroSiemensPerCmAt25C / 1000, 25);
}
