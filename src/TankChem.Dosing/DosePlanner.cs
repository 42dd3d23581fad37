using System.Globalization;

namespace TankChem.Dosing;

/// <summary>Makes and judges dose plans. Pure: the same problem gives the same plan.</summary>
/// <remarks>Judged between the dose entering (closed) and the water back at its own pCO2 (settled), which is where it goes while animals breathe and the same air strips it; equilibrium with the air is shown beside,
/// because only a change of aeration leads there. docs/dosing.md has the rules.</remarks>
public static class DosePlanner
{
    private const int StepsMax = 24;

    /// <summary>No water that holds animals needs more; a target above it is a slip of a unit.</summary>
    private const double TargetMmolLMax = 10;
    private const int SearchSteps = 10;

    /// <summary>A plan that brings alkalinity to the target with the first of the reagents that is allowed, or a refusal with its grounds.</summary>
    /// <param name="problem">The water.</param>
    /// <param name="target">What it shall be.</param>
    /// <param name="reagents">Reagent ids in order of preference; empty for the planner's own choice.</param>
    public static DosePlan Plan(DoseProblem problem, DoseTarget target, IReadOnlyList<string> reagents)
    {
        ArgumentNullException.ThrowIfNull(problem);
        ArgumentNullException.ThrowIfNull(target);
        ArgumentNullException.ThrowIfNull(reagents);
        List<DoseGround> grounds = [.. problem.MissingInputs, .. FaultsOfInput(problem, target, reagents)];
        if (grounds.Count > 0)
            return Refused(grounds, []);

        WaterModel[] waters = [.. problem.Waters.Select(w => new WaterModel(w))];
        if (Array.Find(waters, w => !w.IsPossible) is { } impossible)
            return Refused([new DoseGround("input", "ph", $"{impossible.Water.Name}: its pH and alkalinity do not belong to one water; check the probe and titrate again.", null)], []);
        double today = waters[0].Water.AlkalinityUmolKg.Value * waters[0].DensityKgPerL / 1000;
        double rise = target.Value - today;
        if (rise <= 1e-6)
            return Refused([new DoseGround("limit", "alkalinity", Invariant($"Alkalinity is {today:0.00} mmol/L already, the target {target.Value:0.00}: a base cannot lower it. It falls by itself with nitrification, or by exchange with softer water that has been tested."), 1)], []);

        IReadOnlyList<Reagent> candidates = [.. (reagents.Count > 0 ? reagents : OwnChoice()).Select(id => ReagentCatalog.Find(id)!)];
        DosePlan? firstRefusal = null;
        foreach (Reagent reagent in candidates)
        {
            DosePlan plan = Try(problem, waters, reagent, today, rise);
            if (plan.Allowed)
                return plan;
            firstRefusal ??= plan;
        }

        return firstRefusal! with { Nearest = Nearest(problem, waters, candidates, today, rise) };
    }

    private static string[] OwnChoice() => [ReagentCatalog.Bicarbonate];

    private static IEnumerable<DoseGround> FaultsOfInput(DoseProblem problem, DoseTarget target, IReadOnlyList<string> reagents)
    {
        if (target.Quantity != "alkalinity")
            yield return new DoseGround("input", target.Quantity, $"Plans are made for alkalinity; \"{target.Quantity}\" cannot be a target yet.", null);
        else if (!double.IsFinite(target.Value) || target.Value <= 0 || target.Value > TargetMmolLMax)
            yield return new DoseGround("input", "alkalinity", Invariant($"A target of {target.Value} mmol/L is no alkalinity for animals; right would be more than 0 and at most {TargetMmolLMax} mmol/L. Check the unit: 1 dKH is 0.357 mmol/L."), null);
        foreach (string id in reagents)
        {
            if (ReagentCatalog.Find(id) is not { } reagent)
                yield return new DoseGround("input", "reagent", $"\"{id}\" is no reagent known here; known are {string.Join(", ", ReagentCatalog.All.Where(r => !r.Locked).Select(r => r.Id))}.", null);
            else if (reagent.Locked)
                yield return new DoseGround("input", "reagent", $"{reagent.Name} is a strong acid or base: it is off until a named competent person unlocks it for the site, and this version cannot. {reagent.Handling}", null);
        }

        if (problem.VolumeM3 is not > 0 && !problem.MissingInputs.Any(g => g.Quantity == "volume"))
            yield return new DoseGround("input", "volume", "The water volume is not on record; set it up first.", null);
        if (problem.Waters.Count == 0 && problem.MissingInputs.Count == 0)
            yield return new DoseGround("input", "ph", "The state of the water is not known.", null);
        foreach (DoseWater water in problem.Waters)
        {
            if (water.AmmoniaMatters && water.TanMgL is null)
                yield return new DoseGround("input", "tan", $"{water.Name}: total ammonia is not known or too old. Raising pH turns ammonia toxic, so test TAN first.", null);
        }
    }

