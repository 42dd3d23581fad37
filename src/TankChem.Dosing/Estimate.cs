namespace TankChem.Dosing;

/// <summary>A number with its standard uncertainty (k = 1), both in the same unit.</summary>
/// <param name="Value">The best value.</param>
/// <param name="StandardUncertainty">One standard deviation, ≥ 0; <see cref="double.NaN"/> when it is not known.</param>
public readonly record struct Estimate(double Value, double StandardUncertainty);
