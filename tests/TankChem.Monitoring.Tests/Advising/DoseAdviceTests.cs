using TankChem.Dosing;
using TankChem.Monitoring.Advising;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Tests.Monitors;

namespace TankChem.Monitoring.Tests.Advising;

public sealed class DoseAdviceTests
{
    private static readonly (string, double)[] Water = [("ph", 7.2), ("temperature", 12), ("alkalinity", 1.0), ("tan", 0.3)];

    [Fact]
    public void Problem_TankOfItsOwn_HasItsWaterAndLimits()
    {
        DoseProblem problem = Problem(Tank().At(0, Water).Snapshot);

        Assert.Empty(problem.MissingInputs);
        DoseWater water = Assert.Single(problem.Waters);
        Assert.Equal(9, problem.VolumeM3);
        Assert.Equal(7.2, water.PH.Value);
        Assert.Equal(0.1, water.PH.StandardUncertainty, 1e-3);
        Assert.Equal(1.0, water.AlkalinityUmolKg.Value * Chemistry.Density.KgPerL(12, 0) / 1000, 1e-9);
        Assert.Equal(0.3, water.TanMgL!.Value.Value);
        Assert.True(water.AmmoniaMatters);
        Assert.Equal(["alkalinity", "co2", "nh3-n", "ph"], water.Limits.Select(l => l.Quantity).Distinct().Order());
        Assert.True(DosePlanner.Plan(problem, new DoseTarget("alkalinity", 1.5), []).Allowed);
    }

    [Fact]
    public void Problem_OnlyDangerLimits_AreLethal()
    {
        PlaceSnapshot snapshot = Tank().At(0, Water).Snapshot;
        DoseWater water = Problem(snapshot).Waters[0];

        Assert.Equal(
            snapshot.Limits.Where(l => l.IsDanger).Select(l => (l.Quantity, l.Value)).Order(),
            water.Limits.Where(l => l.Lethal).Select(l => (l.Quantity, l.Value)).Order());
        Assert.Contains(water.Limits, l => l is { Quantity: "nh3-n", Lethal: true });
        Assert.Contains(water.Limits, l => l is { Quantity: "nh3-n", Lethal: false });
        Assert.DoesNotContain(water.Limits, l => l is { Quantity: "ph", Lethal: true });
    }

    [Fact]
    public void Problem_AlkalinityNeverMeasured_IsAGround() => Refuses(
        new DoseGround("input", "alkalinity", "Grow-out 1: alkalinity is not known. Measure it first.", null),
        Tank().At(0, ("ph", 7.2), ("temperature", 12), ("tan", 0.3)));

    [Fact]
    public void Problem_AlkalinityOfUnconfirmedUnit_IsAGround() => Refuses(
        new DoseGround("input", "alkalinity", "Grow-out 1: the unit of alkalinity is not confirmed (3.1 of what?). Confirm it first.", null),
        Tank().At(0, ("ph", 7.2), ("temperature", 12), ("tan", 0.3)).Take(0, Farm.Unconfirmed("alkalinity", 3.1, Farm.Start)));

    [Fact]
    public void Problem_PhTooOld_IsAGround() => Refuses(
        new DoseGround("input", "ph", "Grow-out 1: pH is too old, last known 1 May 10:00 UTC. Measure it first.", null),
        Tank().At(0, Water).At(30, ("temperature", 12)));

    [Fact]
    public void Problem_TanNeverMeasured_AsksForTheTestFirst() => Refuses(
        new DoseGround("input", "tan", "Grow-out 1: total ammonia is not known. Raising pH turns ammonia toxic: test TAN first.", null),
        Tank().At(0, ("ph", 7.2), ("temperature", 12), ("alkalinity", 1)));

    [Fact]
    public void Problem_SuspectTan_AsksForTheTestFirst()
    {
        Watch watch = Tank().At(0, ("ph", 7.2), ("temperature", 12), ("alkalinity", 1))
            .Take(0, Farm.Read("tan", 0.3, Farm.Start) with { Flag = QualityFlag.Suspect, Reason = "clock ahead" });

        Assert.Contains("not usable (clock ahead)", Assert.Single(Problem(watch.Snapshot).MissingInputs).Text, StringComparison.Ordinal);
    }

