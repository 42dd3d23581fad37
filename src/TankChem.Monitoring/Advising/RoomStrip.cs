using TankChem.Dosing;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Advising;

/// <summary>The room left to one limit.</summary>
/// <param name="Limit">The limit.</param>
/// <param name="Value">The value now, canonical unit.</param>
/// <param name="U">Its standard uncertainty; null where none exists.</param>
/// <param name="Room">How far it is from the limit, positive inside, canonical unit.</param>
/// <param name="Name">The quantity's name.</param>
/// <param name="Unit">Its unit.</param>
public sealed record RoomStrip(PlaceLimit Limit, double Value, double? U, double Room, string Name, string Unit)
{
    /// <summary>The room after each remedy that leads somewhere; empty where none changes this quantity.</summary>
    public IReadOnlyList<RoomAfter> After { get; init; } = [];

    /// <summary>The strip of a limit; null when its value is not known now.</summary>
    /// <param name="place">The place now.</param>
    /// <param name="limit">The limit.</param>
    /// <param name="remedies">What can be done.</param>
    public static RoomStrip? Of(PlaceSnapshot place, PlaceLimit limit, IReadOnlyList<Remedy> remedies)
    {
        ArgumentNullException.ThrowIfNull(place);
        ArgumentNullException.ThrowIfNull(limit);
        ArgumentNullException.ThrowIfNull(remedies);
        if (!place.Water.Values.TryGetValue(limit.Quantity, out WaterValue? value) || value.Stale)
            return null;
        QuantityDefinition definition = QuantityCatalog.Get(limit.Quantity);
        return new RoomStrip(limit, value.Value, value.U, Inside(limit, value.Value), definition.Name, definition.Unit)
        {
            After = [.. remedies.Where(r => r.Path.Count > 1).Select(r => RoomAt(limit, r)).OfType<RoomAfter>()],
        };
    }

    private static RoomAfter? RoomAt(PlaceLimit limit, Remedy remedy)
    {
        RemedyPoint end = remedy.Path[^1];
        Estimate? value = limit.Quantity switch
        {
            "co2" => end.Co2MgL,
            "nh3-n" => end.Nh3NMgL,
            "ph" => end.PH,
            _ => null,
        };
        return value is { } known ? new RoomAfter(remedy.Id, remedy.Title, end.AfterS, known, Inside(limit, known.Value)) : null;
    }

    private static double Inside(PlaceLimit limit, double value) => limit.IsUpper ? limit.Value - value : value - limit.Value;
}

/// <summary>The room to a limit after a remedy.</summary>
/// <param name="RemedyId">The remedy's id.</param>
/// <param name="Title">What is done.</param>
/// <param name="AfterS">Seconds from now.</param>
/// <param name="Value">The value then, canonical unit.</param>
/// <param name="Room">How far it is from the limit then, positive inside, canonical unit.</param>
public sealed record RoomAfter(string RemedyId, string Title, double AfterS, Estimate Value, double Room);
