namespace TankChem.Dosing.Tests;

public class ReagentCatalogTests
{
    /// <summary>Grams per m³ that raise alkalinity by 1 mg/L as CaCO3: 1.68 for bicarbonate and 1.06 for carbonate are in wide use in the trade; potassium bicarbonate 2.00 by its molar mass.</summary>
    [Theory]
    [InlineData("sodium-bicarbonate", 1.68)]
    [InlineData("sodium-carbonate", 1.06)]
    [InlineData("potassium-bicarbonate", 2.00)]
    public void Plan_OneMilligramPerLitreInACubicMetre_TakesTheGramsOfTheTrade(string reagent, double grams)
    {
        double mmolL = 1 / 50.043;
        DosePlan plan = Waters.In(1, Waters.Tank(7.2, 1.2)).PlanTo(1.2 + mmolL, reagent);

        Assert.True(plan.Allowed);
        Assert.Equal(grams, plan.Steps.Sum(s => s.AmountG), 0.005);
    }

    /// <summary>1 dKH (10 mg CaO per litre, 0.35663 mmol/L) in 1 m³: 29.96 g of bicarbonate.</summary>
    [Fact]
    public void Plan_OneDegreeOfCarbonateHardness_Takes30Grams() =>
        Assert.Equal(29.96, Waters.In(1, Waters.Tank(7.4, 2)).PlanTo(2 + 0.35663).Steps.Sum(s => s.AmountG), 0.02);

    /// <summary>1 g of nitrogen nitrified takes two equivalents a mole (7.14 g alkalinity as CaCO3): 12.0 g of bicarbonate give them back.</summary>
    [Fact]
    public void Bicarbonate_ForAGramOfNitrogenNitrified_Is12Grams()
    {
        Reagent bicarbonate = ReagentCatalog.Find(ReagentCatalog.Bicarbonate)!;

        Assert.Equal(12.0, 2 / Chemistry.MolarMass.Nitrogen / bicarbonate.EquivalentsPerMole * bicarbonate.MolarMassGMol, 0.01);
    }

    [Fact]
    public void All_EveryRow_IsComplete()
    {
        Assert.Equal(ReagentCatalog.All.Count, ReagentCatalog.All.Select(r => r.Id).Distinct().Count());
        Assert.All(ReagentCatalog.All, r =>
        {
            Assert.Matches("^[a-z-]+$", r.Id);
            Assert.True(r.MolarMassGMol > 0 && r.EquivalentsPerMole != 0 && r.CarbonPerMole >= 0 && r.SolubilityGPerL > 0, r.Id);
            Assert.EndsWith(".", r.Handling);
            Assert.Same(r, ReagentCatalog.Find(r.Id));
        });
    }

    [Fact]
    public void All_StrongAcidsAndBases_AreLocked() =>
        Assert.All(ReagentCatalog.All, r => Assert.Equal(r.CarbonPerMole == 0, r.Locked));
}
