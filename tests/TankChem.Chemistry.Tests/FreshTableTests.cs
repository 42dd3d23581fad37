using TankChem.TestKit;

namespace TankChem.Chemistry.Tests;

/// <summary>Against freshwater.csv, made with PHREEQC 3.7.3 and its phreeqc.dat (see tests/golden/README.md).</summary>
public class FreshTableTests
{
    /// <summary>The spread between published data sets is of this size; nothing tighter says anything about nature.</summary>
    private const double Relative = 0.004;

    private const double PHWithin = 0.003;

    private static readonly GoldenTable Table = GoldenTable.Read("freshwater.csv");

    [Theory]
    [InlineData("closed")]
    [InlineData("ammonia")]
    public void Solve_AlkalinityAndPhWithIons_GivesCo2BicarbonateCarbonateAndDic(string kind)
    {
        foreach (GoldenRow row in Table.Rows.Where(r => r.Text("kind") == kind))
        {
            CarbonateState state = CarbonateSystem.Solve(WaterOf(row), new CarbonateInput { AlkalinityUmolKg = row["alkalinity"] * 1e6, PH = row["pH_given"] });

            Assert.Equal(SolveStatus.Solved, state.Status);
            Near(row, "CO2aq", state.Co2UmolKg);
            Near(row, "HCO3", state.Hco3UmolKg);
            Near(row, "CO3", state.Co3UmolKg);
            Near(row, "DIC", state.DicUmolKg);
        }
    }

    [Fact]
    public void Solve_AlkalinityAndPco2_GivesThePh()
    {
        foreach (GoldenRow row in Table.Rows.Where(r => r.Text("kind") == "open"))
        {
            // The program takes the given pressure for a fugacity.
            double factor = Sea.CarbonDioxideW74.FugacityFactor(row["T"] + 273.15, 1);
            CarbonateState state = CarbonateSystem.Solve(WaterOf(row), new CarbonateInput { AlkalinityUmolKg = row["alkalinity"] * 1e6, Pco2Uatm = row["pCO2_atm_given"] * 1e6 / factor });

            Assert.True(Math.Abs(state.PhNbs - row["pH"]) <= PHWithin, $"row {row.Text("id")}: pH {state.PhNbs}, the table says {row["pH"]}");
        }
    }

    private static void Near(GoldenRow row, string column, double actualMicromoles)
    {
        double expected = row[column] * 1e6;
        Assert.True(
            Math.Abs(actualMicromoles - expected) <= Relative * expected,
            $"row {row.Text("id")} T {row["T"]} pH {row["pH"]}: {column} is {actualMicromoles:R}, the table says {expected:R} ({actualMicromoles / expected - 1:P2})");
    }

    internal static Solution WaterOf(GoldenRow row) => new()
    {
        TemperatureC = row["T"],
        Constants = ConstantSet.Fresh,
        AmmoniaUmolKg = row["TAN"] * 1e6,
        Ions = new IonComposition
        {
            CalciumMmolKg = row["Ca"] * 1e3,
            MagnesiumMmolKg = row["Mg"] * 1e3,
            SodiumMmolKg = row["Na"] * 1e3,
            PotassiumMmolKg = row["K"] * 1e3,
            ChlorideMmolKg = row["Cl"] * 1e3,
            SulfateMmolKg = row["SO4"] * 1e3,
        },
    };
}
