using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Dashboard.Tests.Doubles;

/// <summary>A farm that is what a test says.</summary>
internal sealed class FakeFarm : IFarm
{
    public static readonly DateTimeOffset Noon = new(2026, 5, 1, 12, 0, 0, TimeSpan.Zero);
    public static readonly SiteDefinition Site = new() { Id = "north-quay", Name = "North Quay" };

    public List<PlaceSnapshot> Snapshots { get; } = [];

    public List<string> Troubles { get; } = [];

    public bool IsDemo { get; set; }

    public IReadOnlyList<PlaceSnapshot> Places => [.. Snapshots.OrderByDescending(s => s.Urgency)];

    public long Version { get; set; }

    public IReadOnlyList<string> ServiceTroubles => Troubles;

    public long UnreadableCount => 0;

    public DateTimeOffset Now => Noon;

    public PlaceSnapshot? Find(PlaceKey key) => Snapshots.Find(s => s.Definition.Key == key);

    public void Put(PlaceSnapshot snapshot)
    {
        Snapshots.RemoveAll(s => s.Definition.Key == snapshot.Definition.Key);
        Snapshots.Add(snapshot);
        Version++;
    }

    public static PlaceSnapshot Tank(string id, string name, PlaceUrgency urgency, string sentence, params (string Quantity, WaterValue Value)[] values) => new()
    {
        Definition = new PlaceDefinition { Key = new PlaceKey(Site.Id, id), Kind = PlaceKind.Tank, Name = name, Stock = ["salmonid"], VolumeM3 = 9, Probes = [new ProbeDefinition { Quantity = "alkalinity", Unit = "dKH" }] },
        Site = Site,
        Water = new WaterState
        {
            Place = new PlaceKey(Site.Id, id),
            Kind = PlaceKind.Tank,
            Assigned = true,
            Time = values.Length == 0 ? null : Noon,
            Status = values.Length == 0 ? WaterStatus.None : WaterStatus.Ok,
            Reason = values.Length == 0 ? "no reading yet" : null,
            Values = values.ToDictionary(v => v.Quantity, v => v.Value, StringComparer.Ordinal),
        },
        Alarms = [],
        Limits = [],
        Latest = [],
        Sentence = sentence,
        Urgency = urgency,
    };

    public static WaterValue Value(double value, string unit, double? u, TimeSpan age, bool stale = false) => new() { Value = value, Unit = unit, U = u, Time = Noon - age, Stale = stale };

    public static AlarmView Alarm(PlaceSnapshot place, string rule = "co2-high") => new()
    {
        Key = new AlarmKey(place.Definition.Key, rule),
        PlaceName = place.Definition.Name,
        Title = "CO2 high",
        Quantity = "co2",
        Priority = AlarmPriority.High,
        State = new AlarmState { Phase = AlarmPhase.Unacknowledged, RaisedAt = Noon.AddMinutes(-5) },
        Sentence = "CO2 is high: 24 mg/L, limit 15 mg/L for salmonids",
        FirstAction = "Gas off, more air",
        Consequence = "Animals suffocate",
    };

    public static Reading Bare(PlaceSnapshot place, string quantity, double raw) => new()
    {
        Series = new SeriesKey(place.Definition.Key, quantity, "main"),
        Time = Noon,
        ReceivedAt = Noon,
        RawValue = raw,
        Flag = QualityFlag.NotEvaluated,
        Reason = ReadingResolver.UnitNotConfirmed,
        Origin = ReadingOrigin.Live,
    };
}
