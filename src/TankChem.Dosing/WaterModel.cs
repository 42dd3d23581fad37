using TankChem.Chemistry;

namespace TankChem.Dosing;

/// <summary>A tank's water with its uncertainty: the chain of its values, and chains for each input moved by one standard uncertainty.</summary>
/// <remarks>First order. pH and alkalinity are moved to both sides, because what follows from them bends most; TAN, temperature and volume to one.
/// CO2 and un-ionised ammonia spread by factors, so their contributions add as logarithms.</remarks>
internal sealed class WaterModel
{
    private readonly WaterChain nominal;
    private readonly List<(WaterChain Up, WaterChain Down, double Factor)> moved = [];

    public WaterModel(DoseWater water, double volumeRelativeU)
    {
        Water = water;
        DensityKgPerL = Density.KgPerL(water.Solution.TemperatureC, water.Solution.Salinity);
        nominal = Chain(default);
        if (water.PH.StandardUncertainty > 0)
            moved.Add((Chain(new Shift(PH: 1)), Chain(new Shift(PH: -1)), 0.5));
        if (water.AlkalinityUmolKg.StandardUncertainty > 0)
            moved.Add((Chain(new Shift(Alkalinity: 1)), Chain(new Shift(Alkalinity: -1)), 0.5));
        if (water.TanMgL?.StandardUncertainty > 0)
            moved.Add((Chain(new Shift(Tan: 1)), nominal, 1));
        if (water.TemperatureU > 0)
            moved.Add((Chain(new Shift(Temperature: 1)), nominal, 1));
        if (volumeRelativeU > 0)
            moved.Add((nominal, Chain(new Shift(Volume: 1)), 1));

        WaterChain Chain(in Shift shift) => new(water, volumeRelativeU, shift);
    }

    /// <summary>The tank.</summary>
    public DoseWater Water { get; }

    /// <summary>Its density, kg/L.</summary>
    public double DensityKgPerL { get; }

    /// <summary>Whether its values are a possible water, each within one standard uncertainty.</summary>
    public bool IsPossible => nominal.IsPossible && moved.TrueForAll(m => m.Up.IsPossible && m.Down.IsPossible);

    /// <summary>The chain of its values as they are.</summary>
    public WaterChain Nominal => nominal;

    /// <summary>µmol/kg of an amount per litre.</summary>
    public double UmolKg(double mmolL) => mmolL / DensityKgPerL * 1000;

    /// <summary>A prediction with first-order uncertainty, or null where it cannot be computed.</summary>
    public PredictedWater? Predict(Func<WaterChain, Predicted> step) => Predict(step, null, null);

    /// <summary>A prediction in which something else than the water is uncertain too: what it is a standard uncertainty more, and less.</summary>
    public PredictedWater? Predict(Func<WaterChain, Predicted> step, Func<WaterChain, Predicted>? more, Func<WaterChain, Predicted>? less)
    {
        Predicted n = step(nominal);
        if (!n.IsSolved)
            return null;
        var sum = new Spread();
        foreach ((WaterChain up, WaterChain down, double factor) in moved)
        {
            if (!sum.Add(ReferenceEquals(up, nominal) ? n : step(up), ReferenceEquals(down, nominal) ? n : step(down), factor))
                return null;
        }

        if (more is not null && less is not null && !sum.Add(more(nominal), less(nominal), 0.5))
            return null;
        return sum.Around(Water.Name, n);
    }

    /// <summary>A number with first-order uncertainty, or null where it cannot be computed.</summary>
    public Estimate? Number(Func<WaterChain, double> step)
    {
        double n = step(nominal), squares = 0;
        foreach ((WaterChain up, WaterChain down, double factor) in moved)
        {
            double difference = factor * ((ReferenceEquals(up, nominal) ? n : step(up)) - (ReferenceEquals(down, nominal) ? n : step(down)));
            squares += difference * difference;
        }

        return double.IsFinite(n) && double.IsFinite(squares) ? new Estimate(n, Math.Sqrt(squares)) : null;
    }

    /// <summary>Sums of squares of the contributions.</summary>
    private struct Spread
    {
        private double ph;
        private double lnCo2;
        private double lnNh3;
        private double alkalinity;

        public bool Add(in Predicted up, in Predicted down, double factor)
        {
            if (!up.IsSolved || !down.IsSolved)
                return false;
            ph += Square(factor * (up.PH - down.PH));
            lnCo2 += Square(factor * Math.Log(up.Co2MgL / down.Co2MgL));
            if (up.Nh3NMgL > 0 && down.Nh3NMgL > 0)
                lnNh3 += Square(factor * Math.Log(up.Nh3NMgL / down.Nh3NMgL));
            alkalinity += Square(factor * (up.AlkalinityMmolL - down.AlkalinityMmolL));
            return true;
        }

        public readonly PredictedWater Around(string place, in Predicted n) => new(
            place,
            new Estimate(n.PH, Math.Sqrt(ph)),
            LogNormal.Estimate(n.Co2MgL, Math.Sqrt(lnCo2)),
            double.IsNaN(n.Nh3NMgL) ? null : LogNormal.Estimate(n.Nh3NMgL, Math.Sqrt(lnNh3)),
            new Estimate(n.AlkalinityMmolL, Math.Sqrt(alkalinity)),
            double.IsNaN(n.OmegaCalcite) ? null : n.OmegaCalcite,
            double.IsNaN(n.OmegaAragonite) ? null : n.OmegaAragonite);

        private static double Square(double x) => x * x;
    }
}
