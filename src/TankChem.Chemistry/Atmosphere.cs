namespace TankChem.Chemistry;

/// <summary>What air and other gases above a water mean for it.</summary>
public static class Atmosphere
{
    /// <summary>pCO2, µatm, of water-saturated gas with a given dry mole fraction of CO2.</summary>
    /// <param name="dryMoleFractionPpm">CO2 in dry gas, ppm; 1,000,000 is pure CO2.</param>
    /// <param name="pressureAtm">Total pressure of the gas, atm.</param>
    /// <param name="temperatureC">Water temperature, °C.</param>
    /// <param name="salinity">Practical salinity.</param>
    public static double Pco2Uatm(double dryMoleFractionPpm, double pressureAtm, double temperatureC, double salinity) => throw new NotSupportedException();

    /// <summary>Standard-atmosphere barometric pressure, atm, at an elevation in metres above the sea. Valid −500…5,000 m.</summary>
    public static double PressureAtmAtElevation(double elevationM) => throw new NotSupportedException();
}
