namespace TankChem.Chemistry.Tests;

/// <summary>First-order propagation agrees with drawing the inputs at random, where they are small enough for first order.</summary>
public class MonteCarloTests
{
    private const int Draws = 4000;

    /// <summary>A standard deviation from 4,000 draws is itself uncertain by 1.1 %; five times that.</summary>
    private const double Relative = 0.056;

    [Theory]
    [InlineData("fresh, ions known")]
    [InlineData("fresh, nothing known")]
    [InlineData("brackish")]
    [InlineData("sea")]
    public void Propagate_SmallUncertainties_AgreesWithRandomDraws(string kind)
    {
        Solution water = Waters.Of(kind);
        var input = new CarbonateInput { PH = 7.7, AlkalinityUmolKg = 2300 };
        var u = new InputUncertainty { PH = 0.01, AlkalinityUmolKg = 40, TemperatureC = 0.2, Salinity = 0.03 * water.Salinity };
        CarbonateState state = Waters.Solved(water, input);
        CarbonateUncertainty propagated = CarbonateSystem.Propagate(water, input, state, u);

        // The seed makes a failure repeatable.
        var random = new Random(20_011);
        var states = new CarbonateState[Draws];
        for (int i = 0; i < Draws; i++)
        {
            states[i] = Waters.Solved(
                water with { TemperatureC = water.TemperatureC + u.TemperatureC * Normal(random), Salinity = water.Salinity + u.Salinity * Normal(random) },
                new CarbonateInput { PH = 7.7 + u.PH * Normal(random), AlkalinityUmolKg = 2300 + u.AlkalinityUmolKg * Normal(random) });
        }

        Near(states, s => s.Co2UmolKg, propagated.Co2UmolKg);
        Near(states, s => s.Co2MgL, propagated.Co2MgL);
        Near(states, s => s.DicUmolKg, propagated.DicUmolKg);
        Near(states, s => s.Co3UmolKg, propagated.Co3UmolKg);
        Near(states, s => s.Pco2Uatm, propagated.Pco2Uatm);
        Near(states, s => s.Nh3Fraction, propagated.Nh3Fraction);
        Near(states, s => s.BufferClosedUmolKg, propagated.BufferClosedUmolKg);
    }

    private static void Near(CarbonateState[] states, Func<CarbonateState, double> value, double u)
    {
        double mean = states.Average(value);
        double drawn = Math.Sqrt(states.Sum(s => (value(s) - mean) * (value(s) - mean)) / (states.Length - 1));
        Assert.Equal(drawn, u, Relative * drawn);
    }

    /// <summary>Box and Muller.</summary>
    private static double Normal(Random random) => Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
