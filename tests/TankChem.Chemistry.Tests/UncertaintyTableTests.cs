using TankChem.TestKit;

namespace TankChem.Chemistry.Tests;

/// <summary>Against uncertainty.csv: accurate first-order uncertainties around PyCO2SYS 1.8.3.4 (see tests/golden/README.md).</summary>
public class UncertaintyTableTests
{
    private const double Relative = 1e-5;

    [Fact]
    public void Propagate_AlkalinityAndPh_GivesTheUncertaintyOfEachValue()
    {
        foreach (GoldenRow row in GoldenTable.Read("uncertainty.csv").Rows)
        {
            var solution = new Solution { TemperatureC = row["T"], Salinity = row["S"], AmmoniaUmolKg = row["total_ammonia"], Constants = ConstantSet.Millero2010 };
            var input = new CarbonateInput { AlkalinityUmolKg = row["TA"], PH = row["pH"], Scale = PhScale.Total };
            CarbonateState state = CarbonateSystem.Solve(solution, input);
            CarbonateUncertainty u = CarbonateSystem.Propagate(solution, input, state, new InputUncertainty
            {
                AlkalinityUmolKg = row["s_TA"],
                PH = row["s_pH"],
                TemperatureC = row["s_T"],
                Salinity = row["s_S"],
                IncludeConstants = row["constants"] == 1,
            });

            Near(row, "u_CO2", u.Co2UmolKg);
            Near(row, "u_HCO3", u.Hco3UmolKg);
            Near(row, "u_CO3", u.Co3UmolKg);
            Near(row, "u_dic", u.DicUmolKg);
            Near(row, "u_pCO2", u.Pco2Uatm);
            Near(row, "u_saturation_aragonite", u.OmegaAragonite);
            Near(row, "u_saturation_calcite", u.OmegaCalcite);
            if (row["total_ammonia"] > 0)
                Near(row, "u_NH3", u.Nh3Fraction * row["total_ammonia"]);
        }
    }

    private static void Near(GoldenRow row, string column, double actual) =>
        Assert.True(Math.Abs(actual - row[column]) <= Relative * row[column], $"row {row.Text("id")}: {column} is {actual:R}, the table says {row[column]:R} ({actual / row[column] - 1:E2})");
}
