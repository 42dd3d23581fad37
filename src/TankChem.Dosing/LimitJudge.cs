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

    /// <summary>The first limit that a prediction breaks, or null.</summary>
    /// <param name="limits">The limits.</param>
    /// <param name="before">What the water would be without the dose.</param>
    /// <param name="after">What it is predicted to be.</param>
    /// <param name="when">When, in words.</param>
    public static DoseGround? Broken(IReadOnlyList<DoseLimit> limits, PredictedWater before, PredictedWater after, string when)
    {
        foreach (DoseLimit limit in limits)
        {
            if (Value(after, limit.Quantity) is not { } predicted || Value(before, limit.Quantity) is not { } now)
                continue;
            double asked = limit.Lethal ? HoldLethal : Hold;
            double holds = Probability(limit, predicted);
            if (holds >= asked)
                continue;
            bool heldBefore = Probability(limit, now) >= asked;
            bool worse = limit.IsUpper ? predicted.Value > now.Value * (1 + SameRelative) : predicted.Value < now.Value * (1 - SameRelative);
            if (!heldBefore && !worse)
                continue;
            string how = heldBefore ? "would be broken" : "is broken or not sure already and would be made worse";
            return new DoseGround("limit", limit.Quantity, string.Create(CultureInfo.InvariantCulture, $"{after.Place}, {when}: {Name(limit.Quantity)} {Text(predicted, limit.Quantity)}; {limit.Text} {how} (probability {1 - holds:P1})."), 1 - holds);
        }

        return null;
    }

    /// <summary>Probability that a limit holds: normal for pH and alkalinity, log-normal for amounts that cannot be negative and spread by factors.</summary>
    public static double Probability(DoseLimit limit, Estimate value)
    {
        double distance;
        if (limit.Quantity is "nh3-n" or "co2" && value.Value > 0 && limit.Value > 0)
        {
            double relative = value.StandardUncertainty / value.Value;
            double sigma = Math.Sqrt(Math.Log(1 + relative * relative));
            distance = Divide(Math.Log(limit.Value / value.Value), sigma);
        }
        else
        {
            distance = Divide(limit.Value - value.Value, value.StandardUncertainty);
        }

        return NormalLaw.Below(limit.IsUpper ? distance : -distance);
    }

    /// <summary>A value by the name of its quantity; null where it is not predicted.</summary>
    public static Estimate? Value(PredictedWater water, string quantity) => quantity switch
    {
        "ph" => water.PH,
        "co2" => water.Co2MgL,
        "nh3-n" => water.Nh3NMgL,
        "alkalinity" => water.AlkalinityMmolL,
        _ => null,
    };

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
}
