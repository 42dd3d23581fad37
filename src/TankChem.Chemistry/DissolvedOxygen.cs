namespace TankChem.Chemistry;

/// <summary>Solubility of oxygen of air. 0…40 °C, S 0…40. Source: BK84.</summary>
public static class DissolvedOxygen
{
    /// <summary>Oxygen, mg/L, in equilibrium with water-saturated air.</summary>
    /// <param name="temperatureC">°C.</param>
    /// <param name="salinity">Practical salinity.</param>
    /// <param name="pressureAtm">Barometric pressure, atm.</param>
    public static double SaturationMgL(double temperatureC, double salinity, double pressureAtm)
    {
        double t = temperatureC + 273.15, i = 1 / t;
        double ln = -139.34411 + i * (1.575701e5 + i * (-6.642308e7 + i * (1.243800e10 - i * 8.621949e11)))
            - salinity * (1.7674e-2 + i * (-10.754 + i * 2140.7));
        double vapour = Math.Exp(11.8571 + i * (-3840.70 - i * 216961));

        // θ takes the temperature in °C.
        double theta = 0.000975 + temperatureC * (-1.426e-5 + temperatureC * 6.436e-8);
        return Math.Exp(ln) * pressureAtm * (1 - vapour / pressureAtm) * (1 - theta * pressureAtm) / ((1 - vapour) * (1 - theta));
    }
}
