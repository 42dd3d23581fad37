using System.Globalization;

namespace TankChem.Dosing;

/// <summary>Makes and judges dose plans. Pure: the same problem gives the same plan.</summary>
/// <remarks>Judged between the dose entering (closed) and the water back at its own pCO2 (settled), which is where it goes while the same animals breathe and the same air strips it. Equilibrium with the air
/// is shown beside; only a change of aeration leads there, so of the limits only the lethal ones are held there. docs/dosing.md has the rules.</remarks>
public static class DosePlanner
{
    private const int SearchSteps = 6;

    /// <summary>A rise below this is not worth offering, mmol/L.</summary>
    private const double WorthMmolL = 0.02;

    /// <summary>A plan that brings alkalinity to the target with the first of the reagents that is allowed, or a refusal with its grounds.</summary>
    /// <param name="problem">The water.</param>
    /// <param name="target">What it shall be.</param>
    /// <param name="reagents">Reagent ids in order of preference; empty for the planner's own choice.</param>
    public static DosePlan Plan(DoseProblem problem, DoseTarget target, IReadOnlyList<string> reagents)
    {
        ArgumentNullException.ThrowIfNull(problem);
        ArgumentNullException.ThrowIfNull(target);
        ArgumentNullException.ThrowIfNull(reagents);
        IReadOnlyList<DoseGround> faults = DoseRequestCheck.FaultsOf(problem, target, reagents);
        if (faults.Count > 0)
            return Refused(faults, []);

        WaterModel[] waters = [.. problem.Waters.Select(w => new WaterModel(w, problem.VolumeRelativeU))];
        if (Array.Find(waters, w => !w.IsPossible) is { } impossible)
            return Refused([new DoseGround("input", "ph", $"{impossible.Water.Name}: its pH and alkalinity do not belong to one water; check the probe and titrate again.", null)], []);
        double today = waters[0].Water.AlkalinityUmolKg.Value * waters[0].DensityKgPerL / 1000;
        double rise = target.Value - today;
        if (rise < 1e-6)
            return Refused([new DoseGround("input", "alkalinity", Invariant($"Alkalinity is {today:0.00} mmol/L already, the target {target.Value:0.00}: a base cannot lower it. It falls by itself with nitrification, or by exchange with softer water that has been tested."), null)], []);

        Reagent[] candidates = [.. (reagents.Count > 0 ? reagents : OwnChoice(waters)).Distinct(StringComparer.Ordinal).Select(id => ReagentCatalog.Find(id)!)];
        DosePlan? firstRefusal = null;
        foreach (Reagent reagent in candidates)
        {
            DosePlan plan = Try(problem, waters, reagent, today, rise);
            if (plan.Allowed)
                return DosePlanCheck.FaultOf(problem, target, today, plan) is { } fault ? Withheld(fault) : plan;
            firstRefusal ??= plan;
        }

        return firstRefusal! with { Nearest = Nearest(problem, waters, candidates, today, rise) };
    }

    /// <summary>Bicarbonate, the gentlest. Carbonate after it where CO2 is over its limit, because carbonate binds CO2 while bicarbonate brings some.</summary>
    private static string[] OwnChoice(WaterModel[] waters)
    {
        bool highCo2 = waters.Any(w => w.Predict(c => c.Now) is { } now && w.Water.Limits.Any(l => l.Quantity == "co2" && LimitJudge.Probability(l, now.Co2MgL) < LimitJudge.Asked(l)));
        return highCo2 ? [ReagentCatalog.Bicarbonate, ReagentCatalog.Carbonate] : [ReagentCatalog.Bicarbonate];
    }

    private static DosePlan Try(DoseProblem problem, WaterModel[] waters, Reagent reagent, double today, double rise)
    {
        var judge = new PlanJudge(problem, waters, reagent);
        IReadOnlyList<Portion> portions = Schedule(problem, judge, rise);
        if (portions.Count == 0)
        {
            // Too slow for one plan at the pace pH allows; what it would do at the pace of alkalinity alone shows why.
            portions = DoseSchedule.Of(rise, problem.DayMmolLMax, problem.DosedTodayMmolL, (_, wanted) => wanted, (_, wanted) => Math.Min(wanted, problem.StepMmolLMax));
            IReadOnlyList<DoseGround> why = portions.Count == 0 ? [] : judge.Grounds(portions, untilFirst: false);
            return Refused(why.Count > 0 ? why : [TooSlow(problem, rise)], Steps(problem, waters[0], reagent, portions));
        }

        IReadOnlyList<DoseGround> grounds = judge.Grounds(portions, untilFirst: false);
        IReadOnlyList<DoseStep> steps = Steps(problem, waters[0], reagent, portions);
        return grounds.Count > 0
            ? Refused(grounds, steps)
            : new DosePlan
            {
                Allowed = true,
                Grounds = [],
                Steps = steps,
                Reasons = PlanWords.Reasons(problem, waters, reagent, today, steps, rise),
                Cautions = PlanWords.Cautions(problem, waters, reagent, steps, rise),
                ReachesMmolL = today + rise,
            };
    }

