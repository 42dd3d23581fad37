namespace TankChem.Chemistry;

/// <summary>Solubility of oxygen of air (Benson &amp; Krause 1984).</summary>
public static class DissolvedOxygen
{
    /// <summary>Oxygen, mg/L, in equilibrium with water-saturated air. 0–40 °C, S 0–40.</summary>
    public static double SaturationMgL(double temperatureC, double salinity, double pressureAtm) => throw new NotSupportedException();
}
