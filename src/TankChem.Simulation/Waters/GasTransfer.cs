namespace TankChem.Simulation.Waters;

/// <summary>Gas transfer between a water and its air: dC/dt = kLa·(C* − C).</summary>
/// <remarks>
/// kLa at T is kLa20·1.024^(T − 20) (the aeration standard's temperature factor). CO2 transfers 0.9 times as fast as oxygen: the square root of the
/// ratio of their diffusivities, 1.92/2.35 (the diffusivities of the PHREEQC databases).
/// </remarks>
public static class GasTransfer
{
    /// <summary>kLa of CO2 over that of oxygen.</summary>
    public const double Co2OverOxygen = 0.9;

    private const double TemperatureFactor = 1.024;

    // Below it the series is more exact than the difference of two nearly equal numbers.
    private const double SmallDecay = 1e-6;

    /// <summary>kLa of oxygen, 1/h, at a temperature.</summary>
    /// <param name="kla20PerHour">kLa of oxygen at 20 °C, 1/h.</param>
    /// <param name="temperatureC">Temperature, °C.</param>
    public static double OxygenKla(double kla20PerHour, double temperatureC) => kla20PerHour * Math.Pow(TemperatureFactor, temperatureC - 20);

    /// <summary>Steps a water by steady rates and by gas exchange together, and books both.</summary>
    /// <remarks>
    /// With CO2 followed to first order in DIC the step is a linear equation, solved exactly, so it is stable at every step and its resting point is the true equilibrium.
    /// </remarks>
    /// <param name="water">The water.</param>
    /// <param name="kla20PerHour">kLa of oxygen at 20 °C, 1/h.</param>
    /// <param name="air">The air above.</param>
    /// <param name="rates">What the other processes bring together, mmol/(L·h); booked by the caller.</param>
    /// <param name="hours">Length of the step, h.</param>
    /// <returns>What crossed the surface, mmol/L.</returns>
    public static WaterAmounts Transfer(WaterBody water, double kla20PerHour, Air air, WaterAmounts rates, double hours)
    {
        ArgumentNullException.ThrowIfNull(water);
        double oxygenKla = OxygenKla(kla20PerHour, water.TemperatureC);
        double oxygen = Exchanged(oxygenKla, 1, water.SaturatedOxygenMmolL - water.Amounts.Oxygen, rates.Oxygen, hours);
        double dic = Exchanged(oxygenKla * Co2OverOxygen, water.Co2SlopePerDic, water.Co2InEquilibriumWith(air) - water.Co2MmolL, rates.Dic, hours);
        return new WaterAmounts(dic, 0, 0, 0, oxygen, 0);
    }

    // x' = source + k·(gap − slope·x), x(0) = 0; the exchanged part is x(h) − source·h.
    private static double Exchanged(double perHour, double slope, double gap, double source, double hours)
    {
        double decay = perHour * slope * hours;
        double share = decay < SmallDecay ? 1 - decay / 2 : (1 - Math.Exp(-decay)) / decay;
        double moved = (source + perHour * gap) * hours * share;
        return moved - source * hours;
    }
}
