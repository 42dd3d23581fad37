using TankChem.Chemistry;

namespace TankChem.Simulation.Waters;

/// <summary>What a virtual water is made of at the start, apart from what lives in it.</summary>
public sealed record WaterRecipe
{
    /// <summary>Alkalinity, mmol/L.</summary>
    public required double AlkalinityMmolL { get; init; }

    /// <summary>Practical salinity; 0 is fresh.</summary>
    public double Salinity { get; init; }

    /// <summary>Major ions of a fresh water; null when not known.</summary>
    public IonComposition? Ions { get; init; }

    /// <summary>Calcium, mmol/L.</summary>
    public double CalciumMmolL { get; init; } = 1;

    /// <summary>Total ammonia nitrogen, mmol/L as N.</summary>
    public double TanMmolL { get; init; }

    /// <summary>Nitrate, mmol/L as N.</summary>
    public double NitrateMmolL { get; init; }

    /// <summary>Dissolved CO2, as a multiple of the equilibrium with the air.</summary>
    public double Co2OverAir { get; init; } = 1;

    /// <summary>The amounts of this water at a temperature, under an air, with the oxygen of that air.</summary>
    /// <param name="temperatureC">Temperature, °C.</param>
    /// <param name="air">The air above.</param>
    public WaterAmounts AmountsAt(double temperatureC, Air air)
    {
        double density = Density.KgPerL(temperatureC, Salinity);
        var solution = new Solution
        {
            TemperatureC = temperatureC,
            Salinity = Salinity,
            PressureAtm = air.PressureAtm,
            Ions = Ions,
            AmmoniaUmolKg = TanMmolL / density * 1000,
        };
        CarbonateState state = CarbonateSystem.Solve(solution, new CarbonateInput
        {
            AlkalinityUmolKg = AlkalinityMmolL / density * 1000,
            Pco2Uatm = Co2OverAir * Atmosphere.Pco2Uatm(air.Co2Ppm, air.PressureAtm, temperatureC, Salinity),
        });
        if (state.Status != SolveStatus.Solved)
            throw new InvalidOperationException($"The recipe of this water has no solution ({state.Status}): {state.FaultyArgument}.");
        double oxygen = DissolvedOxygen.SaturationMgL(temperatureC, Salinity, air.PressureAtm) / Molar.Oxygen;
        return new WaterAmounts(state.DicUmolKg * density / 1000, AlkalinityMmolL, TanMmolL, NitrateMmolL, oxygen, CalciumMmolL);
    }
}
