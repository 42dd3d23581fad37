using System.Globalization;

namespace TankChem.Dosing;

/// <summary>A plan's reasons and cautions in words.</summary>
internal static class PlanWords
{
    /// <summary>Who must decide.</summary>
    public const string WhoDecides = "Advice, not an order: local codes and a competent person decide.";

    // Common practice, no source: chalk falls out of fresh water above about ten times saturation with calcite, of sea water above about five with aragonite.
    private const double OmegaCalciteFresh = 10;
    private const double OmegaAragoniteSea = 5;
    private const double SeaFrom = 15;

    private const double DayS = 24 * 3600;

    /// <summary>Why this reagent, amount and pace, and what it ends at.</summary>
    public static IReadOnlyList<string> Reasons(DoseProblem problem, WaterModel[] waters, Reagent reagent, double today, IReadOnlyList<DoseStep> steps, double rise)
    {
        string given = problem.DosedTodayMmolL > 0 ? Invariant($"; {problem.DosedTodayMmolL:0.00} went in today already") : "";
        string choice = reagent.Id == ReagentCatalog.Carbonate
            ? "Carbonate binds CO2 while it raises alkalinity, so it lifts pH faster than bicarbonate."
            : reagent.CarbonPerMole == reagent.EquivalentsPerMole ? "Bicarbonate lifts pH least of all bases for the same alkalinity." : $"{reagent.Formula} lifts pH faster than bicarbonate.";
        return
        [
            Invariant($"{Mass(steps.Sum(s => s.AmountG))} of {reagent.Name} ({reagent.Formula}, taken as 100 % pure) in {problem.VolumeM3:0.###} m3 adds {rise:0.00} mmol/L: {today:0.00} to {today + rise:0.00}."),
            choice,
            Invariant($"In {steps.Count} portion{(steps.Count == 1 ? "" : "s")}: at most {problem.StepMmolLMax:0.00} mmol/L at once and {problem.DayMmolLMax:0.00} a day{given}, and none lifts pH by more than {waters.Min(w => w.Water.PhRisePerHourMax):0.00} an hour; between portions the water mixes and settles."),
            .. waters.Select(w => Certainty(w, reagent, rise)),
        ];
    }

    /// <summary>What to watch, how to handle it, who decides.</summary>
    public static IReadOnlyList<string> Cautions(DoseProblem problem, WaterModel[] waters, Reagent reagent, IReadOnlyList<DoseStep> steps, double rise)
    {
        double largest = steps.Max(s => s.AmountG);
        List<string> cautions =
        [
            "Read pH again before each next portion; stop when it is outside what is shown, when animals behave oddly, or when something else has changed.",
            $"{reagent.Handling} Never let it meet acid or chlorine products.",
            Invariant($"Dissolve each portion first, at least {Math.Max(0.1, largest / reagent.SolubilityGPerL):0.0} L of water for it; pour slowly where the flow is fastest, away from the animals."),
            Invariant($"The volume is taken as known to {problem.VolumeRelativeU * 100:0} % and the product as pure: titrate afterwards, before anything more goes in."),
        ];
        if (waters.Length > 1)
            cautions.Add("Pour it where the water returns to all tanks, over half an hour or more: a whole portion in one tank would be far too much for it.");
        if (steps[^1].AfterS >= DayS)
            cautions.Add("Titrate again before each further day: the water uses up alkalinity meanwhile, and the plan does not know how much.");
        if (waters.Any(w => w.Water.TanMgL is null))
            cautions.Add("Total ammonia is not measured here and taken as used up by plants or corals: test it first when animals were added or have died, or after a big clean.");
        cautions.AddRange(waters.Select(w => Ammonia(w, reagent, rise)).OfType<string>());
        cautions.AddRange(waters.Select(w => HighCo2(w)).OfType<string>());
        if (Chalk(waters[0].Water, steps) is { } chalk)
            cautions.Add(chalk);
        cautions.Add(WhoDecides);
        return cautions;
    }

