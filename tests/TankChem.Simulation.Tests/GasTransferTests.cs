using TankChem.Chemistry;
using TankChem.Simulation.Tanks;
using TankChem.Simulation.Waters;
using static TankChem.Simulation.Tests.TestWaters;

namespace TankChem.Simulation.Tests;

public sealed class GasTransferTests
{
    [Theory]
    [InlineData(20, 2)]
    [InlineData(30, 2 * 1.26765)]
    [InlineData(10, 2 * 0.78886)]
    public void OxygenKla_ByTemperature_FollowsTheStandardFactor(double temperatureC, double expected) =>
        Assert.Equal(expected, GasTransfer.OxygenKla(2, temperatureC), 1e-4);

    [Fact]
    public void Transfer_OxygenOnly_DecaysAsTheEquationSays()
    {
        var tank = new VirtualTank(Tank(Fresh) with { Kla20PerHour = 0.8, Oxygen = new OxygenSupply(20, 50) }, Start, OpenAir);
        tank.Advance(Start.AddHours(1), OpenAir);
        double saturated = tank.Water.SaturatedOxygenMmolL;
        double surplus = tank.Water.Amounts.Oxygen - saturated;
        Assert.True(surplus > 0.2, $"surplus {surplus}");
        tank.Controls.OxygenOn = false;
        tank.Advance(Start.AddHours(3), OpenAir);
        Assert.Equal(surplus * Math.Exp(-0.8 * 2), tank.Water.Amounts.Oxygen - saturated, 1e-9);
    }

    [Theory]
    [InlineData(false, 30)]
    [InlineData(false, 0.2)]
    [InlineData(true, 4)]
    public void Advance_Co2LeavingOrEntering_EqualsFineStepsWithExactChemistry(bool sea, double co2OverAir)
    {
        WaterRecipe recipe = (sea ? Sea : Fresh) with { Co2OverAir = co2OverAir };
        var tank = new VirtualTank(Tank(recipe) with { Kla20PerHour = 3 }, Start, OpenAir);
        double startDic = tank.Water.Amounts.Dic;
        double exact = FineSteps(recipe, 3 * GasTransfer.Co2OverOxygen, hours: 2);
        tank.Advance(Start.AddHours(2), OpenAir);
        double moved = Math.Abs(exact - startDic);
        Assert.True(moved > 0.02, $"only {moved} mmol/L moved");
        Assert.Equal(exact, tank.Water.Amounts.Dic, 0.01 * moved);
    }

    // A second way to the same answer: two-second Euler steps, the carbonate system solved exactly in each.
    private static double FineSteps(WaterRecipe recipe, double co2PerHour, double hours)
    {
        const double StepHours = 2.0 / 3600;
        double density = Density.KgPerL(20, recipe.Salinity);
        double dic = recipe.AmountsAt(20, OpenAir).Dic;
        var solution = new Solution { TemperatureC = 20, Salinity = recipe.Salinity, Ions = recipe.Ions };
        double airPco2 = Atmosphere.Pco2Uatm(OpenAir.Co2Ppm, OpenAir.PressureAtm, 20, recipe.Salinity);
        for (double time = 0; time < hours; time += StepHours)
        {
            CarbonateState state = CarbonateSystem.Solve(solution, new CarbonateInput
            {
                DicUmolKg = dic * 1000 / density,
                AlkalinityUmolKg = recipe.AlkalinityMmolL * 1000 / density,
            });
            double co2 = state.Co2UmolKg * density / 1000;
            dic += co2PerHour * (co2 * airPco2 / state.Pco2Uatm - co2) * StepHours;
        }

        return dic;
    }
}
