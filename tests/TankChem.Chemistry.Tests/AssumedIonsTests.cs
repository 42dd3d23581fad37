using TankChem.TestKit;

namespace TankChem.Chemistry.Tests;

/// <summary>Where the ions are not known: the stated uncertainty is honest about it. Against the waters of freshwater.csv, whose ions are withheld.</summary>
public class AssumedIonsTests
{
    private static readonly GoldenTable Table = GoldenTable.Read("freshwater.csv");

    [Fact]
    public void Propagate_IonsWithheld_TheIntervalHoldsTheReferenceInNineteenOfTwentyWaters()
    {
        int inside = 0;
        List<double> halfWidths = [];
        foreach (GoldenRow row in Table.Rows)
        {
            Solution water = FreshTableTests.WaterOf(row) with { Ions = null };
            CarbonateInput input = InputOf(row);
            CarbonateState state = Waters.Solved(water, input);
            CarbonateUncertainty u = CarbonateSystem.Propagate(water, input, state, new InputUncertainty { IncludeConstants = true });
            double off = row.Text("kind") == "open" ? (state.PhNbs - row["pH"]) / u.PhNbs : (state.Co2UmolKg - row["CO2aq"] * 1e6) / u.Co2UmolKg;
            Assert.True(state.Caveats.HasFlag(Caveats.IonsAssumed));
            if (Math.Abs(off) <= 1.96)
                inside++;
            if (row.Text("kind") != "open")
                halfWidths.Add(1.96 * u.Co2UmolKg / state.Co2UmolKg);
        }

        halfWidths.Sort();
        Assert.True(inside >= 0.95 * Table.Rows.Count, $"{inside} of {Table.Rows.Count} inside");
        Assert.InRange(halfWidths[halfWidths.Count / 2], 0.01, 0.15);
    }

    [Fact]
    public void Propagate_HardnessKnown_IsSurerThanWithNothingKnown()
    {
        foreach (GoldenRow row in Table.Rows.Where(r => r.Text("kind") == "closed" && r["pH"] > 8.5))
        {
            Solution nothing = FreshTableTests.WaterOf(row) with { Ions = null };
            Solution hardness = nothing with { HardnessMmolKg = (row["Ca"] + row["Mg"]) * 1e3 };
            CarbonateState state = Waters.Solved(hardness, InputOf(row));

            Assert.Equal(Caveats.IonsFromHardness, state.Caveats);
            Assert.True(Relative(hardness, row) < Relative(nothing, row));
        }
    }

    [Fact]
    public void Solve_IonsWithoutBalanceOfCharges_SodiumClosesIt()
    {
        foreach (GoldenRow row in Table.Rows.Where(r => r.Text("kind") == "closed"))
        {
            Solution whole = FreshTableTests.WaterOf(row);
            CarbonateState expected = Waters.Solved(whole, InputOf(row));
            CarbonateState actual = Waters.Solved(whole with { Ions = whole.Ions! with { SodiumMmolKg = 0 } }, InputOf(row));

            // What is missing is sodium here, so the same water comes out.
            Assert.Equal(expected.Co2UmolKg, actual.Co2UmolKg, 1e-5 * expected.Co2UmolKg);
            Assert.Equal(expected.OmegaCalcite, actual.OmegaCalcite, 1e-5 * expected.OmegaCalcite);
        }
    }

    [Fact]
    public void Solve_SalinityKnown_RaisesTheIonicStrengthToIt()
    {
        var pair = new CarbonateInput { PH = 7.5, AlkalinityUmolKg = 1000 };
        double before = 0;
        foreach (double s in new[] { 0, 0.05, 0.2, 0.5, 1 })
        {
            double strength = Waters.Solved(new Solution { TemperatureC = 20, Salinity = s, Constants = ConstantSet.Fresh }, pair).IonicStrengthMolKg;
            Assert.True(strength > before);
            before = strength;
        }

        // Sea salt of S 1 alone has 0.0199 mol/kg (DOE94); the bicarbonate of the water comes on top, less what is bound in pairs.
        Assert.InRange(before, 0.0195, 0.0215);
    }

    private static double Relative(Solution water, GoldenRow row)
    {
        CarbonateState state = Waters.Solved(water, InputOf(row));
        return CarbonateSystem.Propagate(water, InputOf(row), state, new InputUncertainty { IncludeConstants = true }).Co2UmolKg / state.Co2UmolKg;
    }

    private static CarbonateInput InputOf(GoldenRow row) => row.Text("kind") == "open"
        ? new CarbonateInput { AlkalinityUmolKg = row["alkalinity"] * 1e6, Pco2Uatm = row["pCO2_atm_given"] * 1e6 / Sea.CarbonDioxideW74.FugacityFactor(row["T"] + 273.15, 1) }
        : new CarbonateInput { AlkalinityUmolKg = row["alkalinity"] * 1e6, PH = row["pH_given"] };
}