    /// <summary>What to do when a plan is refused.</summary>
    public static IReadOnlyList<string> Instead(IReadOnlyList<DoseGround> grounds)
    {
        var cautions = new List<string>();
        bool limit(string quantity) => grounds.Any(g => g.Kind == "limit" && g.Quantity == quantity);
        if (limit("nh3-n"))
            cautions.Add("Bring total ammonia down first: less feed, exchange with water that has been tested; then plan again.");
        if (limit("co2"))
            cautions.Add("Bring CO2 down first: gas off, more air with an eye on ammonia; then plan again.");
        cautions.Add(WhoDecides);
        return cautions;
    }

    /// <summary>A mass as it is weighed.</summary>
    public static string Mass(double grams) => grams switch
    {
        >= 10_000 => Invariant($"{grams / 1000:0.0} kg"),
        >= 1000 => Invariant($"{grams / 1000:0.00} kg"),
        >= 100 => Invariant($"{grams:0} g"),
        >= 1 => Invariant($"{grams:0.0} g"),
        _ => Invariant($"{grams:0.000} g"),
    };

    /// <summary>A limit's text in the middle of a sentence: "Alkalinity limit" becomes "alkalinity limit", "CO2" and "pH" stay.</summary>
    public static string InSentence(string text) =>
        text.Length > 1 && char.IsUpper(text[0]) && char.IsLower(text[1]) || text.StartsWith("Un-", StringComparison.Ordinal) ? char.ToLowerInvariant(text[0]) + text[1..] : text;

    private static string Certainty(WaterModel water, Reagent reagent, double rise)
    {
        PredictedWater end = water.Predict(c => c.Settled(reagent, water.UmolKg(rise)))!;
        string ammonia = end.Nh3NMgL is { } nh3 ? Invariant($", un-ionised ammonia {nh3.Value:0.0000} ± {nh3.StandardUncertainty:0.0000} mg/L as N") : "";
        return Invariant($"{water.Water.Name} settles at pH {end.PH.Value:0.00} ± {end.PH.StandardUncertainty:0.00}, CO2 {end.Co2MgL.Value:0.0} ± {end.Co2MgL.StandardUncertainty:0.0} mg/L{ammonia}.");
    }

    private static string? Ammonia(WaterModel water, Reagent reagent, double rise)
    {
        if (water.Predict(c => c.Air(reagent, water.UmolKg(rise)))?.Nh3NMgL is not { } nh3)
            return null;
        DoseLimit? first = water.Water.Limits.Where(l => l.Quantity == "nh3-n" && l.IsUpper && LimitJudge.IsBeyond(l, nh3.Value)).MaxBy(l => l.Value);
        return first is null ? null : Invariant($"{water.Water.Name}: do not strip CO2 harder than now while this alkalinity is in. In full equilibrium with the air un-ionised ammonia would be {nh3.Value:0.000} mg/L as N, beyond {InSentence(first.Text)}.");
    }

    private static string? HighCo2(WaterModel water)
    {
        if (water.Predict(c => c.Now) is not { } now)
            return null;
        DoseLimit? over = water.Water.Limits.FirstOrDefault(l => l.Quantity == "co2" && l.IsUpper && LimitJudge.IsBeyond(l, now.Co2MgL.Value));
        return over is null ? null : Invariant($"{water.Water.Name}: CO2 is {now.Co2MgL.Value:0.0} mg/L, beyond {InSentence(over.Text)}. Gas off and more air come first; this dose does not remove CO2.");
    }

    private static string? Chalk(DoseWater water, IReadOnlyList<DoseStep> steps)
    {
        bool sea = water.Solution.Salinity >= SeaFrom;
        double? Omega(PredictedWater w) => sea ? w.OmegaAragonite : w.OmegaCalcite;
        double limit = sea ? OmegaAragoniteSea : OmegaCalciteFresh;
        string mineral = sea ? "aragonite" : "calcite";
        double? soon = steps.Max(s => Omega(s.Closed) > Omega(s.Settled) ? Omega(s.Closed) : Omega(s.Settled));
        double? inAir = Omega(steps[^1].Air);
        if (soon > limit)
            return Invariant($"Chalk may fall out: the water would be {soon:0.0} times saturated with {mineral} (common practice, no source: beware above {limit:0}). Watch for white clouds, and for pH and alkalinity that fall after the dose.");
        return inAir > limit
            ? Invariant($"Stripped of its CO2 the water would be {inAir:0.0} times saturated with {mineral}: chalk may form on heaters and pumps (common practice, no source: beware above {limit:0}).")
            : null;
    }

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
