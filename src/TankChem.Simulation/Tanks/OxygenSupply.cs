using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Tanks;

/// <summary>Pure oxygen dissolved by a controller that keeps a set-point. It brings no air, so it strips no CO2.</summary>
/// <param name="SetPointMgL">Set-point, mg/L.</param>
/// <param name="PerHour">Share of the shortfall made up per hour, 1/h.</param>
public sealed record OxygenSupply(double SetPointMgL, double PerHour)
{
    /// <summary>Rates, mmol/(L·h).</summary>
    public WaterAmounts Rates(WaterBody water)
    {
        ArgumentNullException.ThrowIfNull(water);
        return new WaterAmounts(0, 0, 0, 0, PerHour * Math.Max(0, SetPointMgL / Molar.Oxygen - water.Amounts.Oxygen), 0);
    }
}
