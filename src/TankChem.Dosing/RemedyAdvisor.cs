using System.Globalization;

namespace TankChem.Dosing;

/// <summary>What to do about CO2 that is too high (or about to be), never base first.</summary>
public static class RemedyAdvisor
{
    /// <summary>How fast CO2 leaves under strong aeration, 1/h (common practice, no source: diffused air in tanks 1–4 per hour).</summary>
    private const double StripPerHour = 2;

    /// <summary>Spread of that figure, as a standard deviation of its logarithm.</summary>
    private const double StripLnU = 0.5;

    private static readonly double[] TicksS = [0, 900, 3600, 21600];

    /// <summary>Gas off, more air with the ammonia check and where to stop, and what not to do.</summary>
    /// <param name="problem">The water; its missing inputs are named in the advice instead of refusing it: gas off never waits for a titration.</param>
    /// <param name="hasInjection">Whether CO2 is injected there.</param>
    public static IReadOnlyList<Remedy> ForHighCo2(DoseProblem problem, bool hasInjection)
    {
        ArgumentNullException.ThrowIfNull(problem);
        WaterModel? water = problem.Waters.Count > 0 ? new WaterModel(problem.Waters[0]) : null;
        if (water is { IsPossible: false })
            water = null;
        var remedies = new List<Remedy>();
        if (hasInjection)
            remedies.Add(GasOff());
        remedies.Add(AddAir(problem, water));
        remedies.Add(CutFeed());
        remedies.Add(NoBaseFirst(water));
        return remedies;
    }

    private static Remedy GasOff() => new(
        "gas-off",
        "Close the CO2 valve by hand",
        true,
        ["More CO2 only makes it worse; closing the valve needs no measurement and cannot harm the animals.", "Check that the bubbles stop: a valve can be stuck open while its controller says closed."],
        ["CO2 gathers in low, closed rooms: if you feel short of breath or a gas alarm sounds, leave and ventilate first."],
        []);

    private static Remedy AddAir(DoseProblem problem, WaterModel? water)
    {
        List<string> reasons = ["Air carries CO2 out of the water; alkalinity stays, so pH rises as CO2 leaves."];
        List<string> cautions = ["Where fish are short of oxygen, emergency oxygen comes first.", "Watch pH and the animals; stop when pH rises faster than 0.2 in an hour and they are not in distress."];
        if (water is null)
        {
            string missing = problem.MissingInputs.Count > 0 ? string.Join(" ", problem.MissingInputs.Select(g => g.Text)) : "The water's state is not known.";
            reasons.Add($"How far to go cannot be computed: {missing} Add air all the same when animals gasp, and measure.");
            return new Remedy("add-air", "Add air", true, reasons, cautions, []);
        }

        PredictedWater now = water.Predict(c => c.Now)!;
        double stopAt = StopAt(water, now, reasons);
        if (water.Water.TanMgL is null && water.Water.AmmoniaMatters)
            cautions.Add("Total ammonia is not known: test TAN before stripping hard; until then add air only until CO2 is back at its limit.");
        List<RemedyPoint> path = Path(water, stopAt);
        return new Remedy("add-air", Invariant($"Add air until CO2 is {stopAt:0.0} mg/L, then hold"), true, reasons, cautions, path);
    }

    /// <summary>The CO2, mg/L, at which to stop: its warning limit, or where ammonia reaches its own if that comes first.</summary>
    private static double StopAt(WaterModel water, PredictedWater now, List<string> reasons)
    {
        IReadOnlyList<DoseLimit> limits = water.Water.Limits;
        double air = water.Predict(c => c.Towards(1))!.Co2MgL.Value;
        double wanted = limits.Where(l => l.Quantity == "co2" && l.IsUpper).Select(l => l.Value).DefaultIfEmpty(now.Co2MgL.Value / 2).Min() * 0.8;
        double stop = Math.Max(Math.Min(wanted, now.Co2MgL.Value), air);
        double? ammonia = limits.Where(l => l.Quantity == "nh3-n" && l.IsUpper).Select(l => (double?)l.Value).Min();
        if (ammonia is not { } edge || now.Nh3NMgL is not { } nh3)
            return stop;
        if (nh3.Value >= edge)
        {
            reasons.Add(Invariant($"Un-ionised ammonia is {nh3.Value:0.0000} mg/L, over its limit {edge} already: every step of stripping raises it further. Strip only what the animals need to live, cut feed, and exchange water that has been tested."));
            return now.Co2MgL.Value;
        }

        // At fixed alkalinity and TAN the product of CO2 and NH3 hardly changes; the exact crossing is found on the model.
        double low = air, high = now.Co2MgL.Value;
        for (int i = 0; i < 30; i++)
        {
            double middle = Math.Sqrt(low * high);
            if (water.Predict(c => c.AtCo2(middle))?.Nh3NMgL?.Value > edge)
                low = middle;
            else
                high = middle;
        }

        if (high <= stop)
        {
            reasons.Add(Invariant($"At {stop:0.0} mg/L of CO2 un-ionised ammonia is {water.Predict(c => c.AtCo2(stop))!.Nh3NMgL!.Value.Value:0.0000} mg/L, below its limit {edge}."));
            return stop;
        }

        reasons.Add(Invariant($"Stop at {high:0.0} mg/L of CO2: below that un-ionised ammonia passes its limit {edge} mg/L, because each halving of CO2 about doubles it."));
        return high;
    }

    private static List<RemedyPoint> Path(WaterModel water, double stopAt)
    {
        PredictedWater now = water.Predict(c => c.Now)!;
        var path = new List<RemedyPoint>(TicksS.Length);
        foreach (double seconds in TicksS)
        {
            double hours = seconds / 3600;
            double left = Math.Exp(-StripPerHour * hours);
            double target = stopAt + (now.Co2MgL.Value - stopAt) * left;
            if (water.Predict(c => c.AtCo2(target)) is not { } then)
                continue;

            // How fast it goes is known to a factor only: that spreads where the water is at a time.
            double bySpeed = (now.Co2MgL.Value - stopAt) * left * StripPerHour * hours * StripLnU;
            double co2U = Math.Sqrt(Math.Pow(then.Co2MgL.StandardUncertainty, 2) + bySpeed * bySpeed);
            double relative = then.Co2MgL.Value > 0 ? bySpeed / then.Co2MgL.Value : 0;
            Estimate? nh3 = then.Nh3NMgL is { } n ? new Estimate(n.Value, Math.Sqrt(Math.Pow(n.StandardUncertainty, 2) + Math.Pow(n.Value * relative, 2))) : null;
            path.Add(new RemedyPoint(seconds, new Estimate(then.Co2MgL.Value, co2U), nh3, then.PH));
        }

        return path;
    }

    private static Remedy CutFeed() => new(
        "cut-feed",
        "Stop feeding until CO2 is back",
        true,
        ["Fed animals breathe out more CO2 and excrete more ammonia for hours."],
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
        ["Water exchange helps only with a source water whose pH, temperature, oxygen and CO2 have just been tested; none is on record here."],
        []);

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
