using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Tanks;

/// <summary>Skeletons and shells growing: each mole of CaCO3 takes one of carbon, one of calcium and two equivalents of alkalinity. Faster in light.</summary>
public sealed record Calcification
{
    /// <summary>CaCO3 laid down in the dark, mmol/(L·h).</summary>
    public required double DarkMmolLH { get; init; }

    /// <summary>CaCO3 laid down in full light, mmol/(L·h).</summary>
    public required double LightMmolLH { get; init; }

    /// <summary>Rates, mmol/(L·h).</summary>
    /// <param name="lightShare">Light as a share of the full light, 0…1.</param>
    public WaterAmounts Rates(double lightShare)
    {
        double laid = DarkMmolLH + (LightMmolLH - DarkMmolLH) * lightShare;
        return new WaterAmounts(-laid, -2 * laid, 0, 0, 0, -laid);
    }
}
