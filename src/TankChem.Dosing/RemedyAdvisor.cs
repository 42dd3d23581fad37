using System.Globalization;

namespace TankChem.Dosing;

/// <summary>What to do about CO2 that is too high (or about to be), never base first.</summary>
public static class RemedyAdvisor
{
    private const string RoomAir = "CO2 gathers in low and closed rooms: ventilate; where room air may hold 5,000 ppm or more, do not enter before it is aired. Short of breath means leave at once.";

    /// <summary>Gas off, more air with the ammonia check and where to stop, and what not to do; in the order in which to do it.</summary>
    /// <param name="problem">The water; its missing inputs are named in the advice instead of refusing it: gas off never waits for a titration.</param>
    /// <param name="hasInjection">Whether CO2 is injected there.</param>
    public static IReadOnlyList<Remedy> ForHighCo2(DoseProblem problem, bool hasInjection)
    {
        ArgumentNullException.ThrowIfNull(problem);
        WaterModel? water = problem.Waters.Count > 0 ? new WaterModel(problem.Waters[0], 0) : null;
        if (water is { IsPossible: false })
            water = null;
        var remedies = new List<Remedy>();
        if (hasInjection)
            remedies.Add(GasOff(problem, water));
        remedies.Add(water is null ? AddAirUnknown(problem) : AddAir(problem, water));
        remedies.Add(CutFeed());
        remedies.Add(Exchange());
        remedies.Add(NoBaseFirst(water));
        return remedies;
    }

    private static Remedy GasOff(DoseProblem problem, WaterModel? water) => new(
        "gas-off",
        "Close the CO2 valve by hand",
        true,
        ["More CO2 only makes it worse; closing the valve needs no measurement and cannot harm the animals.", "Check that the bubbles stop: a valve can be stuck open while its controller says closed."],
        [RoomAir],
        water is null ? [] : RemedyPath.Of(water, problem.IdlePerHour, 0));

    private static Remedy AddAirUnknown(DoseProblem problem)
    {
        string missing = problem.MissingInputs.Count > 0 ? string.Join(" ", problem.MissingInputs.Select(g => g.Text)) : "The state of the water is not known.";
        return new Remedy(
            "add-air",
            "Add air",
            true,
            ["Air carries CO2 out of the water.", $"How far to go cannot be computed: {missing} Add air all the same when animals gasp; until pH and total ammonia are measured only so much that pH rises by less than 0.2 an hour."],
            ["Where fish are short of oxygen, emergency oxygen comes first.", RoomAir],
            []);
    }

    private static Remedy AddAir(DoseProblem problem, WaterModel water)
    {
        AirGoal goal = AirGoal.Of(water);
        List<string> reasons = ["Air carries CO2 out of the water; alkalinity stays, so pH rises as CO2 leaves.", .. goal.Reasons];
        List<string> cautions = ["Where fish are short of oxygen, emergency oxygen comes first.", "Watch pH and the animals; test TAN again when pH has risen by 0.3: un-ionised ammonia has doubled by then.", RoomAir];
        bool moves = goal.IsAllowed && goal.StopMgL < water.Nominal.Co2MgL;
        IReadOnlyList<RemedyPoint> path = moves ? RemedyPath.Of(water, problem.StripPerHour, goal.StopMgL) : [];
        if (HourRise(path) is { } rise && rise > water.Water.PhRisePerHourMax)
        {
            reasons.Add(goal.IsRescue
                ? Invariant($"pH would rise by about {rise:0.0} in the first hour, faster than the {water.Water.PhRisePerHourMax:0.0} that is taken otherwise: accepted here, because CO2 is beyond its danger limit and getting out of it comes first.")
                : Invariant($"pH would rise by about {rise:0.0} in the first hour, faster than the {water.Water.PhRisePerHourMax:0.0} that is taken: open the air in steps, unless animals are in distress."));
        }

        if (water.Water.TanMgL is null)
            cautions.Add(water.Water.AmmoniaMatters ? "Total ammonia is not known: test TAN before aerating strongly." : "Total ammonia is not measured here: test it when animals were added or have died.");
        return new Remedy("add-air", Title(water, goal), goal.IsAllowed, reasons, cautions, path);
    }

    private static string Title(WaterModel water, AirGoal goal) => goal switch
    {
        { IsAllowed: false } => "No more air than the animals need: ammonia forbids it",
        _ when goal.StopMgL >= water.Nominal.Co2MgL => Invariant($"More air is not needed: CO2 is {water.Nominal.Co2MgL:0.0} mg/L"),
        _ => Invariant($"Add air until CO2 is {goal.StopMgL:0.0} mg/L, then hold"),
    };

    private static double? HourRise(IReadOnlyList<RemedyPoint> path)
    {
        RemedyPoint? hour = path.FirstOrDefault(p => p.AfterS == 3600);
        return hour is null ? null : hour.PH.Value - path[0].PH.Value;
    }

    private static Remedy CutFeed() => new(
        "cut-feed",
        "Stop feeding until CO2 is back",
        true,
        ["Fed animals breathe out more CO2 and excrete more ammonia for hours."],
        [],
        []);

    private static Remedy Exchange() => new(
        "exchange",
        "No water exchange without a tested source",
        false,
        ["Fresh water helps only when its pH, temperature, oxygen, CO2 and ammonia have just been tested and suit the stock; well water often holds more CO2 than the tank.", "No source water is on record here, so none is advised."],
        [],
        []);

    private static Remedy NoBaseFirst(WaterModel? water) => new(
        "no-base-first",
        "Do not add base to raise pH",
        false,
        [
            "Base hides CO2 as bicarbonate instead of removing it, and the CO2 goes on coming.",
            water?.Water.TanMgL is { } tan ? Invariant($"With {tan.Value:0.0#} mg/L of total ammonia a fast rise of pH is what kills: un-ionised ammonia grows tenfold a pH unit.") : "Total ammonia is not known: a fast rise of pH could turn it toxic.",
        ],
        [PlanWords.WhoDecides],
        []);

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
