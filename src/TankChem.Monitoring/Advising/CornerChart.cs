using TankChem.Dosing;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Advising;

/// <summary>The picture of the room left between two dangers: dissolved CO2 across, un-ionised ammonia up, both logarithmic; the limits are edges that meet in a corner.</summary>
/// <remarks>At a given alkalinity and TAN, degassing and gassing move the water along a line of slope −1: who escapes one edge approaches the other.</remarks>
public sealed record CornerChart
{
    /// <summary>Where the water is now; null when CO2 or ammonia is not known.</summary>
    public required CornerPoint? Now { get; init; }

    /// <summary>Where it was in the last day, oldest first.</summary>
    public required IReadOnlyList<CornerPoint> Trail { get; init; }

    /// <summary>Limits on CO2, mg/L.</summary>
    public required IReadOnlyList<PlaceLimit> Co2Edges { get; init; }

    /// <summary>Limits on un-ionised ammonia, mg/L as N.</summary>
    public required IReadOnlyList<PlaceLimit> AmmoniaEdges { get; init; }

    /// <summary>Remedies with a path.</summary>
    public required IReadOnlyList<Remedy> Remedies { get; init; }

    /// <summary>Lowest and highest CO2 of the picture, mg/L.</summary>
    public required (double Low, double High) Co2Range { get; init; }

    /// <summary>Lowest and highest un-ionised ammonia of the picture, mg/L as N.</summary>
    public required (double Low, double High) AmmoniaRange { get; init; }

    /// <summary>Where ammonia is not known: one strip per limit instead of the plane.</summary>
    public required IReadOnlyList<RoomStrip> Strips { get; init; }

    /// <summary>Makes the picture of a place.</summary>
    /// <param name="place">The place now.</param>
    /// <param name="history">Kept values of the last day, any order.</param>
    /// <param name="remedies">What can be done.</param>
    public static CornerChart Of(PlaceSnapshot place, IReadOnlyList<StateValue> history, IReadOnlyList<Remedy> remedies)
    {
        ArgumentNullException.ThrowIfNull(place);
        ArgumentNullException.ThrowIfNull(history);
        WaterValue? co2 = Known(place, "co2"), nh3 = Known(place, "nh3-n");
        CornerPoint? now = co2 is not null && nh3 is not null ? new CornerPoint(co2.Time, co2.Value, co2.U ?? 0, nh3.Value, nh3.U ?? 0) : null;
        CornerPoint[] trail = [.. Trace(history)];
        PlaceLimit[] co2Edges = [.. place.Limits.Where(l => l.Quantity == "co2" && l.IsUpper)];
        PlaceLimit[] ammoniaEdges = [.. place.Limits.Where(l => l.Quantity == "nh3-n" && l.IsUpper)];
        Remedy[] drawn = [.. remedies.Where(Moves)];
        IEnumerable<double> co2Seen = [.. trail.Select(p => p.Co2MgL), .. co2Edges.Select(e => e.Value), .. now is null ? [] : new[] { now.Co2MgL }, .. drawn.SelectMany(r => r.Path).Select(p => p.Co2MgL.Value)];
        IEnumerable<double> ammoniaSeen = [.. trail.Select(p => p.Nh3NMgL), .. ammoniaEdges.Select(e => e.Value), .. now is null ? [] : new[] { now.Nh3NMgL }, .. drawn.SelectMany(r => r.Path).Select(p => p.Nh3NMgL?.Value ?? double.NaN)];
        return new CornerChart
        {
            Now = now,
            Trail = trail,
            Co2Edges = co2Edges,
            AmmoniaEdges = ammoniaEdges,
            Remedies = drawn,
            Co2Range = Range(co2Seen, (1, 40)),
            AmmoniaRange = Range(ammoniaSeen, (0.001, 0.1)),
            Strips = now is null ? [.. place.Limits.Select(l => RoomStrip.Of(place, l, drawn)).OfType<RoomStrip>()] : [],
        };
    }

    /// <summary>A remedy that changes CO2 by less than its uncertainty has no way to draw.</summary>
    private static bool Moves(Remedy remedy) =>
        remedy.Path.Count > 1 && Math.Abs(remedy.Path[^1].Co2MgL.Value - remedy.Path[0].Co2MgL.Value) > remedy.Path[0].Co2MgL.StandardUncertainty;

    private static WaterValue? Known(PlaceSnapshot place, string quantity) =>
        place.Water.Values.TryGetValue(quantity, out WaterValue? value) && !value.Stale && value.Value > 0 ? value : null;

    private static IEnumerable<CornerPoint> Trace(IReadOnlyList<StateValue> history)
    {
        var ammonia = new Dictionary<DateTimeOffset, StateValue>();
        foreach (StateValue value in history)
        {
            if (value.Quantity == "nh3-n" && value.Value > 0)
                ammonia[value.Time] = value;
        }

        return history.Where(v => v.Quantity == "co2" && v.Value > 0 && ammonia.ContainsKey(v.Time)).OrderBy(v => v.Time)
            .Select(v => new CornerPoint(v.Time, v.Value, v.U ?? 0, ammonia[v.Time].Value, ammonia[v.Time].U ?? 0));
    }

    /// <summary>Half a decade of air around everything that is shown.</summary>
    private static (double Low, double High) Range(IEnumerable<double> seen, (double Low, double High) whenEmpty)
    {
        double[] positive = [.. seen.Where(v => v > 0 && double.IsFinite(v))];
        return positive.Length == 0 ? whenEmpty : (positive.Min() / 2, positive.Max() * 2);
    }
}

/// <summary>A water on the corner chart.</summary>
/// <param name="Time">When.</param>
/// <param name="Co2MgL">Dissolved CO2, mg/L.</param>
/// <param name="Co2U">Its standard uncertainty.</param>
/// <param name="Nh3NMgL">Un-ionised ammonia, mg/L as N.</param>
/// <param name="Nh3NU">Its standard uncertainty.</param>
public sealed record CornerPoint(DateTimeOffset Time, double Co2MgL, double Co2U, double Nh3NMgL, double Nh3NU);