    private static DosePlan Try(DoseProblem problem, WaterModel[] waters, Reagent reagent, double today, double rise)
    {
        // Smaller portions until none raises pH faster than it may.
        DosePlan? plan = null;
        for (double stepMax = problem.StepMmolLMax; stepMax > problem.StepMmolLMax / 40; stepMax /= 2)
        {
            IReadOnlyList<(double AfterS, double MmolL)> portions = DoseSchedule.Of(rise, stepMax, problem.DayMmolLMax, problem.DosedTodayMmolL, StepsMax);
            if (portions.Count == 0)
                return plan ?? Refused([new DoseGround("limit", "alkalinity", Invariant($"A rise of {rise:0.00} mmol/L takes more than {StepsMax} portions at the allowed pace (at most {problem.StepMmolLMax:0.00} mmol/L a portion, {problem.DayMmolLMax:0.00} a day). Choose a nearer target and titrate between."), 1)], []);
            plan = Judge(problem, waters, reagent, today, portions);
            if (plan.Allowed || !plan.Grounds.Any(g => g.Quantity == RateQuantity))
                return plan;
        }

        return plan!;
    }

    private const string RateQuantity = "ph-rate";

    private static DosePlan Judge(DoseProblem problem, WaterModel[] waters, Reagent reagent, double today, IReadOnlyList<(double AfterS, double MmolL)> portions)
    {
        var steps = new List<DoseStep>(portions.Count);
        var grounds = new List<DoseGround>();
        double settled = 0;
        for (int i = 0; i < portions.Count; i++)
        {
            (double afterS, double mmolL) = portions[i];
            double before = settled;
            settled += mmolL;
            foreach (WaterModel water in waters)
                JudgeStep(water, reagent, before, mmolL, i + 1, grounds);
            steps.Add(Step(problem, waters[0], reagent, afterS, mmolL, settled));
        }

        return grounds.Count > 0
            ? Refused(grounds.DistinctBy(g => (g.Quantity, g.Text)).ToArray(), steps)
            : Allowed(problem, waters, reagent, today, portions, steps);
    }

    private static void JudgeStep(WaterModel water, Reagent reagent, double beforeMmolL, double addedMmolL, int number, List<DoseGround> grounds)
    {
        double before = beforeMmolL / water.DensityKgPerL * 1000, added = addedMmolL / water.DensityKgPerL * 1000;
        PredictedWater? now = water.Predict(c => c.Now);
        PredictedWater? start = water.Predict(c => c.Settled(reagent, before));
        PredictedWater? closed = water.Predict(c => c.ClosedFromSettled(reagent, before, added));
        PredictedWater? all = water.Predict(c => c.Closed(reagent, before + added));
        PredictedWater? settled = water.Predict(c => c.Settled(reagent, before + added));
        if (now is null || start is null || closed is null || all is null || settled is null)
        {
            grounds.Add(new DoseGround("limit", "ph", $"{water.Water.Name}: after portion {number} the water would be outside what can be computed.", 1));
            return;
        }

        DoseGround? broken = LimitJudge.Broken(water.Water.Limits, now, closed, $"right after portion {number}")
            ?? LimitJudge.Broken(water.Water.Limits, now, all, $"after portion {number} if no gas escaped")
            ?? LimitJudge.Broken(water.Water.Limits, now, settled, $"settled after portion {number}");
        if (broken is not null)
            grounds.Add(broken);
        double rise = Math.Max(closed.PH.Value, settled.PH.Value) - start.PH.Value;
        if (rise > water.Water.PhRisePerHourMax)
            grounds.Add(new DoseGround("limit", RateQuantity, Invariant($"{water.Water.Name}: portion {number} would raise pH by {rise:0.00} within the hour, more than {water.Water.PhRisePerHourMax:0.00}."), 1));
    }

    private static DoseStep Step(DoseProblem problem, WaterModel water, Reagent reagent, double afterS, double mmolL, double sumMmolL)
    {
        double sum = sumMmolL / water.DensityKgPerL * 1000;
        return new DoseStep
        {
            AfterS = afterS,
            Reagent = reagent.Id,
            AmountG = Grams(problem, reagent, mmolL),
            Closed = water.Predict(c => c.Closed(reagent, sum)) ?? Nothing(water),
            Settled = water.Predict(c => c.Settled(reagent, sum)) ?? Nothing(water),
            Air = water.Predict(c => c.Air(reagent, sum)) ?? Nothing(water),
        };
    }

    /// <summary>mmol/L × m³ is mol; a mole of reagent brings its equivalents.</summary>
    private static double Grams(DoseProblem problem, Reagent reagent, double mmolL) => mmolL * problem.VolumeM3!.Value / reagent.EquivalentsPerMole * reagent.MolarMassGMol;

