namespace TankChem.Chemistry;

/// <summary>Practical salinity from conductivity (PSS-78, with Hill, Dauphinee &amp; Woods 1986 below 2).</summary>
public static class PracticalSalinity
{
    /// <summary>Salinity from conductivity at the water's own temperature.</summary>
    public static double FromConductivity(double conductivityMilliSiemensPerCm, double temperatureC) => throw new NotSupportedException();

    /// <summary>Salinity from conductivity referred to 25 °C, µS/cm.</summary>
    public static double FromConductivityAt25C(double conductivityMicroSiemensPerCmAt25C) => throw new NotSupportedException();
}
