using CsCheck;

namespace TankChem.Dosing.Tests;

public class RemedyAdvisorTests
{
    [Fact]
    public void ForHighCo2_WithInjection_BeginsWithGasOffWhateverIsMissing()
    {
        DoseProblem unknown = Waters.In(1) with { VolumeM3 = null, MissingInputs = [new DoseGround("input", "alkalinity", "Scape: alkalinity is not known. Measure it first.", null)] };

        IReadOnlyList<Remedy> remedies = RemedyAdvisor.ForHighCo2(unknown, hasInjection: true);

        Assert.Equal(["gas-off", "add-air", "cut-feed", "exchange", "no-base-first"], remedies.Select(r => r.Id));
        Assert.True(remedies[0].Allowed);
        Assert.DoesNotContain(remedies[0].Reasons, r => r.Contains("alkalinity", StringComparison.OrdinalIgnoreCase));
        Assert.Contains(remedies[1].Reasons, r => r.Contains("alkalinity is not known", StringComparison.Ordinal));
        Assert.Contains(remedies[0].Cautions, c => c.Contains("5,000 ppm", StringComparison.Ordinal));
    }

    [Fact]
    public void ForHighCo2_WithoutInjection_HasNoGasOff() =>
        Assert.DoesNotContain(RemedyAdvisor.ForHighCo2(Waters.In(1, Waters.Tank(6.5, 1)), false), r => r.Id == "gas-off");

    [Fact]
    public void ForHighCo2_BaseAndExchange_AreAdvisedAgainst() =>
        Assert.All(RemedyAdvisor.ForHighCo2(Waters.In(1, Waters.Tank(6.5, 1)), false).Where(r => r.Id is "no-base-first" or "exchange"), r =>
        {
            Assert.False(r.Allowed);
            Assert.NotEmpty(r.Reasons);
        });

    [Fact]
    public void AddAir_LittleAmmonia_GoesBackInsideTheCo2Limit()
    {
        Remedy air = Air(6.6, 0.3);

        Assert.True(air.Allowed);
        Assert.Equal("Add air until CO2 is 12.0 mg/L, then hold", air.Title);
    }

    [Fact]
    public void AddAir_MuchAmmonia_StopsWhereAmmoniaReachesItsLimit()
    {
        Remedy air = Air(6.5, 8);
        RemedyPoint end = air.Path[^1];

        Assert.Equal(Waters.SalmonAmmonia.Value, end.Nh3NMgL!.Value.Value, 1e-5);
        Assert.True(end.Co2MgL.Value > 12);
        Assert.Contains(air.Reasons, r => r.Contains("Stop at", StringComparison.Ordinal));
    }

    [Fact]
    public void AddAir_AmmoniaOverItsLimit_IsNotAllowed()
    {
        Remedy air = Air(7.6, 3);

        Assert.False(air.Allowed);
        Assert.Empty(air.Path);
        Assert.Contains(air.Reasons, r => r.Contains("over its limit", StringComparison.Ordinal));
    }

    [Fact]
    public void AddAir_Co2InDangerAndAmmoniaOverItsWarning_LeadsOutOfTheDangerNoFurther()
    {
        // CO2 54 mg/L kills; stripping to its limit would pass ammonia's limit long before.
        Remedy air = Air(6.33, 30);

        Assert.True(air.Allowed);
        Assert.Equal(36, air.Path[^1].Co2MgL.Value, 1e-4);
        Assert.InRange(air.Path[^1].Nh3NMgL!.Value.Value, Waters.SalmonAmmonia.Value, Waters.SalmonAmmoniaDanger.Value);
        Assert.Contains(air.Reasons, r => r.Contains("Out of the danger first", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData(6.1, "accepted here")]
    [InlineData(6.5, "in steps")]
    public void AddAir_FastRiseOfPh_IsAcceptedOnlyOutOfDanger(double pH, string word) =>
        Assert.Contains(Air(pH, 0.3).Reasons, r => r.Contains(word, StringComparison.Ordinal));

    [Fact]
    public void AddAir_AmmoniaUnknown_GoesOnlyToTheCo2LimitAndAsksForTan()
    {
        Remedy air = Air(6.5, null);

        Assert.Equal(15, air.Path[^1].Co2MgL.Value, 1e-4);
        Assert.Contains(air.Reasons, r => r.Contains("test TAN first", StringComparison.Ordinal));
    }

    [Fact]
    public void AddAir_Co2Low_IsNotNeeded()
    {
        Remedy air = Air(7.4, 0.3);

        Assert.StartsWith("More air is not needed", air.Title, StringComparison.Ordinal);
        Assert.Empty(air.Path);
    }

    [Fact]
    public void AddAir_Path_HasTicksAndGrowsUnsureBeforeItIsHeld()
    {
        IReadOnlyList<RemedyPoint> path = Air(6.3, 0.3).Path;

        Assert.Equal([0, 900, 3600, 21600], path.Select(p => p.AfterS));
        Assert.True(path[1].Co2MgL.StandardUncertainty / path[1].Co2MgL.Value > path[0].Co2MgL.StandardUncertainty / path[0].Co2MgL.Value);

        // Two exchanges an hour: after a quarter of an hour e^-0.5 of the surplus over the air is left.
        double air = new WaterChain(Waters.Tank(6.3, 1, tanMgL: 0.3), 0, default).AirCo2MgL;
        Assert.Equal(air + (path[0].Co2MgL.Value - air) * Math.Exp(-0.5), path[1].Co2MgL.Value, 0.01);
    }

    [Fact]
    public void GasOff_Path_GoesSlowly()
    {
        DoseProblem problem = Waters.In(1, Waters.Tank(6.3, 1));
        IReadOnlyList<Remedy> remedies = RemedyAdvisor.ForHighCo2(problem, hasInjection: true);

        Assert.True(remedies[0].Path[2].Co2MgL.Value > remedies[1].Path[2].Co2MgL.Value);
        Assert.True(remedies[0].Path[2].Co2MgL.Value < remedies[0].Path[0].Co2MgL.Value);
    }

    /// <summary>At fixed alkalinity and TAN the product of CO2 and un-ionised ammonia hardly changes; no advice of air takes ammonia over a limit that it is inside of, but out of danger.</summary>
    [Fact]
    public void AddAir_AnyWater_NeverPassesAnAmmoniaLimitUnsaid() => Gen.Select(Gen.Double[5.8, 8.2], Gen.Double[0.3, 3], Gen.Double[5, 28], Gen.Double[0.05, 20]).Sample((pH, alkalinity, temperature, tan) =>
    {
        Remedy air = RemedyAdvisor.ForHighCo2(Waters.In(1, Waters.Tank(pH, alkalinity, temperature, tan)), false)[0];
        foreach (RemedyPoint point in air.Path)
        {
            Assert.True(point.Nh3NMgL!.Value.Value < Waters.SalmonAmmoniaDanger.Value);
            Assert.True(point.Nh3NMgL.Value.Value <= Waters.SalmonAmmonia.Value * 1.000001 || air.Reasons.Any(r => r.Contains("Out of the danger first", StringComparison.Ordinal)));
            Assert.Equal(1, point.Co2MgL.Value * point.Nh3NMgL.Value.Value / (air.Path[0].Co2MgL.Value * air.Path[0].Nh3NMgL!.Value.Value), 0.15);
        }
    });

    private static Remedy Air(double pH, double? tanMgL) => RemedyAdvisor.ForHighCo2(Waters.In(1, Waters.Tank(pH, 1, tanMgL: tanMgL)), false).Single(r => r.Id == "add-air");
}
