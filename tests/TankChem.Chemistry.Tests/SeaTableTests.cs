using TankChem.TestKit;

namespace TankChem.Chemistry.Tests;

/// <summary>Against seawater.csv, made with PyCO2SYS 1.8.3.4 (see tests/golden/README.md).</summary>
public class SeaTableTests
{
    /// <summary>Rounding in another order of operations is all that may differ.</summary>
    private const double Relative = 1e-8;

    private static readonly GoldenTable Table = GoldenTable.Read("seawater.csv");

    public static TheoryData<string, int> Sets => new() { { "M10-grid", 14 }, { "M10-DR79", 14 }, { "M10-low", 14 }, { "L00-DR79", 10 } };

    [Theory]
    [MemberData(nameof(Sets))]
    public void Solve_EachPairOfTheTable_GivesEverySpecies(string set, int carbonic)
    {
        int rows = 0;
        foreach (GoldenRow row in Table.Rows.Where(r => r.Text("set") == set))
        {
            Assert.Equal(carbonic, row["opt_k_carbonic"]);
            CarbonateState state = CarbonateSystem.Solve(WaterOf(row), PairOf(row));

            Assert.Equal(SolveStatus.Solved, state.Status);
            Near(row, "pH_total", state.PhTotal);
            Near(row, "pH_free", state.PhFree);
            Near(row, "pH_sws", state.PhSeawater);
            Near(row, "alkalinity", state.AlkalinityUmolKg);
            Near(row, "dic", state.DicUmolKg);
            Near(row, "CO2", state.Co2UmolKg);
            Near(row, "HCO3", state.Hco3UmolKg);
            Near(row, "CO3", state.Co3UmolKg);
            Near(row, "pCO2", state.Pco2Uatm);
            Near(row, "fCO2", state.Fco2Uatm);
            Near(row, "saturation_calcite", state.OmegaCalcite);
            Near(row, "saturation_aragonite", state.OmegaAragonite);
            if (row["S"] >= 15)
                Near(row, "pH_nbs", state.PhNbs);
            if (row["total_ammonia"] > 0)
                Near(row, "NH3", state.Nh3Fraction * row["total_ammonia"]);
            rows++;
        }

        Assert.True(rows > 100, $"only {rows} rows of {set}");
    }

    [Fact]
    public void Solve_PairsWithoutAPhysicalAnswer_SaysSoInWords()
    {
        foreach (GoldenRow row in GoldenTable.Read("seawater-impossible.csv").Rows)
        {
            CarbonateState state = CarbonateSystem.Solve(
                new Solution { TemperatureC = row["T"], Salinity = row["S"], Constants = ConstantSet.Millero2010 }, PairOf(row));

            Assert.Equal(SolveStatus.Impossible, state.Status);
            Assert.False(string.IsNullOrWhiteSpace(state.FaultyArgument));
        }
    }

    [Fact]
    public void Solve_WithNbsPh_IsTheSameWater()
    {
        foreach (GoldenRow row in Table.Rows.Where(r => r["S"] >= 15 && r["opt_k_fluoride"] == 1 && r.Text("pair") == "TA_pH"))
        {
            CarbonateState state = CarbonateSystem.Solve(WaterOf(row), new CarbonateInput { AlkalinityUmolKg = row["par1"], PH = row["pH_nbs"], Scale = PhScale.Nbs });

            Near(row, "CO2", state.Co2UmolKg);
        }
    }

    private static void Near(GoldenRow row, string column, double actual)
    {
        double expected = row[column];
        Assert.True(
            Math.Abs(actual - expected) <= Relative * Math.Abs(expected) + 1e-12,
            $"row {row.Text("id")} ({row.Text("set")}, {row.Text("pair")}): {column} is {actual:R}, the table says {expected:R}");
    }

    private static Solution WaterOf(GoldenRow row) => new()
    {
        TemperatureC = row["T"],
        Salinity = row["S"],
        PhosphateUmolKg = row["total_phosphate"],
        SilicateUmolKg = row["total_silicate"],
        AmmoniaUmolKg = row["total_ammonia"],
        Constants = row["opt_k_carbonic"] == 14 ? ConstantSet.Millero2010 : ConstantSet.Lueker2000,
    };

    private static CarbonateInput PairOf(GoldenRow row) => row.Text("pair") switch
    {
        "TA_pH" => new CarbonateInput { AlkalinityUmolKg = row["par1"], PH = row["par2"], Scale = PhScale.Total },
        "TA_DIC" => new CarbonateInput { AlkalinityUmolKg = row["par1"], DicUmolKg = row["par2"] },
        "TA_pCO2" => new CarbonateInput { AlkalinityUmolKg = row["par1"], Pco2Uatm = row["par2"] },
        "DIC_pH" => new CarbonateInput { DicUmolKg = row["par1"], PH = row["par2"], Scale = PhScale.Total },
        "DIC_pCO2" => new CarbonateInput { DicUmolKg = row["par1"], Pco2Uatm = row["par2"] },
        "pH_pCO2" or "pCO2_pH" => row.Text("pair") == "pH_pCO2"
            ? new CarbonateInput { PH = row["par1"], Pco2Uatm = row["par2"], Scale = PhScale.Total }
            : new CarbonateInput { Pco2Uatm = row["par1"], PH = row["par2"], Scale = PhScale.Total },
        var other => throw new InvalidOperationException($"unknown pair {other}"),
    };
}
