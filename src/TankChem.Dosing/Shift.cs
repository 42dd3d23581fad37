namespace TankChem.Dosing;

/// <summary>By how many of its standard uncertainties each input is moved.</summary>
internal readonly record struct Shift(double PH = 0, double Alkalinity = 0, double Tan = 0, double Temperature = 0, double Volume = 0);
