using CsCheck;

namespace TankChem.Chemistry.Tests;

/// <summary>Buffer intensities are the derivatives of the alkalinity that the solver gives, and have their known shape.</summary>
public class BufferTests
{
    [Theory]
    [InlineData("fresh, ions known")]
    [InlineData("brackish")]
    [InlineData("estuary")]
    [InlineData("sea")]
    [InlineData("sea, Lueker")]
    public void Buffer_OfTheFullSystem_IsTheDerivativeOfAlkalinity(string kind) =>
        Gen.Select(Gen.Double[5, 10], Gen.Double[100, 8000], Gen.Double[2, 35]).Sample(
            (ph, dic, t) =>
            {
                // Chloride enough that sodium closes the balance of charges at every alkalinity: where it runs out, the derivative has a step.
                Solution water = Waters.Of(kind, t) with { Ions = Waters.TapIons with { ChlorideMmolKg = 3.2 }, PhosphateUmolKg = 10, SilicateUmolKg = 100, AmmoniaUmolKg = 50 };
                CarbonateState state = Waters.Solved(water, new CarbonateInput { PH = ph, DicUmolKg = dic });

                Assert.Equal(Slope(p => Waters.Solved(water, new CarbonateInput { PH = p, DicUmolKg = dic }).AlkalinityUmolKg, ph), state.BufferClosedUmolKg, 1e-7 * state.BufferOpenUmolKg);
                Assert.Equal(Slope(p => Waters.Solved(water, new CarbonateInput { PH = p, Pco2Uatm = state.Pco2Uatm }).AlkalinityUmolKg, ph), state.BufferOpenUmolKg, 1e-7 * state.BufferOpenUmolKg);
            },
            iter: 100,
            threads: 1);

    [Theory]
    [InlineData("fresh, ions known")]
    [InlineData("brackish")]
    [InlineData("sea")]
    public void BufferClosed_CarbonateTermBetweenPh4And8_IsHighestAtTheConditionalPK1(string kind)
    {
        Solution water = Waters.Of(kind);
        const double dic = 20;
        double CarbonateTerm(double p) => Closed(water, p, dic) - Closed(water, p, 0);
        double highest = Enumerable.Range(0, 4001).Select(i => 4 + i * 0.001).MaxBy(CarbonateTerm);
        double pK1 = Enumerable.Range(0, 4001).Select(i => 4 + i * 0.001).MinBy(p =>
        {
            CarbonateState state = Waters.Solved(water, new CarbonateInput { PH = p, DicUmolKg = dic });
            return Math.Abs(2 * state.Co2UmolKg - dic);
        });

        Assert.InRange(highest, pK1 - 0.005, pK1 + 0.005);
    }

    [Theory]
    [MemberData(nameof(AllKinds))]
    public void BufferOpen_AtPositiveAlkalinity_RisesWithPh(string kind)
    {
        Solution water = Waters.Of(kind);
        double before = 0;
        for (double ph = 5; ph <= 9.2; ph += 0.01)
        {
            CarbonateState state = Waters.Solved(water, new CarbonateInput { PH = ph, Pco2Uatm = 800 });
            if (state.AlkalinityUmolKg <= 0)
                continue;
            Assert.True(state.BufferOpenUmolKg > before, $"pH {ph}: {state.BufferOpenUmolKg} after {before}");
            before = state.BufferOpenUmolKg;
        }
    }

    public static TheoryData<string> AllKinds => [.. Waters.Kinds];

    private static double Closed(Solution water, double ph, double dic) => Waters.Solved(water, new CarbonateInput { PH = ph, DicUmolKg = dic }).BufferClosedUmolKg;

    /// <summary>Central differences of fourth order.</summary>
    private static double Slope(Func<double, double> f, double x)
    {
        const double e = 2e-3;
        return (8 * (f(x + e) - f(x - e)) - (f(x + 2 * e) - f(x - 2 * e))) / (12 * e);
    }
}
