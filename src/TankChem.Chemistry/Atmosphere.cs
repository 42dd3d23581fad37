using TankChem.Chemistry.Sea;

namespace TankChem.Chemistry;

/// <summary>What air and other gases above a water mean for it.</summary>
public static class Atmosphere
{
    /// <summary>pCO2, µatm, of water-saturated gas with a given dry mole fraction of CO2: x·(P − pH2O). Source: WP80.</summary>
    /// <param name="dryMoleFractionPpm">CO2 in dry gas, ppm; 1,000,000 is pure CO2.</param>
    /// <param name="pressureAtm">Total pressure of the gas, atm.</param>
    /// <param name="temperatureC">Water temperature, °C.</param>
    /// <param name="salinity">Practical salinity.</param>
    public static double Pco2Uatm(double dryMoleFractionPpm, double pressureAtm, double temperatureC, double salinity) =>
        dryMoleFractionPpm * (pressureAtm - WaterVapourWP80.PressureAtm(temperatureC + 273.15, salinity));

    /// <summary>Standard-atmosphere barometric pressure, atm, at an elevation in metres above the sea. Valid −500…5,000 m.</summary>
    /// <remarks>(1 − 2.25577e-5·h)^5.25588, coefficients from memory. Source: ISO75.</remarks>
    public static double PressureAtmAtElevation(double elevationM) => Math.Pow(1 - 2.25577e-5 * elevationM, 5.25588);
}
