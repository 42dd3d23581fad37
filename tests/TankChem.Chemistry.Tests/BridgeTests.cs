using TankChem.TestKit;

namespace TankChem.Chemistry.Tests;

/// <summary>From fresh to sea water without a seam. bridge.csv shows one water in both families of models (PyCO2SYS with M10, PHREEQC with ion pairs).</summary>
public class BridgeTests
{
    public static TheoryData<string> Pairs => ["alkalinity + pH", "alkalinity + DIC", "alkalinity + pCO2", "DIC + pCO2"];

    [Theory]
    [MemberData(nameof(Pairs))]
    public void Solve_Auto_IsContinuousInValueAndSlopeAtBothEnds(string pair)
    {
        foreach (double seam in new[] { 1.0, 5.0 })
        {
            double At(double s) => Math.Log(Waters.Solved(new Solution { TemperatureC = 22, Salinity = s }, PairOf(pair)).Hco3UmolKg);
            const double e = 1e-4;
            double below = (At(seam) - At(seam - e)) / e, above = (At(seam + e) - At(seam)) / e;

            Assert.Equal(At(seam - 1e-9), At(seam + 1e-9), 1e-8);
            Assert.Equal(below, above, 1e-3);
        }
    }

    [Theory]
    [InlineData(ConstantSet.Fresh, 0.8)]
    [InlineData(ConstantSet.Millero2010, 5)]
    [InlineData(ConstantSet.Millero2010, 33)]
    public void Solve_AutoOutsideTheBridge_IsTheModelNamed(ConstantSet named, double salinity)
    {
        var water = new Solution { TemperatureC = 12, Salinity = salinity };
        var input = new CarbonateInput { AlkalinityUmolKg = 2200, PH = 7.7 };

        Assert.Equal(Waters.Solved(water with { Constants = named }, input), Waters.Solved(water, input));
    }

    [Fact]
    public void Solve_OnTheBridge_LiesBetweenBothModelsAndSaysSo()
    {
        foreach (double s in new[] { 1.2, 2, 3, 4.5 })
        {
            var water = new Solution { TemperatureC = 25, Salinity = s };
            var input = new CarbonateInput { AlkalinityUmolKg = 2500, PH = 8 };
            CarbonateState state = Waters.Solved(water, input);
            double fresh = Waters.Solved(water with { Constants = ConstantSet.Fresh }, input).Co2UmolKg;
            double sea = Waters.Solved(water with { Constants = ConstantSet.Millero2010 }, input).Co2UmolKg;
            double u = CarbonateSystem.Propagate(water, input, state, new InputUncertainty { IncludeConstants = true }).Co2UmolKg;

            Assert.True(state.Caveats.HasFlag(Caveats.Blended));
            Assert.InRange(state.Co2UmolKg, Math.Min(fresh, sea), Math.Max(fresh, sea));
            Assert.True(u > 0.25 * Math.Abs(fresh - sea), $"S {s}: u {u} does not reach to {fresh} and {sea}");
        }
    }

    [Fact]
    public void Solve_WaterOfTheBridgeTable_LiesNearBothFamilies()
    {
        int rows = 0;
        foreach (GoldenRow row in GoldenTable.Read("bridge.csv").Rows.Where(r => r["DIC"] < r["TA"] * 1.06 && r["DIC"] > r["TA"]))
        {
            var water = new Solution { TemperatureC = row["T"], Salinity = row["S"] };
            CarbonateState state = Waters.Solved(water, new CarbonateInput { AlkalinityUmolKg = row["TA"], DicUmolKg = row["DIC"] });
            double low = Math.Min(row["CO2_M10"], row["CO2_phreeqc"]), high = Math.Max(row["CO2_M10"], row["CO2_phreeqc"]);

            Assert.InRange(state.Co2UmolKg, low * 0.98, high * 1.02);
            if (row["S"] >= 5)
                Assert.Equal(row["CO2_M10"], state.Co2UmolKg, 1e-8 * row["CO2_M10"]);
            rows++;
        }

        Assert.True(rows > 50, $"only {rows} rows");
    }

    [Fact]
    public void Solve_OutsideAFittedRange_IsComputedWithACaveat()
    {
        var input = new CarbonateInput { AlkalinityUmolKg = 2200, PH = 8 };

        Assert.Equal(Caveats.OutOfFittedRange, Waters.Solved(new Solution { TemperatureC = 20, Salinity = 12, Constants = ConstantSet.Lueker2000 }, input).Caveats);
        Assert.Equal(Caveats.OutOfFittedRange, Waters.Solved(new Solution { TemperatureC = 47, Salinity = 30, Constants = ConstantSet.Waters2014 }, input).Caveats);
        Assert.Equal(Caveats.OutOfFittedRange, Waters.Solved(new Solution { TemperatureC = -1, Salinity = 30 }, input).Caveats);
        Assert.Equal(Caveats.None, Waters.Solved(new Solution { TemperatureC = 20, Salinity = 30 }, input).Caveats);
    }

    private static CarbonateInput PairOf(string pair) => pair switch
    {
        "alkalinity + pH" => new CarbonateInput { AlkalinityUmolKg = 2200, PH = 7.9 },
        "alkalinity + DIC" => new CarbonateInput { AlkalinityUmolKg = 2200, DicUmolKg = 2150 },
        "alkalinity + pCO2" => new CarbonateInput { AlkalinityUmolKg = 2200, Pco2Uatm = 900 },
        "DIC + pCO2" => new CarbonateInput { DicUmolKg = 2150, Pco2Uatm = 900 },
        _ => throw new ArgumentOutOfRangeException(nameof(pair), pair, "No such pair."),
    };
}
