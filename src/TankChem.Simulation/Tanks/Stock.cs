using TankChem.Chemistry;
using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Tanks;

/// <summary>Animals that are fed: they use oxygen, breathe out CO2 and excrete ammonia in proportion to their feed, more by day than by night.</summary>
/// <remarks>
/// TAN made is 0.092 × feed × protein fraction (Timmons and Ebeling, from memory). CO2 is 1.375 g per g of oxygen at a respiratory quotient of 1; 1.0 to 1.4 in practice.
/// Ammonia leaves the animal as NH3 and so brings one equivalent of alkalinity a mole (Wolf-Gladrow et al. 2007, from memory); nitrification takes it and more back.
/// The daily pattern, a cosine, is common practice, no source.
/// </remarks>
public sealed record Stock
{
    /// <summary>TAN made, kg N per kg of protein fed.</summary>
    public const double TanPerProtein = 0.092;

    private const double HalfSaturationOxygenMmolL = 0.01;

    /// <summary>Feed, kg per day.</summary>
    public required double FeedKgPerDay { get; init; }

    /// <summary>Protein in the feed, 0…1.</summary>
    public required double ProteinShare { get; init; }

    /// <summary>Oxygen used, kg per kg of feed.</summary>
    public double OxygenPerFeed { get; init; } = 0.45;

    /// <summary>CO2 breathed out, g per g of oxygen used; 1.0…1.375.</summary>
    public double Co2PerOxygen { get; init; } = 1.375;

    /// <summary>How far the rate swings about its mean, 0…1.</summary>
    public double DailySwing { get; init; } = 0.25;

    /// <summary>Hour of the day at which the stock breathes most; it excretes most two hours later.</summary>
    public double PeakHour { get; init; } = 15;

    /// <summary>Rates, mmol/(L·h).</summary>
    /// <param name="water">The water.</param>
    /// <param name="hourOfDay">Hour of the day, 0…24.</param>
    /// <param name="feedShare">Share of the usual feed.</param>
    public WaterAmounts Rates(WaterBody water, double hourOfDay, double feedShare)
    {
        ArgumentNullException.ThrowIfNull(water);
        double feedPerHour = FeedKgPerDay * feedShare / 24 * 1000 / water.VolumeM3;
        double oxygen = water.Amounts.Oxygen;
        double breath = oxygen <= 0 ? 0 : oxygen / (HalfSaturationOxygenMmolL + oxygen);
        double used = feedPerHour * OxygenPerFeed * Swing(hourOfDay, PeakHour) * breath;
        double co2 = used * Co2PerOxygen / MolarMass.Co2;
        double tan = feedPerHour * ProteinShare * TanPerProtein * Swing(hourOfDay, PeakHour + 2) / MolarMass.Nitrogen;
        return new WaterAmounts(co2, tan, tan, 0, -used / Molar.Oxygen, 0);
    }

    private double Swing(double hourOfDay, double peakHour) => 1 + DailySwing * Math.Cos(2 * Math.PI * (hourOfDay - peakHour) / 24);
}
