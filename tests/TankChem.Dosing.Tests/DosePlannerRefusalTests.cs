namespace TankChem.Dosing.Tests;

public class DosePlannerRefusalTests
{
    [Fact]
    public void Plan_AmmoniaUnknown_IsRefusedNeverTakenAsZero() =>
        Assert.Equal(
            [new DoseGround("input", "tan", "Raceway 1: total ammonia is not known. Raising pH turns ammonia toxic: test TAN first.", null)],
            Refused(Waters.In(1, Waters.Tank(7.2, 1.0, tanMgL: null)), 1.5).Grounds);

    [Fact]
    public void Plan_MissingInputs_AreItsGrounds()
    {
        var missing = new DoseGround("input", "alkalinity", "Raceway 1: alkalinity is not known. Measure it first.", null);

        DosePlan plan = Refused(Waters.In(1) with { MissingInputs = [missing] }, 1.5);

        Assert.Equal([missing], plan.Grounds);
        Assert.Empty(plan.Steps);
    }

    [Theory]
    [InlineData(0.9)]
    [InlineData(1.0)]
    public void Plan_TargetNotAboveToday_IsRefusedWithToday(double target)
    {
        DoseWater exact = Waters.Tank(7.2, 1.0);

        DoseGround ground = Assert.Single(Refused(Waters.In(1, exact), target).Grounds);

        Assert.Equal(("input", "alkalinity", (double?)null), (ground.Kind, ground.Quantity, ground.Probability));
        Assert.Contains("1.00 mmol/L already", ground.Text, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(0)]
    [InlineData(-1)]
    [InlineData(10.1)]
    [InlineData(1e308)]
    public void Plan_AbsurdTarget_IsRefusedWithWhatWouldBeRight(double target) =>
        Assert.Contains("at most 10 mmol/L", Assert.Single(Refused(Waters.In(1, Waters.Tank(7.2, 1.0)), target).Grounds).Text, StringComparison.Ordinal);

    [Fact]
    public void Plan_AnotherQuantity_IsRefused()
    {
        DosePlan plan = DosePlanner.Plan(Waters.In(1, Waters.Tank(7.2, 1.0)), new DoseTarget("ph", 7.5), []);

        Assert.Equal(("input", "ph"), (Assert.Single(plan.Grounds).Kind, plan.Grounds[0].Quantity));
    }

    [Fact]
    public void Plan_UnknownReagent_IsRefusedNamingTheKnownOnes()
    {
        string text = Assert.Single(Refused(Waters.In(1, Waters.Tank(7.2, 1.0)), 1.5, "baking-powder").Grounds).Text;

        Assert.Contains("\"baking-powder\"", text, StringComparison.Ordinal);
        Assert.All(ReagentCatalog.All, r => Assert.Equal(!r.Locked, text.Contains(r.Id, StringComparison.Ordinal)));
    }

    [Theory]
    [InlineData("calcium-hydroxide")]
    [InlineData("sodium-hydroxide")]
    [InlineData("hydrochloric-acid")]
    public void Plan_StrongAcidOrBase_IsRefusedUntilUnlocked(string reagent) =>
        Assert.Contains("competent person unlocks", Assert.Single(Refused(Waters.In(1, Waters.Tank(7.2, 1.0)), 1.5, reagent).Grounds).Text, StringComparison.Ordinal);

    [Theory]
    [InlineData(null)]
    [InlineData(0.0)]
    [InlineData(-3.0)]
    [InlineData(double.NaN)]
    public void Plan_NoVolume_IsRefused(double? volume) =>
        Assert.Equal("volume", Assert.Single(Refused(Waters.In(1, Waters.Tank(7.2, 1.0)) with { VolumeM3 = volume }, 1.5).Grounds).Quantity);

    [Theory]
    [InlineData(0, 1, 0)]
    [InlineData(0.4, 0, 0)]
    [InlineData(0.4, double.NaN, 0)]
    [InlineData(0.4, 1, double.NaN)]
    public void Plan_PaceThatIsNone_IsRefused(double step, double day, double today) =>
        Assert.Equal("input", Assert.Single(Refused(Waters.In(1, Waters.Tank(7.2, 1.0)) with { StepMmolLMax = step, DayMmolLMax = day, DosedTodayMmolL = today }, 1.5).Grounds).Kind);

    [Fact]
    public void Plan_WaterThatCannotBe_IsRefused()
    {
        // pH 11 needs more alkalinity than there is.
        DosePlan plan = Refused(Waters.In(1, Waters.Tank(11, 0.05)), 1.5);

        Assert.Contains("do not belong to one water", Assert.Single(plan.Grounds).Text, StringComparison.Ordinal);
    }

    [Fact]
    public void Plan_FarTarget_IsRefusedForItsPaceWithTheNearest()
    {
        DosePlan plan = Refused(Waters.In(1, Waters.Tank(7.2, 1.0) with { Limits = [] }), 9.9);

        Assert.Contains("7 days", Assert.Single(plan.Grounds).Text, StringComparison.Ordinal);
        Assert.NotNull(plan.Nearest);
    }

    [Fact]
    public void Plan_SeveralFaults_AreToldTogether()
    {
        DosePlan plan = Refused(Waters.In(1, Waters.Tank(7.2, 1.0, tanMgL: null)) with { VolumeM3 = null }, 99, "baking-powder");

        Assert.Equal(["alkalinity", "reagent", "tan", "volume"], plan.Grounds.Select(g => g.Quantity).Order());
    }

    [Fact]
    public void Plan_AmmoniaOverItsLimit_IsNeverMadeWorse()
    {
        DosePlan plan = Refused(Waters.In(1, Waters.Tank(7.9, 1.0, 12, 2)), 1.2);

        Assert.Contains(plan.Grounds, g => g.Quantity == "nh3-n" && g.Text.Contains("made worse", StringComparison.Ordinal));
        Assert.Null(plan.Nearest);
        Assert.Contains(plan.Cautions, c => c.Contains("total ammonia down first", StringComparison.Ordinal));
    }

    private static DosePlan Refused(DoseProblem problem, double target, params string[] reagents)
    {
        DosePlan plan = problem.PlanTo(target, reagents);
        Assert.False(plan.Allowed);
        Assert.NotEmpty(plan.Grounds);
        Assert.All(plan.Grounds, g => Assert.EndsWith(".", g.Text.TrimEnd(), StringComparison.Ordinal));
        Assert.NotEmpty(plan.Cautions);
        return plan;
    }
}
