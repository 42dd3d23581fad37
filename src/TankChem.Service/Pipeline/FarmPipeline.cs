using System.Collections.Concurrent;
using System.Diagnostics;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Service.Pipeline;

/// <summary>The one writer: takes what came in, lets the monitors step, commits, and only then lets the senders know.</summary>
/// <remarks>Group commit without a timer: a commit takes what queued while the last one ran.</remarks>
internal sealed class FarmPipeline : IDisposable
{
    private static readonly TimeSpan TickEvery = TimeSpan.FromSeconds(1);
    private static readonly TimeSpan RetryAfter = TimeSpan.FromSeconds(1);

    private readonly FarmEngine engine;
    private readonly IJournal journal;
    private readonly IntakeBuffer intake;
    private readonly Farm farm;
    private readonly TimeProvider clock;
    private readonly PipelineMetrics metrics;
    private readonly ILogger logger;
    private readonly ConcurrentQueue<WriterTask> tasks = new();
    private readonly CancellationTokenSource stopping = new();
    private Thread? writer;
    private int tickDue;

    public FarmPipeline(FarmEngine engine, IJournal journal, IntakeBuffer intake, Farm farm, TimeProvider clock, PipelineMetrics metrics, ILogger logger)
    {
        this.engine = engine;
        this.journal = journal;
        this.intake = intake;
        this.farm = farm;
        this.clock = clock;
        this.metrics = metrics;
        this.logger = logger;
    }

    /// <summary>Ends when the writer has stopped; faulted when it died of a bug.</summary>
    public TaskCompletionSource Finished { get; } = new(TaskCreationOptions.RunContinuationsAsynchronously);

    /// <summary>Starts the writer's thread.</summary>
    public void Start()
    {
        writer = new Thread(Run) { IsBackground = true, Name = "journal writer" };
        writer.Start();
    }

    /// <summary>Runs an action on the writer's thread; the result comes when what it added to the batch is on disk.</summary>
    public Task<T> RunAsync<T>(Func<FarmEngine, DateTimeOffset, T> action, CancellationToken cancellationToken)
    {
        var result = new TaskCompletionSource<T>(TaskCreationOptions.RunContinuationsAsynchronously);
        T? value = default;
        tasks.Enqueue(new WriterTask(
            (e, now) => value = action(e, now),
            () => result.TrySetResult(value!),
            e => result.TrySetException(e)));
        intake.Wake();
        if (stopping.IsCancellationRequested)
            result.TrySetException(new OperationCanceledException("The service is stopping."));
        return result.Task.WaitAsync(cancellationToken);
    }

    /// <summary>Stops taking, writes what waits, and ends.</summary>
    public void Stop()
    {
        if (writer is null)
            return;
        stopping.Cancel();
        intake.Wake();
        writer.Join();
        writer = null;
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        Stop();
        stopping.Dispose();
    }

    private void Run()
    {
        try
        {
            using ITimer timer = clock.CreateTimer(_ => Tick(), null, TickEvery, TickEvery);
            RunOnce(all: true);
            while (!stopping.IsCancellationRequested)
            {
                intake.Wait();
                RunOnce(Interlocked.Exchange(ref tickDue, 0) == 1);
            }

            RunOnce(all: false);
            intake.Close();
            Finished.TrySetResult();
        }
#pragma warning disable CA1031 // The writer's own thread: what escapes here would end the process without a word; the host stops with it instead.
        catch (Exception e)
#pragma warning restore CA1031
        {
            intake.Close();
            Finished.TrySetException(e);
        }
        finally
        {
            while (tasks.TryDequeue(out WriterTask? left))
                left.Fail(new OperationCanceledException("The service stopped before this was on disk."));
        }
    }

    private void RunOnce(bool all)
    {
        (IReadOnlyList<Arrival> arrivals, TaskCompletionSource committed) = intake.Take();
        DateTimeOffset now = clock.GetUtcNow();
        for (int i = 0; i < arrivals.Count; i++)
            engine.Take(arrivals[i]);

        List<WriterTask>? done = null;
        for (int left = tasks.Count; left > 0 && tasks.TryDequeue(out WriterTask? task); left--)
        {
            if (task.TryRun(engine, now))
                (done ??= []).Add(task);
        }

        engine.Advance(now, all);
        JournalBatch batch = engine.Seal();
        if (!OpenBatch.IsEmpty(batch) && !TryCommit(batch))
        {
            committed.TrySetException(new OperationCanceledException("The service stopped before this was on disk; send again."));
            done?.ForEach(t => t.Fail(new OperationCanceledException("The service stopped before this was on disk.")));
            return;
        }

        engine.Tell(batch);
        metrics.Update(engine, intake);
        metrics.CountRejected(batch.Unreadable.Count);
        committed.TrySetResult();
        done?.ForEach(t => t.Complete());
    }

    /// <summary>Commits a batch, as often as it takes; false when the service stops before the store takes it.</summary>
    private bool TryCommit(JournalBatch batch)
    {
        long start = Stopwatch.GetTimestamp();
        bool told = false;
        bool inParts = false;
        while (true)
        {
            try
            {
                if (inParts)
                    new BatchSplitter(journal, clock, logger).CommitInParts(batch);
                else
                    journal.Commit(batch);
                metrics.ObserveCommit(Stopwatch.GetElapsedTime(start));
                if (told)
                {
                    farm.SetTrouble("store", null);
                    logger.LogWarning("The store takes readings again");
                }

                return true;
            }
            catch (JournalRowException e) when (!inParts)
            {
                logger.LogWarning(e, "A row cannot be stored; the batch is split");
                inParts = true;
            }
            catch (JournalUnavailableException e)
            {
                if (!told)
                    logger.LogError(e, "The store takes nothing; acknowledgements are held and the same batch is tried again");
                told = true;
                farm.SetTrouble("store", $"The store takes nothing now ({e.Message}). Readings are held and not acknowledged until there is room; alarms are not current.");
                if (stopping.Token.WaitHandle.WaitOne(RetryAfter))
                    return false;
            }
        }
    }

    private void Tick()
    {
        Interlocked.Exchange(ref tickDue, 1);
        intake.Wake();
    }
}
