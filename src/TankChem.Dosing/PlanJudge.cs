using System.Globalization;

namespace TankChem.Dosing;

/// <summary>Judges the whole way of a schedule in every tank that the water passes.</summary>
internal sealed class PlanJudge(DoseProblem problem, WaterModel[] waters, Reagent reagent)
{
    /// <summary>The quantity of a ground about how fast pH rises.</summary>
    public const string RateQuantity = "ph-rate";

    private readonly DosePace pace = new(problem, waters, reagent);
    private readonly PredictedWater[] now = [.. waters.Select(w => w.Predict(c => c.Now)!)];
    private readonly Predicted[] nowInAir = [.. waters.Select(w => w.Nominal.Air(reagent, 0))];

    /// <summary>The pace of this reagent in this water.</summary>
    public DosePace Pace => pace;

    /// <summary>The grounds on which a schedule is refused, the worst of each limit and tank; none when it may be done.</summary>
    /// <param name="portions">The schedule.</param>
    /// <param name="untilFirst">Stop at the first ground: enough to know that it is refused.</param>
    public IReadOnlyList<DoseGround> Grounds(IReadOnlyList<Portion> portions, bool untilFirst)
    {
        var worst = new Dictionary<(string, string), DoseGround>();
        double settled = 0;
        for (int i = 0; i < portions.Count; i++)
        {
            for (int tank = 0; tank < waters.Length; tank++)
            {
                foreach (DoseGround ground in OfPortion(tank, settled, portions[i].MmolL, i + 1))
                {
                    (string, string) key = (waters[tank].Water.Name, ground.Quantity);
                    if (!worst.TryGetValue(key, out DoseGround? known) || (ground.Probability ?? 1) > (known.Probability ?? 1))
                        worst[key] = ground;
                }
            }

            if (untilFirst && worst.Count > 0)
                break;
            settled += portions[i].MmolL;
        }

        return [.. worst.Values];
    }

    private IEnumerable<DoseGround> OfPortion(int tank, double settledMmolL, double addedMmolL, int number)
    {
        WaterModel water = waters[tank];
        double before = water.UmolKg(settledMmolL), added = water.UmolKg(addedMmolL);
        PredictedWater? closed = water.Predict(c => c.ClosedFromSettled(reagent, before, added));
        PredictedWater? all = settledMmolL == 0 ? closed : water.Predict(c => c.Closed(reagent, before + added));
        PredictedWater? settled = water.Predict(c => c.Settled(reagent, before + added));
        if (closed is null || all is null || settled is null || pace.HourRise(water, settledMmolL, addedMmolL) is not { } rise)
        {
            yield return new DoseGround("limit", "ph", $"{water.Water.Name}: after portion {number} the water would be outside what can be computed; a smaller rise is needed.", null);
            yield break;
        }

        IReadOnlyList<DoseLimit> limits = water.Water.Limits;
        foreach (DoseGround ground in LimitJudge.Broken(limits, now[tank], closed, $"right after portion {number}", passing: true))
            yield return ground;
        foreach (DoseGround ground in LimitJudge.Broken(limits, now[tank], all, $"after portion {number} if no gas escaped", passing: true))
            yield return ground;
        foreach (DoseGround ground in LimitJudge.Broken(limits, now[tank], settled, $"settled after portion {number}", passing: false))
            yield return ground;
        if (TakesTheLastSafety(tank, before + added, number) is { } lethal)
            yield return lethal;
        if (RateGround(water.Water, rise, number) is { } rate)
            yield return rate;
    }

    private static DoseGround? RateGround(DoseWater water, Estimate rise, int number)
    {
        var limit = new DoseLimit("ph", true, water.PhRisePerHourMax, false, "");
        double holds = LimitJudge.Probability(limit, rise);
        return holds >= LimitJudge.Hold
            ? null
            : new DoseGround("limit", RateQuantity, string.Create(CultureInfo.InvariantCulture, $"{water.Name}: portion {number} would lift pH by {rise.Value:0.00} ± {rise.StandardUncertainty:0.00} within the hour; at most {water.PhRisePerHourMax:0.00} is taken."), 1 - holds);
    }

    /// <summary>Where all CO2 is stripped out, a lethal limit that would hold without the dose must hold with it: a strong wind or an eager hand at the blower must not kill because of the dose.
    /// One that would not hold without it either is not the dose's doing; it is told as a caution.</summary>
    private DoseGround? TakesTheLastSafety(int tank, double addedUmolKg, int number)
    {
        WaterModel water = waters[tank];
        foreach (DoseLimit limit in water.Water.Limits)
        {
            if (!limit.Lethal || limit.Quantity != "nh3-n" || water.Water.TanMgL is null)
                continue;
            double before = nowInAir[tank].Nh3NMgL, after = water.Nominal.Air(reagent, addedUmolKg).Nh3NMgL;
            if (LimitJudge.IsBeyond(limit, before) || !LimitJudge.IsBeyond(limit, after) || water.Predict(c => c.Air(reagent, addedUmolKg))?.Nh3NMgL is not { } inAir)
                continue;
            return new DoseGround("limit", limit.Quantity, string.Create(CultureInfo.InvariantCulture, $"{water.Water.Name}, after portion {number} if all surplus CO2 were stripped out: un-ionised ammonia {after:0.000} mg/L as N, beyond {PlanWords.InSentence(limit.Text)}; without the dose {before:0.000}, inside it."), 1 - LimitJudge.Probability(limit, inAir));
        }

        return null;
    }
}