    [Fact]
    public void Problem_PlantedOrReef_NeedsNoTan()
    {
        Watch watch = new(Farm.Tank("planted") with { VolumeM3 = 0.3 });

        DoseProblem problem = Problem(watch.At(0, ("ph", 6.9), ("temperature", 25), ("alkalinity", 1)).Snapshot);

        Assert.Empty(problem.MissingInputs);
        Assert.False(problem.Waters[0].AmmoniaMatters);
        Assert.Null(problem.Waters[0].TanMgL);
    }

    [Fact]
    public void Problem_PlantedWithFishOfAGroup_NeedsTan() =>
        Assert.Contains(Problem(new Watch(Farm.Tank("planted", "warm-water") with { VolumeM3 = 0.3 }).At(0, ("ph", 6.9), ("temperature", 25), ("alkalinity", 1)).Snapshot).MissingInputs, g => g.Quantity == "tan");

    [Fact]
    public void Problem_TanBelowWhatAKitTells_IsNeverZero() =>
        Assert.True(Problem(Tank().At(0, ("ph", 7.2), ("temperature", 12), ("alkalinity", 1.0), ("tan", 0)).Snapshot).Waters[0].TanMgL is { Value: >= 0.05, StandardUncertainty: > 0 });

    [Fact]
    public void Problem_PlaceNotSetUp_IsRefused()
    {
        var watch = new Watch(new PlaceDefinition { Key = Farm.TankKey, Kind = PlaceKind.Tank, Name = "tank-1", Assigned = false });

        DosePlan plan = DosePlanner.Plan(Problem(watch.At(0, Water).Snapshot), new DoseTarget("alkalinity", 2), []);

        Assert.False(plan.Allowed);
        Assert.Contains(plan.Grounds, g => g is { Kind: "input", Quantity: "place" });
        Assert.Contains(plan.Grounds, g => g is { Kind: "input", Quantity: "volume" });
    }

    [Fact]
    public void Problem_TankWithoutStock_IsRefusedBecauseNoLimitIsKnown() =>
        Assert.Contains(Problem(new Watch(Farm.Tank() with { VolumeM3 = 1 }).At(0, Water).Snapshot).MissingInputs, g => g.Text.Contains("no stock on record", StringComparison.Ordinal));

    [Fact]
    public void Problem_TankInALoop_IsMadeOnTheLoopsVolumeAndChecksAllItsTanks()
    {
        (PlaceSnapshot first, PlaceSnapshot second, PlaceSnapshot loop) = LoopOfTwo();

        DoseProblem problem = DoseAdvice.Problem(first, loop, [first, second], Farm.Start, 0.1);
        DosePlan plan = DosePlanner.Plan(problem, new DoseTarget("alkalinity", 1.3), []);

        Assert.Equal(42, problem.VolumeM3);
        Assert.Equal(["Grow-out 1", "Grow-out 2"], problem.Waters.Select(w => w.Name));
        Assert.Equal(0.1, problem.DosedTodayMmolL);
        Assert.True(plan.Allowed, string.Join(' ', plan.Grounds.Select(g => g.Text)));
        Assert.Equal(0.3 * 42 * 84.006, plan.Steps.Sum(s => s.AmountG), 0.5);
    }

    [Fact]
    public void Problem_LoopItself_ChecksEveryTank()
    {
        (PlaceSnapshot first, PlaceSnapshot second, PlaceSnapshot loop) = LoopOfTwo();

        DoseProblem problem = DoseAdvice.Problem(loop, loop, [first, second], Farm.Start, 0);

        Assert.Equal(42, problem.VolumeM3);
        Assert.Equal(2, problem.Waters.Count);
        Assert.Empty(problem.MissingInputs);
    }

