using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;
using TankChem.TestKit;

namespace TankChem.Storage.Tests;

/// <summary>A real store in a folder of its own.</summary>
public sealed class StoreFixture : IDisposable
{
    public static readonly DateTimeOffset Noon = new(2026, 5, 1, 12, 0, 0, TimeSpan.Zero);
    public static readonly PlaceKey Tank = new("north-quay", "tank-1");

    private readonly TemporaryFolder folder = new();

    public StoreFixture() => Store = SqliteStore.Open(Path);

    public SqliteStore Store { get; private set; }

    public string Path => folder.File("tankchem.db");

    public void Reopen()
    {
        Store.Dispose();
        Store = SqliteStore.Open(Path);
    }

    public static Reading Reading(DateTimeOffset time, double value, string quantity = "ph", string probe = "main", QualityFlag flag = QualityFlag.Pass) => new()
    {
        Series = new SeriesKey(Tank, quantity, probe),
        Time = time,
        ReceivedAt = time,
        RawValue = value,
        Value = flag == QualityFlag.NotEvaluated ? null : value,
        Flag = flag,
        Reason = flag == QualityFlag.Pass ? null : "because",
        Origin = ReadingOrigin.Live,
    };

    public static WaterState State(DateTimeOffset time, double co2, bool stale = false) => new()
    {
        Place = Tank,
        Kind = PlaceKind.Tank,
        Assigned = true,
        Time = time,
        Status = WaterStatus.Ok,
        Reason = null,
        Values = new Dictionary<string, WaterValue>(StringComparer.Ordinal) { ["co2"] = new() { Value = co2, Unit = "mg/L", U = 1, Time = time, Stale = stale } },
    };

    public void Dispose()
    {
        Store.Dispose();
        folder.Dispose();
    }
}
