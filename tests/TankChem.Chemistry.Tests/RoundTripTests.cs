using CsCheck;

namespace TankChem.Chemistry.Tests;

/// <summary>One water, solved from any two of its four values, is the same water.</summary>
public class RoundTripTests
{
    private const double Relative = 1e-10;

    public static TheoryData<string, int> Kinds => new()
    {
        { "fresh, ions known", 3000 },
        { "fresh, hardness known", 1500 },
        { "fresh, nothing known", 2500 },
        { "nearly fresh", 1000 },
        { "brackish", 1000 },
        { "estuary", 3000 },
        { "sea", 5000 },
        { "sea, Waters", 1500 },
        { "sea, Lueker", 1500 },
    };

    [Theory]
    [MemberData(nameof(Kinds))]
    public void Solve_FromEveryOtherPair_GivesTheSameWater(string kind, int draws) =>
        Gen.Select(Gen.Double[4, 10.5], Gen.Double[Math.Log(20), Math.Log(20000)], Gen.Double[0, 40]).Sample(
            (ph, lnDic, t) =>
            {
                Solution water = Waters.Of(kind, t);
                double dic = Math.Exp(lnDic);
                CarbonateState state = Waters.Solved(water, new CarbonateInput { PH = ph, DicUmolKg = dic });
                if (state.AlkalinityUmolKg <= 0)
                    return;
                Same(state, Waters.Solved(water, new CarbonateInput { PH = ph, AlkalinityUmolKg = state.AlkalinityUmolKg }));
                Same(state, Waters.Solved(water, new CarbonateInput { PH = ph, Pco2Uatm = state.Pco2Uatm }));
                Same(state, Waters.Solved(water, new CarbonateInput { AlkalinityUmolKg = state.AlkalinityUmolKg, DicUmolKg = dic }));
                Same(state, Waters.Solved(water, new CarbonateInput { AlkalinityUmolKg = state.AlkalinityUmolKg, Pco2Uatm = state.Pco2Uatm }));
                Same(state, Waters.Solved(water, new CarbonateInput { DicUmolKg = dic, Pco2Uatm = state.Pco2Uatm }));
            },
            iter: draws,
            threads: 1);

    [Theory]
    [InlineData("fresh, ions known")]
    [InlineData("nearly fresh")]
    [InlineData("brackish")]
    [InlineData("estuary")]
    [InlineData("sea")]
    public void Solve_PhOnEachScale_IsTheSameWater(string kind)
    {
        Solution water = Waters.Of(kind);
        CarbonateState state = Waters.Solved(water, new CarbonateInput { PH = 7.6, AlkalinityUmolKg = 2400 });
        foreach (PhScale scale in Enum.GetValues<PhScale>())
        {
            double ph = scale switch { PhScale.Nbs => state.PhNbs, PhScale.Total => state.PhTotal, PhScale.Seawater => state.PhSeawater, PhScale.Free => state.PhFree };
            Same(state, Waters.Solved(water, new CarbonateInput { PH = ph, Scale = scale, AlkalinityUmolKg = 2400 }));
            Same(state, Waters.Solved(water, new CarbonateInput { PH = ph, Scale = scale, DicUmolKg = state.DicUmolKg }));
            Same(state, Waters.Solved(water, new CarbonateInput { PH = ph, Scale = scale, Pco2Uatm = state.Pco2Uatm }));
        }
    }

    private static void Same(in CarbonateState expected, in CarbonateState actual)
    {
        Near(expected.PhNbs, actual.PhNbs, "pH");
        Near(expected.AlkalinityUmolKg, actual.AlkalinityUmolKg, "alkalinity", expected.DicUmolKg + expected.AlkalinityUmolKg);
        Near(expected.DicUmolKg, actual.DicUmolKg, "DIC");
        Near(expected.Co2UmolKg, actual.Co2UmolKg, "CO2");
        Near(expected.Hco3UmolKg, actual.Hco3UmolKg, "HCO3");
        Near(expected.Co3UmolKg, actual.Co3UmolKg, "CO3");
        Near(expected.Pco2Uatm, actual.Pco2Uatm, "pCO2");
    }

    private static void Near(double expected, double actual, string what, double? scale = null) =>
        Assert.True(Math.Abs(actual - expected) <= Relative * (scale ?? Math.Abs(expected)), $"{what} is {actual:R}, was {expected:R}");
}
