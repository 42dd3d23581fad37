namespace TankChem.Dosing;

/// <summary>How much may go in at once and in a day without raising pH faster than any tank of the water may take.</summary>
internal sealed class DosePace(DoseProblem problem, WaterModel[] waters, Reagent reagent)
{
    /// <summary>The limit on the rise in an hour is held at the probability of an ordinary limit; a little more so that rounding cannot undo it.</summary>
    private const double Sigmas = 1.65;

    /// <summary>Less than this is no portion that anybody weighs out, mmol/L.</summary>
    private const double PortionMmolLMin = 1e-3;

    private const int ShrinksMax = 24;

    /// <summary>The largest portion up to <paramref name="wanted"/>, mmol/L; 0 when there is none.</summary>
    public double Portion(double before, double wanted) => Largest(
        Math.Min(wanted, problem.StepMmolLMax),
        wanted,
        (water, added) => (Upper(HourRise(water, before, added)), water.Water.PhRisePerHourMax));

    /// <summary>The largest amount in a day up to <paramref name="wanted"/>, mmol/L; 0 when there is none.</summary>
    public double Day(double before, double wanted) => Largest(
        wanted,
        wanted,
        (water, added) => (Upper(DayRise(water, before, added)), water.Water.PhRisePerDayMax));

    /// <summary>How far a portion lifts pH within the hour.</summary>
    public Estimate? HourRise(WaterModel water, double before, double added) => water.Number(c => c.PhRise(reagent, water.UmolKg(before), water.UmolKg(added)));

    private Estimate? DayRise(WaterModel water, double before, double added) => water.Number(c => c.PhRiseSettled(reagent, water.UmolKg(before), water.UmolKg(added)));

    private double Largest(double from, double wanted, Func<WaterModel, double, (double Rise, double Limit)> judge)
    {
        double amount = from;
        for (int i = 0; i < ShrinksMax; i++)
        {
            double shrink = 1;
            foreach (WaterModel water in waters)
            {
                (double rise, double limit) = judge(water, amount);
                if (!(rise <= limit))
                    shrink = Math.Min(shrink, double.IsNaN(rise) ? 0.5 : Math.Clamp(limit / rise, 0.2, 0.97));
            }

            if (shrink == 1)
                return amount;
            amount *= shrink;
            if (amount < Math.Min(PortionMmolLMin, wanted))
                return 0;
        }

        return 0;
    }

    private static double Upper(Estimate? rise) => rise is { } known ? known.Value + Sigmas * known.StandardUncertainty : double.NaN;
}
