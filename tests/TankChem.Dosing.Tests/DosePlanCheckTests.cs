namespace TankChem.Dosing.Tests;

/// <summary>The planner's check of its own answer finds what is wrong with a plan that was spoiled on purpose.</summary>
public class DosePlanCheckTests
{
    private static readonly DoseProblem Problem = Waters.In(2, Waters.Tank(7.2, 1.0));
    private static readonly DoseTarget Target = new("alkalinity", 1.8);
    private static readonly DosePlan Good = DosePlanner.Plan(Problem, Target, []);

    [Fact]
    public void FaultOf_PlanAsMade_IsNone() => Assert.Null(Fault(Good));

    [Fact]
    public void FaultOf_NoSteps_IsTold() => Assert.Contains("no portion", Fault(Good with { Steps = [] }), StringComparison.Ordinal);

    [Fact]
    public void FaultOf_GramsThatDoNotAddUp_IsTold() =>
        Assert.Contains("bring", Fault(With(1, s => s with { AmountG = s.AmountG * 0.9 })), StringComparison.Ordinal);

    [Fact]
    public void FaultOf_PortionTooLarge_IsTold() =>
        Assert.Contains("a portion of", Fault(With(0, s => s with { AmountG = s.AmountG * 3 })), StringComparison.Ordinal);

    [Fact]
    public void FaultOf_NegativePortion_IsTold() =>
        Assert.Contains("a portion of", Fault(With(0, s => s with { AmountG = -1 })), StringComparison.Ordinal);

    [Fact]
    public void FaultOf_PortionsTooClose_IsTold() =>
        Assert.Contains("less than an hour", Fault(With(1, s => s with { AfterS = 600 })), StringComparison.Ordinal);

    [Fact]
    public void FaultOf_TooMuchADay_IsTold() =>
        Assert.Contains("on day 1", DosePlanCheck.FaultOf(Problem with { DosedTodayMmolL = 0.9 }, Target, 1.0, Good), StringComparison.Ordinal);

    [Fact]
    public void FaultOf_LockedReagent_IsTold() =>
        Assert.Contains("may not be dosed", Fault(With(0, s => s with { Reagent = "sodium-hydroxide" })), StringComparison.Ordinal);

    [Fact]
    public void FaultOf_PredictionThatIsNoNumber_IsTold() =>
        Assert.Contains("no water", Fault(With(0, s => s with { Air = s.Air with { PH = new Estimate(double.NaN, 0) } })), StringComparison.Ordinal);

    [Fact]
    public void FaultOf_PredictionWithoutItsAmmonia_IsTold() =>
        Assert.Contains("without its ammonia", Fault(With(0, s => s with { Closed = s.Closed with { Nh3NMgL = null } })), StringComparison.Ordinal);

    [Fact]
    public void FaultOf_PredictionBeyondALimit_IsTold() =>
        Assert.Contains("it breaks pH limit 8.5", Fault(With(0, s => s with { Settled = s.Settled with { PH = new Estimate(8.6, 0.05) } })), StringComparison.Ordinal);

    [Fact]
    public void FaultOf_EndElsewhere_IsTold() =>
        Assert.Contains("ends at", Fault(With(Good.Steps.Count - 1, s => s with { Settled = s.Settled with { AlkalinityMmolL = new Estimate(1.9, 0.05) } })), StringComparison.Ordinal);

    private static string? Fault(DosePlan plan) => DosePlanCheck.FaultOf(Problem, Target, 1.0, plan);

    private static DosePlan With(int at, Func<DoseStep, DoseStep> spoil) => Good with { Steps = [.. Good.Steps.Select((s, i) => i == at ? spoil(s) : s)] };
}
