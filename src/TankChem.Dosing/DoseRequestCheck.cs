using System.Globalization;

namespace TankChem.Dosing;

/// <summary>What a plan cannot be made from.</summary>
internal static class DoseRequestCheck
{
    /// <summary>No water that holds animals needs more, mmol/L; a target above it is a slip of a unit.</summary>
    public const double TargetMmolLMax = 10;

    /// <summary>Every fault of the question and of what is known.</summary>
    public static IReadOnlyList<DoseGround> FaultsOf(DoseProblem problem, DoseTarget target, IReadOnlyList<string> reagents) =>
        [.. problem.MissingInputs, .. OfTarget(target), .. reagents.Select(OfReagent).OfType<DoseGround>(), .. OfWater(problem)];

    private static IEnumerable<DoseGround> OfTarget(DoseTarget target)
    {
        if (target.Quantity != "alkalinity")
            yield return new DoseGround("input", target.Quantity, $"Plans are made for alkalinity; \"{target.Quantity}\" cannot be a target yet.", null);
        else if (!double.IsFinite(target.Value) || target.Value <= 0 || target.Value > TargetMmolLMax)
            yield return new DoseGround("input", "alkalinity", Invariant($"A target of {target.Value} mmol/L is no alkalinity for animals; right would be more than 0 and at most {TargetMmolLMax} mmol/L. Check the unit: 1 dKH is 0.357 mmol/L, 50 mg/L as CaCO3 is 1 mmol/L."), null);
    }

    private static DoseGround? OfReagent(string id)
    {
        if (ReagentCatalog.Find(id) is not { } reagent)
            return new DoseGround("input", "reagent", $"\"{id}\" is no reagent known here; known are {string.Join(", ", ReagentCatalog.All.Where(r => !r.Locked).Select(r => r.Id))}.", null);
        return reagent.Locked
            ? new DoseGround("input", "reagent", $"{reagent.Name} is a strong acid or base: it is off until a named competent person unlocks it for the site, and this version cannot. {reagent.Handling}", null)
            : null;
    }

    private static IEnumerable<DoseGround> OfWater(DoseProblem problem)
    {
        bool told(string quantity) => problem.MissingInputs.Any(g => g.Quantity == quantity);
        if (!(problem.VolumeM3 > 0 && double.IsFinite(problem.VolumeM3.Value)) && !told("volume"))
            yield return new DoseGround("input", "volume", problem.VolumeM3 is { } given ? Invariant($"A water volume of {given} m3 is none; right would be more than 0.") : "The water volume is not on record; set it up first.", null);
        if (problem.Waters.Count == 0 && problem.MissingInputs.Count == 0)
            yield return new DoseGround("input", "ph", "The state of the water is not known; measure pH, temperature and alkalinity first.", null);
        if (!(problem.StepMmolLMax > 0 && problem.DayMmolLMax > 0 && double.IsFinite(problem.DosedTodayMmolL)))
            yield return new DoseGround("input", "alkalinity", Invariant($"The pace of doses is not usable (portion {problem.StepMmolLMax}, day {problem.DayMmolLMax}, given today {problem.DosedTodayMmolL} mmol/L); right would be numbers above 0."), null);
        foreach (DoseWater water in problem.Waters)
        {
            if (water.AmmoniaMatters && water.TanMgL is null && !told("tan"))
                yield return new DoseGround("input", "tan", $"{water.Name}: total ammonia is not known. Raising pH turns ammonia toxic: test TAN first.", null);
        }
    }

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
