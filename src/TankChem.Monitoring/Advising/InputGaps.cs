using System.Globalization;
using TankChem.Dosing;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Advising;

/// <summary>What of a tank's water is missing for a dose plan, and why.</summary>
internal static class InputGaps
{
    private static readonly string[] Always = ["ph", "alkalinity", "temperature"];

    /// <summary>One ground for each input that is missing, old, or of unconfirmed unit.</summary>
    /// <param name="tank">The tank.</param>
    /// <param name="loop">Its loop; null when it is on its own.</param>
    /// <param name="now">Now.</param>
    /// <param name="needsTan">Whether total ammonia is needed here.</param>
    public static IReadOnlyList<DoseGround> Of(PlaceSnapshot tank, PlaceSnapshot? loop, DateTimeOffset now, bool needsTan)
    {
        var gaps = new List<DoseGround>();
        foreach (string quantity in needsTan ? [.. Always, "tan"] : Always)
        {
            if (!tank.Water.Values.TryGetValue(quantity, out WaterValue? value) || value.Stale)
                gaps.Add(new DoseGround("input", quantity, $"{tank.Definition.Name}: {Text(tank, loop, now, quantity, value)}", null));
        }

        return gaps;
    }

    private static string Text(PlaceSnapshot tank, PlaceSnapshot? loop, DateTimeOffset now, string quantity, WaterValue? lastKnown)
    {
        string name = quantity == "tan" ? "total ammonia" : QuantityCatalog.Get(quantity).Name;
        string first = quantity == "tan" ? "Raising pH turns ammonia toxic: test TAN first." : "Measure it first.";
        if (lastKnown is not null)
            return $"{name} is too old, last known {Moment.Words(lastKnown.Time, now)}. {first}";
        Reading? kept = Kept(tank, quantity) ?? (loop is null || quantity == "ph" ? null : Kept(loop, quantity));
        if (kept is null)
            return $"{name} is not known. {first}";
        return kept.Reason == ReadingResolver.UnitNotConfirmed
            ? $"the unit of {name} is not confirmed ({kept.RawValue.ToString(CultureInfo.InvariantCulture)} of what?). Confirm it first."
            : $"{name} was read but is not usable ({kept.Reason ?? "of doubtful quality"}). {first}";
    }

    private static Reading? Kept(PlaceSnapshot place, string quantity) =>
        place.Latest.Where(r => r.Series.Quantity == quantity && !r.IsUsable).MaxBy(r => r.Time);
}
