using System.Globalization;
using TankChem.Chemistry;

namespace TankChem.Dosing;

/// <summary>The planner's check of its own answer, from the plan as it would be handed out: amounts, pace, predictions and limits, none of it taken from how the plan was made.</summary>
internal static class DosePlanCheck
{
    private const double Relative = 1e-6;
    private const double HourS = 3600;
    private const double DayS = 24 * HourS;

    /// <summary>What is wrong with an allowed plan; null when nothing is.</summary>
    /// <param name="problem">The water.</param>
    /// <param name="target">What was asked.</param>
    /// <param name="todayMmolL">Alkalinity before the plan, mmol/L.</param>
    /// <param name="plan">The plan.</param>
    public static string? FaultOf(DoseProblem problem, DoseTarget target, double todayMmolL, DosePlan plan) =>
        plan.Steps.Count == 0 || plan.Grounds.Count > 0 ? "it has no portion, or grounds against it."
        : FaultOfAmounts(problem, target, todayMmolL, plan.Steps) ?? FaultOfPredictions(problem, target, todayMmolL, plan.Steps);

    private static string? FaultOfAmounts(DoseProblem problem, DoseTarget target, double todayMmolL, IReadOnlyList<DoseStep> steps)
    {
        var days = new Dictionary<int, double> { [0] = Math.Max(0, problem.DosedTodayMmolL) };
        double sum = 0, at = double.NegativeInfinity;
        foreach (DoseStep step in steps)
        {
            if (ReagentCatalog.Find(step.Reagent) is not { Locked: false } reagent)
                return $"\"{step.Reagent}\" may not be dosed.";
            double mmolL = step.AmountG / reagent.MolarMassGMol * reagent.EquivalentsPerMole / problem.VolumeM3!.Value;
            if (!(mmolL > 0) || mmolL > problem.StepMmolLMax * (1 + Relative))
                return Invariant($"a portion of {mmolL} mmol/L.");
            if (!(step.AfterS >= at + HourS))
                return Invariant($"a portion at {step.AfterS} s, less than an hour after the one before.");
            int day = (int)(step.AfterS / DayS);
            days[day] = days.GetValueOrDefault(day) + mmolL;
            if (days[day] > problem.DayMmolLMax * (1 + Relative))
                return Invariant($"{days[day]} mmol/L on day {day + 1}.");
            (sum, at) = (sum + mmolL, step.AfterS);
        }

        return Math.Abs(todayMmolL + sum - target.Value) > Relative * target.Value ? Invariant($"the portions bring {sum} mmol/L, not {target.Value - todayMmolL}.") : null;
    }

    private static string? FaultOfPredictions(DoseProblem problem, DoseTarget target, double todayMmolL, IReadOnlyList<DoseStep> steps)
    {
        DoseWater water = problem.Waters[0];
        double lastMmolL = todayMmolL;
        foreach (DoseStep step in steps)
        {
            foreach (PredictedWater predicted in new[] { step.Closed, step.Settled, step.Air })
            {
                if (!double.IsFinite(predicted.PH.Value + predicted.Co2MgL.Value + predicted.AlkalinityMmolL.Value + (predicted.Nh3NMgL?.Value ?? 0)) || !(predicted.AlkalinityMmolL.Value > lastMmolL))
                    return "a prediction that is no water, or has not more alkalinity than before.";
            }

            lastMmolL = step.Settled.AlkalinityMmolL.Value;
            if (water.TanMgL is not null != step.Closed.Nh3NMgL is not null)
                return "a prediction without its ammonia.";
            if (FaultOfLimits(water, step) is { } fault)
                return fault;
        }

        // Density hardly moves with the dose; a part in ten thousand tells a plan for another water.
        return Math.Abs(lastMmolL - target.Value) > 1e-4 * target.Value ? Invariant($"it ends at {lastMmolL} mmol/L, not at {target.Value}.") : null;
    }

    /// <summary>A limit that the water is inside of by its values today stays so, closed and settled.</summary>
    private static string? FaultOfLimits(DoseWater water, DoseStep step)
    {
        CarbonateState now = CarbonateSystem.Solve(water.Solution, new CarbonateInput { PH = water.PH.Value, AlkalinityUmolKg = water.AlkalinityUmolKg.Value });
        foreach (DoseLimit limit in water.Limits)
        {
            double? before = limit.Quantity switch
            {
                "ph" => water.PH.Value,
                "co2" => now.Co2MgL,
                "nh3-n" => water.TanMgL?.Value * now.Nh3Fraction,
                "alkalinity" => now.AlkalinityUmolKg * now.DensityKgPerL / 1000,
                _ => null,
            };
            if (before is not { } value || LimitJudge.IsBeyond(limit, value))
                continue;
            foreach (PredictedWater predicted in new[] { step.Closed, step.Settled })
            {
                if (LimitJudge.Value(predicted, limit.Quantity) is { } after && LimitJudge.IsBeyond(limit, after.Value))
                    return $"it breaks {PlanWords.InSentence(limit.Text)}.";
            }
        }

        return null;
    }

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
