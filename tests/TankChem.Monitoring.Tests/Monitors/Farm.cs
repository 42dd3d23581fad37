using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Tests.Monitors;

/// <summary>Valid places and readings; each test changes one thing.</summary>
internal static class Farm
{
    public const string SiteId = "hollow-weir";

    public static readonly DateTimeOffset Start = new(2026, 5, 1, 10, 0, 0, TimeSpan.Zero);

    public static PlaceKey TankKey { get; } = new(SiteId, "tank-1");

    public static PlaceKey LoopKey { get; } = new(SiteId, "loop-a");

    public static PlaceKey SiteKey { get; } = new(SiteId, PlaceKey.WholeSite);

    public static PlaceDefinition Tank(params string[] stock) => new() { Key = TankKey, Kind = PlaceKind.Tank, Name = "Grow-out 1", Salinity = 0, Stock = stock };

    public static PlaceDefinition Loop { get; } = new() { Key = LoopKey, Kind = PlaceKind.Loop, Name = "Grow-out loop", Salinity = 0.2 };

    public static PlaceDefinition WholeSite { get; } = new() { Key = SiteKey, Kind = PlaceKind.Site, Name = "Hollow Weir" };

    public static SiteDefinition Site(params PlaceDefinition[] places) => new() { Id = SiteId, Name = "Hollow Weir", AirCo2Ppm = 430, ElevationM = 120, Places = places };

    public static Reading Read(string quantity, double value, DateTimeOffset at, PlaceKey? place = null, string probe = SeriesKey.MainProbe, ReadingOrigin origin = ReadingOrigin.Live) => new()
    {
        Series = new SeriesKey(place ?? TankKey, quantity, probe),
        Time = at,
        ReceivedAt = at,
        RawValue = value,
        Value = value,
        Flag = QualityFlag.Pass,
        Origin = origin,
    };

    public static Reading Unconfirmed(string quantity, double raw, DateTimeOffset at) => Read(quantity, raw, at) with
    {
        Value = null,
        Flag = QualityFlag.NotEvaluated,
        Reason = "unit not confirmed",
    };

    public static Reading Device(string device, bool on, DateTimeOffset at, PlaceKey? place = null) => Read(SeriesKey.DeviceState, on ? 1 : 0, at, place, device);
}
