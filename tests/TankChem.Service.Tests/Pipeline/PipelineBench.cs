using Microsoft.Extensions.Logging.Abstractions;
using Prometheus;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;
using TankChem.Service.Pipeline;

namespace TankChem.Service.Tests.Pipeline;

/// <summary>The real engine and writer over a journal that fails when it is told to.</summary>
internal sealed class PipelineBench : IJournal, IRecovery, IAnnouncer, IDisposable
{
    public static readonly PlaceKey Tank = new("north-quay", "tank-1");
    private readonly Lock gate = new();
    private readonly List<JournalBatch> committed = [];
    private readonly IntakeBuffer intake = new(1_000);
    private readonly FarmPipeline pipeline;

    public PipelineBench(params SiteDefinition[] sites)
    {
        Farm = new Farm(TimeProvider.System, isDemo: false);
        var engine = new FarmEngine(sites, this, Farm, this, NullLogger.Instance);
        pipeline = new FarmPipeline(engine, this, intake, Farm, TimeProvider.System, new PipelineMetrics(Metrics.WithCustomRegistry(Metrics.NewCustomRegistry())), NullLogger.Instance);
        pipeline.Start();
    }

    public Farm Farm { get; }

    public FarmPipeline Pipeline => pipeline;

    /// <summary>What the store says to a batch; null lets it in.</summary>
    public Func<JournalBatch, Exception?> Refuse { get; set; } = _ => null;

    public IReadOnlyList<Reading> Stored
    {
        get
        {
            lock (gate)
                return [.. committed.SelectMany(b => b.Readings)];
        }
    }

    public IReadOnlyList<UnreadablePayload> Unreadable
    {
        get
        {
            lock (gate)
                return [.. committed.SelectMany(b => b.Unreadable)];
        }
    }

    public Task<Task> OfferAsync(double ph, DateTimeOffset? at = null) => intake.OfferAsync(
        new Arrival { ReceivedAt = TimeProvider.System.GetUtcNow(), Origin = ReadingOrigin.Live, Readings = [new ParsedReading(new SeriesKey(Tank, "ph", "main"), ph, null, at)] }, CancellationToken.None).AsTask();

    public void Commit(JournalBatch batch)
    {
        if (Refuse(batch) is { } refusal)
            throw refusal;
        lock (gate)
            committed.Add(batch);
    }

    public IReadOnlyList<KeyValuePair<AlarmKey, AlarmState>> LoadAlarmStates() => [];

    public IReadOnlyList<Reading> LoadLatestReadings() => [];

    public IReadOnlyList<PlaceDefinition> LoadPlaces() => [];

    public IReadOnlyList<Reading> LoadUnconfirmed(SeriesKey series, DateTimeOffset from, int limit) => [];

    public void Announce(WaterState water)
    {
        lock (gate)
            Announced.Add(water.Place);
    }

    public void Announce(AlarmView alarm)
    {
    }

    public List<PlaceKey> Announced { get; } = [];

    public void Dispose()
    {
        pipeline.Dispose();
        intake.Dispose();
    }
}
