using System.Globalization;

namespace TankChem.Dosing;

/// <summary>How far to strip CO2. At fixed alkalinity and TAN the product of CO2 and un-ionised ammonia hardly changes, so every step away from one limit is a step towards the other.</summary>
/// <param name="StopMgL">The CO2 at which to stop, mg/L; that of now when there is nothing to do.</param>
/// <param name="IsAllowed">False where any more air makes a broken ammonia limit worse and CO2 is not in danger.</param>
/// <param name="IsRescue">Whether it leads out of danger, so that the rate of pH may be exceeded.</param>
/// <param name="Reasons">Why there.</param>
internal sealed record AirGoal(double StopMgL, bool IsAllowed, bool IsRescue, IReadOnlyList<string> Reasons)
{
    /// <summary>Under a limit by this much is back inside.</summary>
    private const double Inside = 0.8;
    private const double JustInside = 0.9;
    private const int Halvings = 40;

    /// <summary>The goal for a water.</summary>
    public static AirGoal Of(WaterModel water)
    {
        double now = water.Nominal.Co2MgL, air = Math.Min(now, water.Nominal.AirCo2MgL);
        double? limit = Lowest(water, "co2", lethalOnly: false), danger = Lowest(water, "co2", lethalOnly: true);
        bool rescue = danger is { } d && now > d;
        double wanted = Math.Clamp(limit * Inside ?? now / 2, air, now);
        if (water.Water.TanMgL is null)
            return WithoutAmmonia(water, now, wanted, limit, rescue);
        return Lowest(water, "nh3-n", lethalOnly: false) is not { } edge
            ? new AirGoal(wanted, true, rescue, [])
            : WithAmmonia(water, now, wanted, limit, danger, edge);
    }

    private static AirGoal WithoutAmmonia(WaterModel water, double now, double wanted, double? limit, bool rescue)
    {
        if (!water.Water.AmmoniaMatters)
            return new AirGoal(wanted, true, rescue, []);
        double stop = Math.Min(now, limit ?? now);
        return new AirGoal(stop, true, rescue, [Invariant($"Total ammonia is not known, so how far air may go is not known either: test TAN first. Until then go only to {stop:0.0} mg/L of CO2, where it is back at its limit.")]);
    }

    private static AirGoal WithAmmonia(WaterModel water, double now, double wanted, double? limit, double? danger, double edge)
    {
        double ammonia = water.Nominal.Now.Nh3NMgL;
        bool rescue = danger is { } d && now > d;
        double stop = ammonia >= edge ? now : Math.Min(now, Crossing(water, edge));
        if (stop <= wanted && ammonia < edge)
            return new AirGoal(wanted, true, rescue, [Invariant($"At {wanted:0.0} mg/L of CO2 un-ionised ammonia is {At(water, wanted):0.0000} mg/L as N, below its limit {edge}; that limit is reached at {stop:0.0} mg/L of CO2, so do not go further than needed.")]);

        // CO2 that kills outranks ammonia that only harms: out of the danger, no further.
        if (rescue && stop > danger!.Value * JustInside && Lowest(water, "nh3-n", lethalOnly: true) is var lethal && !(At(water, danger.Value * JustInside) >= lethal))
        {
            double out1 = danger.Value * JustInside;
            return new AirGoal(out1, true, true, [Invariant($"CO2 is beyond its danger limit {danger} mg/L; at {out1:0.0} mg/L un-ionised ammonia is {At(water, out1):0.0000} mg/L as N, over its limit {edge} but inside its danger limit. Out of the danger first, and no further; then less feed, and exchange with tested water, to bring ammonia down.")]);
        }

        if (ammonia >= edge)
            return new AirGoal(now, false, false, [Invariant($"Un-ionised ammonia is {ammonia:0.0000} mg/L as N, over its limit {edge} already: every bit of stripping raises it further. Oxygen, no feed, and water that has been tested are what helps; air only for the oxygen the animals need.")]);
        string rest = limit is { } l && stop > l ? " CO2 stays over its limit there: air alone cannot bring both back. Stop feeding, and bring total ammonia down with water that has been tested." : "";
        return new AirGoal(stop, true, rescue, [Invariant($"Stop at {stop:0.0} mg/L of CO2: below that un-ionised ammonia passes its limit {edge} mg/L as N, because each halving of CO2 about doubles it.{rest}")]);
    }

    /// <summary>The CO2, mg/L, at which un-ionised ammonia reaches an edge.</summary>
    private static double Crossing(WaterModel water, double edge)
    {
        double low = Math.Log(1e-3), high = Math.Log(water.Nominal.Co2MgL);
        for (int i = 0; i < Halvings; i++)
        {
            double middle = 0.5 * (low + high);
            Predicted there = water.Nominal.AtCo2(Math.Exp(middle));
            if (!there.IsSolved || there.Nh3NMgL > edge)
                low = middle;
            else
                high = middle;
        }

        return Math.Exp(high);
    }

    private static double At(WaterModel water, double co2MgL) => water.Nominal.AtCo2(co2MgL) is { IsSolved: true } there ? there.Nh3NMgL : double.NaN;

    private static double? Lowest(WaterModel water, string quantity, bool lethalOnly) =>
        water.Water.Limits.Where(l => l.Quantity == quantity && l.IsUpper && (l.Lethal || !lethalOnly)).Select(l => (double?)l.Value).Min();

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
