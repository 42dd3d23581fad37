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
    /// <summary>The strip of a limit; null when its value is not known now.</summary>
    public static RoomStrip? Of(PlaceSnapshot place, PlaceLimit limit)
    {
        ArgumentNullException.ThrowIfNull(place);
        ArgumentNullException.ThrowIfNull(limit);
        if (!place.Water.Values.TryGetValue(limit.Quantity, out WaterValue? value) || value.Stale)
            return null;
        QuantityDefinition definition = QuantityCatalog.Get(limit.Quantity);
        return new RoomStrip(limit, value.Value, value.U, limit.IsUpper ? limit.Value - value.Value : value.Value - limit.Value, definition.Name, definition.Unit);
    }
}
