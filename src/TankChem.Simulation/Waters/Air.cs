namespace TankChem.Simulation.Waters;

/// <summary>The air above a water.</summary>
/// <param name="Co2Ppm">CO2, ppm dry mole fraction.</param>
/// <param name="PressureAtm">Barometric pressure, atm.</param>
public readonly record struct Air(double Co2Ppm, double PressureAtm);
