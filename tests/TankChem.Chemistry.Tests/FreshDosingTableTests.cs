using TankChem.TestKit;

namespace TankChem.Chemistry.Tests;

/// <summary>Against freshwater-dosing.csv, made with PHREEQC 3.7.3: a water, the same after a reagent with no gas exchanged, and after equilibration with CO2.</summary>
public class FreshDosingTableTests
{
    public static TheoryData<string, double, double, double> Reagents => new()
    {
        { "NaHCO3", 1, 1, 1 },
        { "Na2CO3", 2, 1, 2 },
        { "NaOH", 1, 0, 1 },
        { "HCl", -1, 0, 0 },
    };

    [Theory]
    [MemberData(nameof(Reagents))]
    public void Solve_AfterAReagent_GivesThePhClosedAndAtEquilibrium(string reagent, double alkalinityPerMole, double carbonPerMole, double sodiumPerMole)
    {
        int rows = 0;
        foreach (GoldenRow row in GoldenTable.Read("freshwater-dosing.csv").Rows.Where(r => r.Text("reagent") == reagent))
        {
            double dose = row["dose_mmol"] * 1e3;
            Solution before = WaterOf(row, 0, 0);
            Solution after = WaterOf(row, sodiumPerMole * row["dose_mmol"], reagent == "HCl" ? row["dose_mmol"] : 0);
            double alkalinity = row["alkalinity_0"] * 1e6;
            CarbonateState start = CarbonateSystem.Solve(before, new CarbonateInput { AlkalinityUmolKg = alkalinity, PH = row["pH_0"] });
            double dosed = alkalinity + alkalinityPerMole * dose;
            CarbonateState closed = CarbonateSystem.Solve(after, new CarbonateInput { AlkalinityUmolKg = dosed, DicUmolKg = start.DicUmolKg + carbonPerMole * dose });
            double factor = Sea.CarbonDioxideW74.FugacityFactor(row["T"] + 273.15, 1);
            CarbonateState open = CarbonateSystem.Solve(after, new CarbonateInput { AlkalinityUmolKg = dosed, Pco2Uatm = row["pCO2_atm_given"] * 1e6 / factor });

            Assert.True(Math.Abs(closed.PhNbs - row["pH_1"]) <= 0.005, $"row {row.Text("id")} {reagent}: closed pH {closed.PhNbs}, the table says {row["pH_1"]}");
            Assert.True(Math.Abs(open.PhNbs - row["pH_2"]) <= 0.003, $"row {row.Text("id")} {reagent}: pH at equilibrium {open.PhNbs}, the table says {row["pH_2"]}");
            rows++;
        }

        Assert.True(rows > 10, $"only {rows} rows with {reagent}");
    }

    private static Solution WaterOf(GoldenRow row, double sodiumMmol, double chlorideMmol) => new()
    {
        TemperatureC = row["T"],
        Constants = ConstantSet.Fresh,
        Ions = new IonComposition
        {
            CalciumMmolKg = row["Ca"] * 1e3,
            MagnesiumMmolKg = row["Mg"] * 1e3,
            SodiumMmolKg = row["Na"] * 1e3 + sodiumMmol,
            PotassiumMmolKg = row["K"] * 1e3,
            ChlorideMmolKg = row["Cl"] * 1e3 + chlorideMmol,
            SulfateMmolKg = row["SO4"] * 1e3,
        },
    };
}
