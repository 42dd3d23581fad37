namespace TankChem.Dosing.Tests;

public class DosePlannerTests
{
    [Fact]
    public void Plan_BicarbonateInOrdinaryWater_IsAllowedInPortions()
    {
        DosePlan plan = Waters.In(1, Waters.Tank(7.2, 1.0)).PlanTo(2.0, "sodium-bicarbonate");

        Assert.True(plan.Allowed);
        Assert.Empty(plan.Grounds);
        Assert.Equal(3, plan.Steps.Count);
        Assert.Equal(84.0, plan.Steps.Sum(s => s.AmountG), 0.1);
        Assert.Equal(2.0, plan.ReachesMmolL!.Value, 1e-9);
        Assert.Contains("100 % pure", plan.Reasons[0], StringComparison.Ordinal);
        Assert.Contains(plan.Cautions, c => c.Contains("competent person", StringComparison.Ordinal));
        Assert.Contains(plan.Cautions, c => c.Contains("goggles", StringComparison.Ordinal));
    }

    [Fact]
    public void Plan_EachStep_LiesBetweenItsTwoBounds()
    {
        DoseWater water = Waters.Tank(7.2, 1.0);
        DosePlan plan = Waters.In(1, water).PlanTo(2.0);

        foreach (DoseStep step in plan.Steps)
        {
            // Back at its own CO2, not lower: pH rises by the logarithm of the alkalinity's ratio, activities aside.
            double ratio = step.Settled.AlkalinityMmolL.Value / 1.0;
            Assert.Equal(7.2 + Math.Log10(ratio), step.Settled.PH.Value, 0.03);
            Assert.Equal(plan.Steps[0].Settled.Co2MgL.Value, step.Settled.Co2MgL.Value, 0.02);
            Assert.True(step.Air.PH.Value > step.Settled.PH.Value && step.Air.Co2MgL.Value < 1);
        }
    }

