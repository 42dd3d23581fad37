namespace TankChem.Simulation.Demo;

/// <summary>The people of the demo, invented.</summary>
internal static class DemoPeople
{
    public const string Early = "Ines R.";
    public const string Late = "Tomas W.";
    public const string Display = "Lena K.";
}
