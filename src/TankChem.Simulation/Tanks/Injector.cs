namespace TankChem.Simulation.Tanks;

/// <summary>CO2 gas through a valve on a timer.</summary>
/// <param name="GramsPerHour">CO2 that dissolves while the valve is open, g/h.</param>
/// <param name="Hours">When the timer opens it.</param>
public sealed record Injector(double GramsPerHour, Hours Hours);