    /// <summary>The worked effect that shows why carbonate kills (15 °C, alkalinity 50, pH 7.00, TAN 2): carbonate for 50 mg/L more goes to pH 9.5 and 0.98 mg/L of un-ionised ammonia in a closed water.</summary>
    [Fact]
    public void Plan_CarbonateWithAmmoniaPresent_IsRefusedAndBicarbonateOffered()
    {
        DosePlan plan = Waters.In(10, Waters.Worked()).PlanTo(100 / 50.043, "sodium-carbonate");

        Assert.False(plan.Allowed);
        DoseGround ammonia = Assert.Single(plan.Grounds, g => g.Quantity == "nh3-n");
        Assert.Equal("limit", ammonia.Kind);
        Assert.True(ammonia.Probability > 0.99);
        Assert.Contains("sodium bicarbonate", plan.Nearest, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("sodium-bicarbonate", 7.30, 0.011)]
    [InlineData("sodium-carbonate", 9.55, 0.98)]
    public void Predict_WorkedEffect_IsThatOfTheHandComputation(string reagent, double pH, double ammonia)
    {
        Predicted closed = new WaterChain(Waters.Worked(), 0, default).Closed(ReagentCatalog.Find(reagent)!, 1000 * 50 / 50.043);

        // The hand computation leaves ion pairs and the ammonia in alkalinity out.
        Assert.Equal(pH, closed.PH, 0.4);
        Assert.InRange(closed.Nh3NMgL, ammonia * 0.6, ammonia * 1.2);
    }

    [Fact]
    public void Plan_WorkedWaterWithLittleAmmonia_IsAllowedWithBicarbonate() =>
        Assert.True(Waters.In(10, Waters.Worked(tanMgL: 0.5)).PlanTo(100 / 50.043).Allowed);

    [Fact]
    public void Plan_TheSameProblemTwice_GivesTheSamePlan()
    {
        DoseProblem problem = Waters.In(42, Waters.Tank(7.1, 0.6), Waters.Tank(7.3, 0.6, name: "Raceway 2"));

        Assert.Equivalent(problem.PlanTo(1.8), problem.PlanTo(1.8), strict: true);
    }

    [Fact]
    public void Plan_SeveralTanks_IsJudgedInEach()
    {
        DoseWater tight = Waters.Tank(7.2, 1.0, name: "Raceway 2") with { Limits = [new DoseLimit("ph", true, 7.3, false, "pH limit 7.3 for a stock of its own")] };
        DoseProblem problem = Waters.In(42, Waters.Tank(7.2, 1.0), tight);

        DosePlan plan = problem.PlanTo(2.0);

        Assert.False(plan.Allowed);
        Assert.All(plan.Grounds, g => Assert.StartsWith("Raceway 2", g.Text, StringComparison.Ordinal));
        Assert.True(Waters.In(42, Waters.Tank(7.2, 1.0)).PlanTo(2.0).Allowed);
    }

    [Fact]
    public void Plan_SoftWater_TakesSmallerPortionsSoThatPhRisesSlowly()
    {
        DosePlan plan = Waters.In(1, Waters.Tank(6.8, 0.3)).PlanTo(1.2);

        Assert.True(plan.Allowed);
        double before = 6.8;
        foreach (DoseStep step in plan.Steps)
        {
            Assert.True(step.Settled.PH.Value - before <= 0.2, $"{step.Settled.PH.Value - before} at {step.AfterS} s");
            before = step.Settled.PH.Value;
        }

        Assert.True(plan.Steps[0].AmountG < 0.3 * 84);
        Assert.True(plan.Steps.Where(s => s.AfterS < 24 * 3600).Max(s => s.Settled.PH.Value) < 6.8 + 0.5);
        Assert.True(plan.Steps[^1].AfterS >= 24 * 3600, "0.6 of pH is more than a day's rise");
    }

    [Fact]
    public void Plan_DosedToday_LeavesOnlyTheRestOfTheDay()
    {
        DosePlan plan = (Waters.In(1, Waters.Tank(7.2, 1.0)) with { DosedTodayMmolL = 0.8 }).PlanTo(1.6);

        Assert.True(plan.Allowed);
        double[] today = [.. plan.Steps.Where(s => s.AfterS < 24 * 3600).Select(s => s.AmountG)];
        Assert.True(today.Sum() <= 0.2 * 84.006 + 1e-6, $"{today.Sum()} g today");
        Assert.Equal(0.6 * 84.006, plan.Steps.Sum(s => s.AmountG), 0.01);
    }

    [Fact]
    public void Plan_DayIsFull_StartsTomorrow()
    {
        DosePlan plan = (Waters.In(1, Waters.Tank(7.2, 1.0)) with { DosedTodayMmolL = 1.4 }).PlanTo(1.4);

        Assert.True(plan.Allowed);
        Assert.Equal(24 * 3600, plan.Steps[0].AfterS);
    }

    [Fact]
    public void Plan_HighCo2AndNoReagentNamed_TakesCarbonateBecauseBicarbonateBringsMore()
    {
        DoseProblem problem = Waters.In(1, Waters.Tank(6.8, 1.0, 15, 0.2));

        DosePlan own = problem.PlanTo(1.5);

        Assert.True(own.Allowed);
        Assert.All(own.Steps, s => Assert.Equal("sodium-carbonate", s.Reagent));
        Assert.All(own.Steps, s => Assert.True(s.Closed.Co2MgL.Value < s.Settled.Co2MgL.Value));
        Assert.Contains(own.Cautions, c => c.Contains("Gas off and more air come first", StringComparison.Ordinal));
        Assert.Contains(problem.PlanTo(1.5, "sodium-bicarbonate").Grounds, g => g.Quantity == "co2");
    }

    [Fact]
    public void Plan_Co2InsideButNotSure_DoesNotRefuseBicarbonateForARipple()
    {
        DoseProblem problem = Waters.In(1, Waters.Tank(6.9, 1.0, 15, 0.2));
        PredictedWater now = new WaterModel(problem.Waters[0], 0.05).Predict(c => c.Now)!;

        Assert.True(LimitJudge.Probability(Waters.SalmonCo2, now.Co2MgL) < 0.95);
        Assert.True(problem.PlanTo(1.5, "sodium-bicarbonate").Allowed);
    }

    [Fact]
    public void Plan_OrdinaryWaterWhoseAirPhIsHigh_IsNotRefusedForThat()
    {
        DosePlan plan = Waters.In(42, Waters.Tank(7.1, 1.0, 12, 0.5)).PlanTo(2.0);

        Assert.True(plan.Allowed);
        Assert.True(plan.Steps[^1].Air.Nh3NMgL!.Value.Value > Waters.SalmonAmmonia.Value);
        Assert.Contains(plan.Cautions, c => c.Contains("do not strip CO2 harder", StringComparison.Ordinal));
    }

    [Fact]
    public void Plan_DoseThatMakesStrippingLethal_IsRefused()
    {
        // Inside the danger limit when all CO2 is stripped today, beyond it with the dose; at its own CO2 ammonia is far below.
        DosePlan plan = Waters.In(42, Waters.Tank(6.9, 1.0, 12, 1.3)).PlanTo(2.0);

        Assert.False(plan.Allowed);
        DoseGround ground = Assert.Single(plan.Grounds);
        Assert.Equal("nh3-n", ground.Quantity);
        Assert.Contains("stripped out", ground.Text, StringComparison.Ordinal);
        Assert.NotNull(plan.Nearest);
    }

    [Fact]
    public void Plan_HardWater_WarnsOfChalk()
    {
        DoseWater hard = Waters.Tank(7.6, 3.5, 25, 0.05) with { Limits = [] };
        DosePlan plan = Waters.In(1, hard with { Solution = hard.Solution with { HardnessMmolKg = 4 } }).PlanTo(4.4);

        Assert.True(plan.Allowed);
        Assert.Contains(plan.Cautions, c => c.Contains("calcite", StringComparison.Ordinal));
    }

    [Fact]
    public void Plan_Sea_WarnsOfAragonite()
    {
        DosePlan plan = Waters.In(0.5, Reef()).PlanTo(3.2);

        Assert.True(plan.Allowed);
        Assert.Contains(plan.Cautions, c => c.Contains("aragonite", StringComparison.Ordinal));
        Assert.Contains(plan.Cautions, c => c.Contains("not measured here", StringComparison.Ordinal));
    }

    [Fact]
    public void Plan_BeyondAnUpperAlkalinityLimit_IsRefusedAndTheNearestNamed()
    {
        DosePlan plan = Waters.In(0.5, Reef() with { AlkalinityUmolKg = new Estimate(3000, 60) }).PlanTo(4.1);

        Assert.False(plan.Allowed);
        Assert.Contains(plan.Grounds, g => g is { Kind: "limit", Quantity: "alkalinity", Probability: > 0.5 });
        Assert.Matches("to 3\\.[5-9]", plan.Nearest);
    }

    private static DoseWater Reef() => Waters.Tank(8.15, 2.6, 25, null, salinity: 35) with
    {
        AmmoniaMatters = false,
        AlkalinityUmolKg = new Estimate(2500, 50),
        Limits = [new DoseLimit("ph", true, 8.5, false, "pH limit 8.5 for the reef"), new DoseLimit("ph", false, 7.8, false, "pH limit 7.8 for the reef"), new DoseLimit("alkalinity", true, 4.0, false, "Alkalinity limit 4 mmol/L for the reef")],
    };
}
