using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Tanks;

/// <summary>A doser that keeps alkalinity near a set-point, with calcium to match where skeletons grow.</summary>
/// <param name="SetPointMmolL">Set-point, mmol/L.</param>
/// <param name="PerHour">Share of the shortfall made up per hour, 1/h.</param>
/// <param name="CarbonPerEquivalent">Carbon that comes with the alkalinity, mol/eq: 1 for bicarbonate, 0.5 for carbonate, 0 for hydroxide.</param>
/// <param name="CalciumPerEquivalent">Calcium that comes with it, mol/eq: 0.5 replaces what skeletons took.</param>
public sealed record AlkalinityDoser(double SetPointMmolL, double PerHour, double CarbonPerEquivalent = 1, double CalciumPerEquivalent = 0)
{
    /// <summary>Rates, mmol/(L·h).</summary>
    public WaterAmounts Rates(WaterBody water)
    {
        ArgumentNullException.ThrowIfNull(water);
        double dosed = PerHour * Math.Max(0, SetPointMmolL - water.Amounts.Alkalinity);
        return new WaterAmounts(CarbonPerEquivalent * dosed, dosed, 0, 0, 0, CalciumPerEquivalent * dosed);
    }
}
