using Prometheus;

namespace TankChem.Service.Pipeline;

/// <summary>What /metrics tells of the pipeline.</summary>
internal sealed class PipelineMetrics
{
    private readonly Counter taken;
    private readonly Counter rejected;
    private readonly Histogram commit;
    private readonly Gauge queue;
    private readonly Counter delayed;
    private long takenSeen;
    private long delayedSeen;

    public PipelineMetrics(IMetricFactory metrics)
    {
        taken = metrics.CreateCounter("tankchem_readings_taken_total", "Readings taken in and on disk.");
        rejected = metrics.CreateCounter("tankchem_readings_rejected_total", "Messages that could not be read; kept with their reason.");
        commit = metrics.CreateHistogram("tankchem_commit_seconds", "Time of a commit to disk.", new HistogramConfiguration { Buckets = Histogram.ExponentialBuckets(0.0005, 2, 14) });
        queue = metrics.CreateGauge("tankchem_intake_queue_length", "Messages waiting for the writer.");
        delayed = metrics.CreateCounter("tankchem_intake_delayed_total", "Messages that had to wait for room in the intake buffer.");
    }

    /// <summary>One commit took this long.</summary>
    public void ObserveCommit(TimeSpan elapsed) => commit.Observe(elapsed.TotalSeconds);

    /// <summary>Messages that could not be read.</summary>
    public void CountRejected(int count) => rejected.Inc(count);

    /// <summary>Takes the engine's and the buffer's counts.</summary>
    public void Update(FarmEngine engine, IntakeBuffer intake)
    {
        taken.Inc(engine.ReadingsTaken - takenSeen);
        takenSeen = engine.ReadingsTaken;
        long waited = intake.Delayed;
        delayed.Inc(waited - delayedSeen);
        delayedSeen = waited;
        queue.Set(intake.Length);
    }
}
