using TankChem.Chemistry;
using TankChem.Monitoring.Places;

namespace TankChem.Monitoring.Water;

/// <summary>Turns configured ions, mg/L, into the amounts the chemistry takes, mmol/kg.</summary>
internal static class IonConverter
{
    // IUPAC 2021 standard atomic weights, abridged.
    private const double Sodium = 22.990;
    private const double Potassium = 39.098;
    private const double Chloride = 35.45;
    private const double Sulfate = 96.06;

    /// <summary>Fills temperature-independent parts of a solution in. Calcium as measured stands over calcium as configured.</summary>
    /// <param name="solution">The solution without ions.</param>
    /// <param name="ions">Configured ions; null when not known.</param>
    /// <param name="hardnessMmolL">Configured Ca + Mg; null when not known.</param>
    /// <param name="calciumMgL">Measured calcium; null when not measured.</param>
    /// <param name="densityKgPerL">Density of the water.</param>
    public static Solution WithIons(Solution solution, IonContent? ions, double? hardnessMmolL, double? calciumMgL, double densityKgPerL)
    {
        if (ions is null)
            return hardnessMmolL is { } given ? solution with { HardnessMmolKg = given / densityKgPerL } : solution;

        double calcium = (calciumMgL ?? ions.CalciumMgL ?? 0) / MolarMass.Calcium / densityKgPerL;
        double magnesium = (ions.MagnesiumMgL ?? 0) / MolarMass.Magnesium / densityKgPerL;
        bool onlyHardness = ions.SodiumMgL is null && ions.PotassiumMgL is null && ions.ChlorideMgL is null && ions.SulfateMgL is null;
        if (onlyHardness)
            return solution with { HardnessMmolKg = hardnessMmolL is { } hardness ? hardness / densityKgPerL : calcium + magnesium };

        return solution with
        {
            Ions = new IonComposition
            {
                CalciumMmolKg = calcium,
                MagnesiumMmolKg = magnesium,
                SodiumMmolKg = (ions.SodiumMgL ?? 0) / Sodium / densityKgPerL,
                PotassiumMmolKg = (ions.PotassiumMgL ?? 0) / Potassium / densityKgPerL,
                ChlorideMmolKg = (ions.ChlorideMgL ?? 0) / Chloride / densityKgPerL,
                SulfateMmolKg = (ions.SulfateMgL ?? 0) / Sulfate / densityKgPerL,
            },
        };
    }
}
