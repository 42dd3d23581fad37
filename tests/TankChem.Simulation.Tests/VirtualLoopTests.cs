using TankChem.Simulation.Tanks;
using TankChem.Simulation.Waters;
using static TankChem.Simulation.Tests.TestWaters;

namespace TankChem.Simulation.Tests;

public sealed class VirtualLoopTests
{
    private static VirtualTank Treatment => new(
        Tank(Fresh with { Co2OverAir = 3 }) with { VolumeM3 = 5, Kla20PerHour = 0.2, DegasserKla20PerHour = 8, Nitrification = new Nitrification { PerHour = 3 } },
        Start,
        OpenAir);

    private static VirtualTank Stocked => new(
        Tank(Fresh) with { VolumeM3 = 8, Kla20PerHour = 0.1, Stock = new Stock { FeedKgPerDay = 3, ProteinShare = 0.45 }, Oxygen = new OxygenSupply(9, 6) },
        Start,
        OpenAir);

    [Fact]
    public void Advance_TwoTanksAndTreatment_FlowMovesEverythingAndLosesNothing()
    {
        var loop = new VirtualLoop(Treatment);
        loop.Add(Stocked, 12);
        loop.Add(Stocked, 7);
        loop.Advance(Start.AddDays(2), OpenAir);
        WaterAmounts sum = loop.Treatment.Water.Ledger[WaterProcess.LoopFlow];
        double moved = Math.Abs(sum.Dic);
        foreach (VirtualTank tank in loop.Tanks)
            sum += tank.Water.Ledger[WaterProcess.LoopFlow];
        Assert.True(moved > 1, $"only {moved} mol moved");
        Assert.Equal(0, sum.Dic, 1e-9 * moved);
        Assert.Equal(0, sum.Alkalinity, 1e-9 * moved);
        Assert.Equal(0, sum.Tan, 1e-9 * moved);
        Assert.Equal(0, sum.Oxygen, 1e-9 * moved);
    }

    [Fact]
    public void Advance_DegasserFails_Co2RisesInTheTanks()
    {
        var loop = new VirtualLoop(Treatment);
        VirtualTank tank = Stocked;
        loop.Add(tank, 16);
        loop.Advance(Start.AddDays(2), OpenAir);
        double before = tank.Solve().Co2MgL;
        loop.Treatment.Controls.DegasserOn = false;
        loop.Advance(Start.AddDays(2).AddHours(4), OpenAir);
        Assert.True(tank.Solve().Co2MgL > before + 10, $"{before} → {tank.Solve().Co2MgL} mg/L");
        Assert.True(tank.Water.Amounts.Oxygen * 31.998 > 7.5, "pure oxygen should hide the failure");
    }

    [Fact]
    public void Add_TankOfAnotherTime_IsRefused()
    {
        var loop = new VirtualLoop(Treatment);
        VirtualTank late = Stocked;
        late.Advance(Start.AddHours(1), OpenAir);
        Assert.Throws<ArgumentException>(() => loop.Add(late, 5));
    }
}