    private static PredictedWater Nothing(WaterModel water) =>
        new(water.Water.Name, new Estimate(water.Water.PH.Value, double.NaN), new Estimate(0, double.NaN), null, new Estimate(0, double.NaN), null);

    private static DosePlan Allowed(DoseProblem problem, WaterModel[] waters, Reagent reagent, double today, IReadOnlyList<(double AfterS, double MmolL)> portions, List<DoseStep> steps)
    {
        double rise = portions.Sum(p => p.MmolL), grams = steps.Sum(s => s.AmountG);
        List<string> reasons =
        [
            Invariant($"{grams:0.#} g of {reagent.Name} ({reagent.Formula}, taken as pure) in {problem.VolumeM3:0.###} m³ adds {rise:0.00} mmol/L: {today:0.00} to {today + rise:0.00}."),
            Invariant($"In {portions.Count} portion{(portions.Count == 1 ? "" : "s")}, each at most {problem.StepMmolLMax:0.00} mmol/L and {problem.DayMmolLMax:0.00} mmol/L a day{(problem.DosedTodayMmolL > 0 ? Invariant($" ({problem.DosedTodayMmolL:0.00} went in today)") : "")}; between portions the water mixes and settles."),
        ];
        reasons.AddRange(waters.Select(w => Certainty(w, reagent, rise)));
        List<string> cautions = [.. CommonCautions(reagent, Invariant($"{grams / reagent.SolubilityGPerL:0.0}"))];
        DoseStep last = steps[^1];
        if (last.Air.OmegaCalcite > 10)
            cautions.Add(Invariant($"In equilibrium with air the water would be {last.Air.OmegaCalcite:0} times saturated with calcite: chalk may form on heaters and pumps (common practice, no source: beware above 10)."));
        if (waters.Any(w => w.Water.Limits.Any(l => l.Quantity == "nh3-n" && l.IsUpper && w.Predict(c => c.Air(reagent, rise / w.DensityKgPerL * 1000))?.Nh3NMgL?.Value > l.Value)))
            cautions.Add("Do not strip CO2 harder than now while this alkalinity is in: in full equilibrium with the air the un-ionised ammonia would pass its limit.");
        return new DosePlan
        {
            Allowed = true,
            Grounds = [],
            Steps = steps,
            Reasons = reasons,
            Cautions = cautions,
            ReachesMmolL = today + rise,
        };
    }

    private static string Certainty(WaterModel water, Reagent reagent, double riseMmolL)
    {
        PredictedWater end = water.Predict(c => c.Settled(reagent, riseMmolL / water.DensityKgPerL * 1000))!;
        string ammonia = end.Nh3NMgL is { } nh3 ? Invariant($", un-ionised ammonia {nh3.Value:0.0000} ± {nh3.StandardUncertainty:0.0000} mg/L") : "";
        return Invariant($"{water.Water.Name} settles at pH {end.PH.Value:0.00} ± {end.PH.StandardUncertainty:0.00}, CO2 {end.Co2MgL.Value:0.0} ± {end.Co2MgL.StandardUncertainty:0.0} mg/L{ammonia}.");
    }

    private static IEnumerable<string> CommonCautions(Reagent reagent, string litres)
    {
        yield return $"{reagent.Handling} Never let it meet acid or chlorine products.";
        yield return $"Dissolve it first: at least {litres} L of water in all; pour slowly where the flow is fastest, away from the animals.";
        yield return "Read pH again before each next portion; stop when it is outside what is shown, when animals behave oddly, or when something else has changed.";
        yield return "Advice, not an order: local codes and a competent person decide.";
    }

    private static DosePlan Refused(IReadOnlyList<DoseGround> grounds, IReadOnlyList<DoseStep> steps) => new()
    {
        Allowed = false,
        Grounds = grounds,
        Steps = steps,
        Reasons = [],
        Cautions = ["Advice, not an order: local codes and a competent person decide."],
    };

    private static string? Nearest(DoseProblem problem, WaterModel[] waters, IReadOnlyList<Reagent> candidates, double today, double rise)
    {
        Reagent[] tried = [.. candidates.Prepend(ReagentCatalog.Find(ReagentCatalog.Bicarbonate)!).Distinct()];
        string? best = null;
        double most = 0;
        foreach (Reagent reagent in tried)
        {
            double low = 0, high = rise;
            if (Try(problem, waters, reagent, today, rise).Allowed)
                low = rise;
            for (int i = 0; i < SearchSteps && low < rise; i++)
            {
                double middle = 0.5 * (low + high);
                if (Try(problem, waters, reagent, today, middle).Allowed)
                    low = middle;
                else
                    high = middle;
            }

            if (low > most * (1 + 1e-6) && low > 0.02)
            {
                most = low;
                best = Invariant($"Allowed would be {Grams(problem, reagent, low):0} g of {reagent.Name}, to {today + low:0.00} mmol/L; then measure again.");
            }
        }

        return best;
    }

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
