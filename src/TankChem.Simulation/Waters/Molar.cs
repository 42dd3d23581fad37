namespace TankChem.Simulation.Waters;

/// <summary>Molar masses that the chemistry room has no need of, g/mol (IUPAC 2021 standard atomic weights, abridged).</summary>
internal static class Molar
{
    public const double Oxygen = 31.998;
    public const double Sodium = 22.990;
    public const double Potassium = 39.098;
    public const double Chloride = 35.45;
    public const double Sulfate = 96.06;
}
