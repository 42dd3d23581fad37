using TankChem.Chemistry;
using TankChem.TestKit;

namespace TankChem.Dosing.Tests;

/// <summary>The planner's book-keeping against freshwater-dosing.csv, made with PHREEQC 3.7.3: pH right after a reagent with no gas exchanged, and after equilibration with a given CO2.</summary>
public class FreshDosingTableTests
{
    [Theory]
    [InlineData("NaHCO3")]
    [InlineData("Na2CO3")]
    public void Predict_AfterAReagent_GivesThePhOfTheTable(string formula)
    {
        Reagent reagent = ReagentCatalog.All.Single(r => r.Formula == formula);
        int rows = 0;
        foreach (GoldenRow row in GoldenTable.Read("freshwater-dosing.csv").Rows.Where(r => r.Text("reagent") == formula))
        {
            var chain = new WaterChain(WaterOf(row), 0, default);
            double added = row["dose_mmol"] * 1000 * reagent.EquivalentsPerMole;
            Predicted closed = chain.Closed(reagent, added), air = chain.Air(reagent, added);

            Assert.True(Math.Abs(closed.PH - row["pH_1"]) <= 0.005, $"row {row.Text("id")}: closed pH {closed.PH}, the table says {row["pH_1"]}");
            Assert.True(Math.Abs(air.PH - row["pH_2"]) <= 0.003, $"row {row.Text("id")}: pH at equilibrium {air.PH}, the table says {row["pH_2"]}");
            Assert.Equal(row["alk_total_eq_1"] * 1000, closed.AlkalinityMmolL / Density.KgPerL(row["T"], 0), 1e-6);
            rows++;
        }

        Assert.True(rows > 50, $"only {rows} rows with {formula}");
    }

    private static DoseWater WaterOf(GoldenRow row) => new()
    {
        Name = "row " + row.Text("id"),
        Solution = new Solution
        {
            TemperatureC = row["T"],
            Constants = ConstantSet.Fresh,
            Ions = new IonComposition
            {
                CalciumMmolKg = row["Ca"] * 1e3,
                MagnesiumMmolKg = row["Mg"] * 1e3,
                SodiumMmolKg = row["Na"] * 1e3,
                PotassiumMmolKg = row["K"] * 1e3,
                ChlorideMmolKg = row["Cl"] * 1e3,
                SulfateMmolKg = row["SO4"] * 1e3,
            },
        },
        PH = new Estimate(row["pH_0"], 0),
        AlkalinityUmolKg = new Estimate(row["alkalinity_0"] * 1e6, 0),
        AirPco2Uatm = row["pCO2_atm_given"] * 1e6 / FugacityFactor(row["T"]),
        Limits = [],
    };

    /// <summary>The table's pCO2 is a fugacity (see its README); the chain takes a pressure. Factor from the chemistry itself.</summary>
    private static double FugacityFactor(double temperatureC)
    {
        CarbonateState state = CarbonateSystem.Solve(new Solution { TemperatureC = temperatureC }, new CarbonateInput { AlkalinityUmolKg = 1000, Pco2Uatm = 400 });
        return state.Fco2Uatm / state.Pco2Uatm;
    }
}
