namespace TankChem.Dosing.Tests;

public class LimitJudgeTests
{
    /// <summary>Values of the normal law to seven digits: Abramowitz &amp; Stegun 1964, table 26.1.</summary>
    [Theory]
    [InlineData(0, 0.5)]
    [InlineData(1, 0.8413447)]
    [InlineData(1.6448536, 0.95)]
    [InlineData(-1.96, 0.0249979)]
    [InlineData(3.0902323, 0.999)]
    public void Below_Quantile_IsThatOfTheTable(double z, double probability) =>
        Assert.Equal(probability, NormalLaw.Below(z), 1e-7);

    [Theory]
    [InlineData(0.05)]
    [InlineData(0.23)]
    [InlineData(0.9)]
    public void Sigma_OfItsOwnEstimate_IsTheSame(double sigma) =>
        Assert.Equal(sigma, LogNormal.Sigma(LogNormal.Estimate(0.004, sigma)), 1e-12);

    [Fact]
    public void Probability_AmmoniaTwoSpreadsBelow_IsThatOfTheLogarithm()
    {
        Estimate value = LogNormal.Estimate(0.0125 * Math.Exp(-2 * 0.25), 0.25);

        Assert.Equal(0.9772499, LimitJudge.Probability(Waters.SalmonAmmonia, value), 1e-6);
    }

    [Fact]
    public void Probability_LowerLimit_IsTheOtherSide() =>
        Assert.Equal(0.8413447, LimitJudge.Probability(Waters.SalmonPHLow, new Estimate(6.6, 0.1)), 1e-6);

    [Theory]
    [InlineData(0.0124, 1)]
    [InlineData(0.0126, 0)]
    public void Probability_WithoutUncertainty_IsYesOrNo(double value, double probability) =>
        Assert.Equal(probability, LimitJudge.Probability(Waters.SalmonAmmonia, new Estimate(value, 0)), 1e-12);

    [Fact]
    public void Broken_LethalLimit_AsksForMore()
    {
        // 0.99 sure: enough for an ordinary limit, not for a lethal one.
        PredictedWater now = Water(0.001, 0.1), after = Water(0.05 * Math.Exp(-2.3264 * 0.2), 0.2);
        DoseLimit lethal = Waters.SalmonAmmoniaDanger;

        Assert.Empty(LimitJudge.Broken([lethal with { Lethal = false }], now, after, "then", passing: false));
        Assert.Equal(0.01, Assert.Single(LimitJudge.Broken([lethal], now, after, "then", passing: false)).Probability!.Value, 1e-4);
    }

    [Fact]
    public void Broken_AlreadyBrokenAndNotWorse_IsNoGround()
    {
        PredictedWater now = Water(0.03, 0.1), better = Water(0.029, 0.1), worse = Water(0.031, 0.1);

        Assert.Empty(LimitJudge.Broken([Waters.SalmonAmmonia], now, now, "then", passing: false));
        Assert.Empty(LimitJudge.Broken([Waters.SalmonAmmonia], now, better, "then", passing: false));
        Assert.Contains("made worse", Assert.Single(LimitJudge.Broken([Waters.SalmonAmmonia], now, worse, "then", passing: true)).Text, StringComparison.Ordinal);
    }

    private static PredictedWater Water(double ammonia, double sigma) =>
        new("Raceway 1", new Estimate(7.2, 0.05), new Estimate(8, 1), LogNormal.Estimate(ammonia, sigma), new Estimate(1, 0.05), null);
}
