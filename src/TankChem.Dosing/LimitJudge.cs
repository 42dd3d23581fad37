using System.Globalization;

namespace TankChem.Dosing;

/// <summary>Whether a predicted water holds the limits, at the probability each asks.</summary>
internal static class LimitJudge
{
    /// <summary>Probability with which a limit holds.</summary>
    public const double Hold = 0.95;

    /// <summary>Probability with which a lethal limit holds.</summary>
    public const double HoldLethal = 0.999;

    /// <summary>Far below what any probe sees; keeps rounding from calling "worse" what is the same.</summary>
    private const double SameRelative = 1e-9;

    /// <summary>The carbon of a bicarbonate portion lifts CO2 by some tenths of a per cent until gas has been exchanged; a limit that is not broken but only not sure is not refused for that.</summary>
    private const double Co2RippleRelative = 0.01;

    /// <summary>The grounds on which a prediction is refused, one for each limit it breaks.</summary>
    /// <param name="limits">The limits.</param>
    /// <param name="before">What the water would be without the dose.</param>
    /// <param name="after">What it is predicted to be.</param>
    /// <param name="when">When, in words.</param>
    /// <param name="passing">Whether gas has yet to be exchanged, so that the prediction is not where the water stays.</param>
    public static IEnumerable<DoseGround> Broken(IReadOnlyList<DoseLimit> limits, PredictedWater before, PredictedWater after, string when, bool passing)
    {
        foreach (DoseLimit limit in limits)
        {
            if (Value(after, limit.Quantity) is not { } predicted || Value(before, limit.Quantity) is not { } now)
                continue;
            double asked = Asked(limit);
            double holds = Probability(limit, predicted);
            if (holds >= asked)
                continue;
            bool heldBefore = Probability(limit, now) >= asked;
            if (!heldBefore && !IsWorse(limit, now.Value, predicted.Value, passing))
                continue;
            string how = heldBefore ? "would not be sure to hold" : "does not hold for sure today and would be made worse";
            yield return new DoseGround("limit", limit.Quantity, string.Create(CultureInfo.InvariantCulture, $"{after.Place}, {when}: {Name(limit.Quantity)} {Text(predicted, limit.Quantity)}; {PlanWords.InSentence(limit.Text)} {how} (probability of breaking it {Percent(1 - holds)}, at most {Percent(1 - asked)} is taken)."), 1 - holds);
        }
    }

    /// <summary>The probability a limit asks.</summary>
    public static double Asked(DoseLimit limit) => limit.Lethal ? HoldLethal : Hold;

    /// <summary>Probability that a limit holds: normal for pH and alkalinity, log-normal for amounts that cannot be negative and spread by factors.</summary>
    public static double Probability(DoseLimit limit, Estimate value)
    {
        double distance = limit.Quantity is "nh3-n" or "co2" && value.Value > 0 && limit.Value > 0
            ? Divide(Math.Log(limit.Value / value.Value), LogNormal.Sigma(value))
            : Divide(limit.Value - value.Value, value.StandardUncertainty);
        return NormalLaw.Below(limit.IsUpper ? distance : -distance);
    }

    /// <summary>Whether a value is beyond a limit, whatever its uncertainty.</summary>
    public static bool IsBeyond(DoseLimit limit, double value) => limit.IsUpper ? value > limit.Value : value < limit.Value;

    /// <summary>A value by the name of its quantity; null where it is not predicted.</summary>
    public static Estimate? Value(PredictedWater water, string quantity) => quantity switch
    {
        "ph" => water.PH,
        "co2" => water.Co2MgL,
        "nh3-n" => water.Nh3NMgL,
        "alkalinity" => water.AlkalinityMmolL,
        _ => null,
    };

    private static bool IsWorse(DoseLimit limit, double now, double predicted, bool passing)
    {
        bool ripple = passing && limit.Quantity == "co2" && !IsBeyond(limit, now) && !IsBeyond(limit, predicted);
        double same = Math.Abs(now) * (ripple ? Co2RippleRelative : SameRelative);
        return limit.IsUpper ? predicted > now + same : predicted < now - same;
    }

    private static double Divide(double distance, double sigma) => sigma > 0 ? distance / sigma : distance >= 0 ? 40 : -40;

    private static string Name(string quantity) => quantity switch
    {
        "ph" => "pH",
        "co2" => "CO2",
        "nh3-n" => "un-ionised ammonia",
        _ => quantity,
    };

    private static string Text(Estimate value, string quantity) => quantity switch
    {
        "ph" => value.Value.ToString("0.00", CultureInfo.InvariantCulture),
        "co2" => $"{value.Value.ToString("0.0", CultureInfo.InvariantCulture)} mg/L",
        "nh3-n" => $"{value.Value.ToString("0.0000", CultureInfo.InvariantCulture)} mg/L as N",
        _ => $"{value.Value.ToString("0.00", CultureInfo.InvariantCulture)} mmol/L",
    };

    private static string Percent(double share) => share switch
    {
        < 0.0001 => "below 0.01 %",
        < 0.01 => $"{(share * 100).ToString("0.0#", CultureInfo.InvariantCulture)} %",
        > 0.9999 => "over 99.99 %",
        _ => $"{(share * 100).ToString("0", CultureInfo.InvariantCulture)} %",
    };
}
