using TankChem.Chemistry;

namespace TankChem.Dosing;

/// <summary>A tank's water with its uncertainty: the chain of its values, and one for each input moved by one standard uncertainty.</summary>
internal sealed class WaterModel
{
    private readonly WaterChain nominal;
    private readonly WaterChain byPH;
    private readonly WaterChain byAlkalinity;
    private readonly WaterChain? byTan;

    public WaterModel(DoseWater water)
    {
        Water = water;
        nominal = new WaterChain(water, 0, 0, 0);
        byPH = new WaterChain(water, 1, 0, 0);
        byAlkalinity = new WaterChain(water, 0, 1, 0);
        byTan = water.TanMgL is null ? null : new WaterChain(water, 0, 0, 1);
        DensityKgPerL = Density.KgPerL(water.Solution.TemperatureC, water.Solution.Salinity);
    }

    /// <summary>The tank.</summary>
    public DoseWater Water { get; }

    /// <summary>Its density, kg/L.</summary>
    public double DensityKgPerL { get; }

    /// <summary>Whether its values are a possible water.</summary>
    public bool IsPossible => nominal.IsPossible && byPH.IsPossible && byAlkalinity.IsPossible;

    /// <summary>A prediction with first-order uncertainty, or null where it cannot be computed.</summary>
    public PredictedWater? Predict(Func<WaterChain, Predicted> step)
    {
        Predicted n = step(nominal), p = step(byPH), a = step(byAlkalinity);
        Predicted t = byTan is null ? n : step(byTan);
        if (!n.IsSolved || !p.IsSolved || !a.IsSolved || !t.IsSolved)
            return null;
        return new PredictedWater(
            Water.Name,
            new Estimate(n.PH, Root(p.PH - n.PH, a.PH - n.PH, t.PH - n.PH)),
            new Estimate(n.Co2MgL, Root(p.Co2MgL - n.Co2MgL, a.Co2MgL - n.Co2MgL, t.Co2MgL - n.Co2MgL)),
            double.IsNaN(n.Nh3NMgL) ? null : new Estimate(n.Nh3NMgL, Root(p.Nh3NMgL - n.Nh3NMgL, a.Nh3NMgL - n.Nh3NMgL, t.Nh3NMgL - n.Nh3NMgL)),
            new Estimate(n.AlkalinityMmolL, Root(0, a.AlkalinityMmolL - n.AlkalinityMmolL, 0)),
            double.IsNaN(n.OmegaCalcite) ? null : n.OmegaCalcite);
    }

    private static double Root(double a, double b, double c) => Math.Sqrt(a * a + b * b + c * c);
}
