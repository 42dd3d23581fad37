using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Tanks;

/// <summary>Ammonia turned to nitrate by bacteria, growth of their cells included.</summary>
/// <remarks>
/// NH4⁺ + 1.83 O2 + 1.97 HCO3⁻ → 0.0244 C5H7O2N + 0.976 NO3⁻ + 2.90 H2O + 1.86 CO2 (Ebeling, Timmons and Bisogni 2006): per gram of nitrogen 4.18 g O2 and
/// 7.05 g of alkalinity as CaCO3. Saturation kinetics in TAN, and slower where alkalinity or oxygen run short; the half-saturation constants are common practice, no source.
/// </remarks>
public sealed record Nitrification
{
    /// <summary>Oxygen used, mol per mol N.</summary>
    public const double OxygenPerNitrogen = 1.83;

    /// <summary>Alkalinity used, eq per mol N.</summary>
    public const double AlkalinityPerNitrogen = 1.97;

    /// <summary>Inorganic carbon fixed in cells, mol per mol N: the bicarbonate taken less the CO2 given.</summary>
    public const double CarbonPerNitrogen = 1.97 - 1.86;

    /// <summary>Nitrate made, mol per mol N; the rest is in the cells.</summary>
    public const double NitratePerNitrogen = 0.976;

    private const double HalfSaturationTanMmolL = 0.07;
    private const double HalfSaturationAlkalinityMmolL = 0.15;
    private const double HalfSaturationOxygenMmolL = 0.03;
    private const double TemperatureFactor = 1.05;

    /// <summary>Share of the TAN turned per hour at 20 °C where TAN is low and nothing runs short, 1/h.</summary>
    public required double PerHour { get; init; }

    /// <summary>Rates for a step, mmol/(L·h); TAN decays exponentially within the step, so a long step never takes more than there is.</summary>
    /// <param name="water">The water.</param>
    /// <param name="hours">Length of the step, h.</param>
    public WaterAmounts Rates(WaterBody water, double hours)
    {
        ArgumentNullException.ThrowIfNull(water);
        WaterAmounts now = water.Amounts;
        double perHour = PerHour * Math.Pow(TemperatureFactor, water.TemperatureC - 20)
            * HalfSaturationTanMmolL / (HalfSaturationTanMmolL + now.Tan)
            * Saturation(now.Alkalinity, HalfSaturationAlkalinityMmolL)
            * Saturation(now.Oxygen, HalfSaturationOxygenMmolL);
        double turned = now.Tan * (1 - Math.Exp(-perHour * hours)) / hours;
        return new WaterAmounts(-CarbonPerNitrogen * turned, -AlkalinityPerNitrogen * turned, -turned, NitratePerNitrogen * turned, -OxygenPerNitrogen * turned, 0);
    }

    private static double Saturation(double amount, double half) => amount <= 0 ? 0 : amount / (half + amount);
}