    private static IReadOnlyList<Portion> Schedule(DoseProblem problem, PlanJudge judge, double rise) =>
        DoseSchedule.Of(rise, problem.DayMmolLMax, problem.DosedTodayMmolL, judge.Pace.Day, judge.Pace.Portion);

    private static DoseGround TooSlow(DoseProblem problem, double rise) => new(
        "limit",
        "alkalinity",
        Invariant($"A rise of {rise:0.00} mmol/L takes more than {DoseSchedule.DaysMax} days or {DoseSchedule.PortionsMax} portions at the pace that is taken (at most {problem.StepMmolLMax:0.00} mmol/L a portion, {problem.DayMmolLMax:0.00} a day, {problem.DosedTodayMmolL:0.00} given today). Choose a nearer target and titrate between."),
        1);

    private static List<DoseStep> Steps(DoseProblem problem, WaterModel water, Reagent reagent, IReadOnlyList<Portion> portions)
    {
        var steps = new List<DoseStep>(portions.Count);
        double sum = 0;
        foreach (Portion portion in portions)
        {
            sum += portion.MmolL;
            double added = water.UmolKg(sum);
            if (water.Predict(c => c.Closed(reagent, added)) is not { } closed || water.Predict(c => c.Settled(reagent, added)) is not { } settled || water.Predict(c => c.Air(reagent, added)) is not { } air)
                break;
            steps.Add(new DoseStep { AfterS = portion.AfterS, Reagent = reagent.Id, AmountG = Grams(problem, reagent, portion.MmolL), Closed = closed, Settled = settled, Air = air });
        }

        return steps;
    }

    /// <summary>mmol/L × m³ is mol; a mole of reagent brings its equivalents.</summary>
    private static double Grams(DoseProblem problem, Reagent reagent, double mmolL) => mmolL * problem.VolumeM3!.Value / reagent.EquivalentsPerMole * reagent.MolarMassGMol;

    private static DosePlan Refused(IReadOnlyList<DoseGround> grounds, IReadOnlyList<DoseStep> steps) => new()
    {
        Allowed = false,
        Grounds = grounds,
        Steps = steps,
        Reasons = [],
        Cautions = PlanWords.Instead(grounds),
    };

    private static DosePlan Withheld(string fault) =>
        Refused([new DoseGround("input", "plan", $"The planner's check of its own plan failed: {fault} The plan is withheld; please report this.", null)], []);

    /// <summary>The largest rise that is allowed, found by halving; bicarbonate is tried whatever was asked for.</summary>
    private static string? Nearest(DoseProblem problem, WaterModel[] waters, Reagent[] candidates, double today, double rise)
    {
        string? best = null;
        double most = WorthMmolL;
        foreach (Reagent reagent in candidates.Prepend(ReagentCatalog.Find(ReagentCatalog.Bicarbonate)!).Distinct())
        {
            var judge = new PlanJudge(problem, waters, reagent);
            double low = 0, high = rise;
            if (!candidates.Contains(reagent) && IsAllowed(rise))
                low = rise;
            else if (best is not null && !IsAllowed(most))
                continue;
            for (int i = 0; i < SearchSteps && low < rise; i++)
            {
                double middle = 0.5 * (low + high);
                if (IsAllowed(middle))
                    low = middle;
                else
                    high = middle;
            }

            if (low > most)
            {
                most = low;
                best = Invariant($"Allowed would be {PlanWords.Mass(Grams(problem, reagent, low))} of {reagent.Name}, in portions, to {today + low:0.00} mmol/L; then measure again.");
            }

            bool IsAllowed(double amount)
            {
                IReadOnlyList<Portion> portions = Schedule(problem, judge, amount);
                return portions.Count > 0 && judge.Grounds(portions, untilFirst: true).Count == 0;
            }
        }

        return best;
    }

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
