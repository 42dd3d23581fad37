using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Water;

namespace TankChem.Mqtt.Tests.Doubles;

/// <summary>A farm of places that stand still.</summary>
public sealed class FakeFarm : IFarm
{
    public bool IsDemo => false;

    public IReadOnlyList<PlaceSnapshot> Places { get; init; } = [];

    public long Version => 1;

    public IReadOnlyList<string> ServiceTroubles => [];

    public long UnreadableCount => 0;

    public DateTimeOffset Now => TimeProvider.System.GetUtcNow();

    public PlaceSnapshot? Find(PlaceKey key) => Places.FirstOrDefault(p => p.Definition.Key == key);

    /// <summary>A tank with nothing known of it yet.</summary>
    public static PlaceSnapshot Tank(string id, bool co2Injection)
    {
        var definition = new PlaceDefinition { Key = new PlaceKey("hollow-weir", id), Kind = PlaceKind.Tank, Name = id, Co2Injection = co2Injection };
        return new PlaceSnapshot
        {
            Definition = definition,
            Site = new SiteDefinition { Id = "hollow-weir", Name = "Hollow Weir", Places = [definition] },
            Water = Water(id, WaterStatus.None),
            Alarms = [],
            Limits = [],
            Latest = [],
            Sentence = "",
            Urgency = PlaceUrgency.Unknown,
        };
    }

    /// <summary>A water state without values.</summary>
    public static WaterState Water(string id, WaterStatus status) =>
        new() { Place = new PlaceKey("hollow-weir", id), Kind = PlaceKind.Tank, Assigned = true, Time = null, Status = status, Reason = null, Values = new Dictionary<string, WaterValue>(StringComparer.Ordinal) };
}