    [Fact]
    public void Problem_OneTankOfTheLoopUnknown_IsRefusedNamingIt()
    {
        (PlaceSnapshot first, PlaceSnapshot _, PlaceSnapshot loop) = LoopOfTwo();
        PlaceSnapshot silent = Second().Take(0, Shared()).Snapshot;

        DoseProblem problem = DoseAdvice.Problem(first, loop, [first, silent], Farm.Start, 0);

        Assert.Contains(problem.MissingInputs, g => g.Quantity == "ph" && g.Text.StartsWith("Grow-out 2", StringComparison.Ordinal));
    }

    [Fact]
    public void Problem_LoopWithoutTanks_IsRefused()
    {
        PlaceSnapshot loop = new Watch(Farm.Loop with { VolumeM3 = 42 }).Snapshot;

        Assert.Contains(DoseAdvice.Problem(loop, loop, [], Farm.Start, 0).MissingInputs, g => g.Text.Contains("No tank is set up", StringComparison.Ordinal));
    }

    [Fact]
    public void Problem_LoopThatIsNotSetUp_IsRefusedForItsVolumeNotTheTanks()
    {
        PlaceSnapshot tank = new Watch(Farm.Tank("salmonid") with { VolumeM3 = 9, Loop = "loop-a" }).At(0, Water).Snapshot;

        Assert.Equal("volume", Assert.Single(DoseAdvice.Problem(tank, null, [], Farm.Start, 0).MissingInputs).Quantity);
    }

    [Theory]
    [InlineData("reef", 0.357, 0.3)]
    [InlineData("salmonid", 1.0, 0.5)]
    [InlineData("salmonid-early", 1.0, 0.3)]
    public void Problem_Stock_SetsThePace(string stock, double day, double pHDay)
    {
        DoseProblem problem = Problem(new Watch(Farm.Tank(stock) with { VolumeM3 = 1, Salinity = stock == "reef" ? 35 : 0 }).At(0, Water).Snapshot);

        Assert.Equal(day, problem.DayMmolLMax);
        Assert.Equal(pHDay, problem.Waters[0].PhRisePerDayMax);
    }

    private static Watch Tank() => new(Farm.Tank("salmonid") with { VolumeM3 = 9 });

    private static DoseProblem Problem(PlaceSnapshot snapshot) => DoseAdvice.Problem(snapshot, null, [], Farm.Start.AddMinutes(30), 0);

    private static void Refuses(DoseGround ground, Watch watch)
    {
        DoseProblem problem = Problem(watch.Snapshot);
        DosePlan plan = DosePlanner.Plan(problem, new DoseTarget("alkalinity", 2), []);

        Assert.Equal([ground], problem.MissingInputs);
        Assert.False(plan.Allowed);
        Assert.Equal([ground], plan.Grounds);
        Assert.Empty(plan.Steps);
    }

    private static readonly PlaceDefinition LoopPlace = Farm.Loop with { VolumeM3 = 42 };

    private static Watch Second() => new(Farm.Tank("salmonid") with { Key = new PlaceKey(Farm.SiteId, "tank-2"), Name = "Grow-out 2", VolumeM3 = 9, Loop = "loop-a" }, LoopPlace);

    private static Reading[] Shared() =>
        [.. new[] { ("alkalinity", 1.0), ("temperature", 12.0), ("tan", 0.2) }.Select(r => Farm.Read(r.Item1, r.Item2, Farm.Start, Farm.LoopKey))];

    private static (PlaceSnapshot First, PlaceSnapshot Second, PlaceSnapshot Loop) LoopOfTwo()
    {
        PlaceDefinition tank = Farm.Tank("salmonid") with { VolumeM3 = 9, Loop = "loop-a" };
        return (
            new Watch(tank, LoopPlace).Take(0, Shared()).At(0, ("ph", 7.1)).Snapshot,
            Second().Take(0, Shared()).At(0, ("ph", 7.2)).Snapshot,
            new Watch(LoopPlace, tank).Take(0, Shared()).Snapshot);
    }
}
