using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Service.Pipeline;

/// <summary>The bounded buffer between the brokers and the writer: what came in while the last commit ran is the next commit.</summary>
/// <remarks>Everybody in a batch waits on one completion, so a message costs no allocation of its own here.</remarks>
public sealed class IntakeBuffer : IReadingIntake, IDisposable
{
    private readonly Lock gate = new();
    private readonly AutoResetEvent filled = new(false);
    private readonly int capacity;
    private List<Arrival> open = [];
    private TaskCompletionSource committed = NewCompletion();
    private TaskCompletionSource room = NewCompletion();
    private long delayed;
    private bool closed;

    /// <summary>A buffer that holds at most <paramref name="capacity"/> messages before it lets senders wait.</summary>
    public IntakeBuffer(int capacity)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(capacity);
        this.capacity = capacity;
        room.SetResult();
    }

    /// <summary>Messages waiting.</summary>
    public int Length
    {
        get
        {
            lock (gate)
                return open.Count;
        }
    }

    /// <summary>Messages that had to wait for room.</summary>
    public long Delayed => Interlocked.Read(ref delayed);

    /// <summary>Waits until there is something to take, or somebody calls <see cref="Wake"/>.</summary>
    public void Wait() => filled.WaitOne();

    /// <summary>Wakes the writer for something else than a message: a tick, a person's request, the stop.</summary>
    public void Wake() => filled.Set();

    /// <inheritdoc/>
    public async ValueTask<Task> OfferAsync(Arrival arrival, CancellationToken cancellationToken)
    {
        ArgumentNullException.ThrowIfNull(arrival);
        while (true)
        {
            Task waitForRoom;
            lock (gate)
            {
                if (closed)
                    return Task.FromException(new OperationCanceledException("The service is stopping; send again."));
                if (open.Count < capacity)
                {
                    open.Add(arrival);
                    if (open.Count == 1)
                        filled.Set();
                    return committed.Task;
                }

                if (room.Task.IsCompleted)
                    room = NewCompletion();
                waitForRoom = room.Task;
            }

            Interlocked.Increment(ref delayed);
            await waitForRoom.WaitAsync(cancellationToken);
        }
    }

    /// <summary>Takes everything that waits; the caller completes the returned source when it is on disk.</summary>
    public (IReadOnlyList<Arrival> Arrivals, TaskCompletionSource Committed) Take()
    {
        lock (gate)
        {
            var taken = (open, committed);
            open = new List<Arrival>(Math.Min(open.Count + 16, capacity));
            committed = NewCompletion();
            room.TrySetResult();
            return taken;
        }
    }

    /// <summary>Takes nothing more; what waits fails, so that its senders send again.</summary>
    public void Close()
    {
        lock (gate)
        {
            closed = true;
            committed.TrySetException(new OperationCanceledException("The service stopped before this was on disk; send again."));
            room.TrySetResult();
        }
    }

    /// <inheritdoc/>
    public void Dispose() => filled.Dispose();

    private static TaskCompletionSource NewCompletion()
    {
        var source = new TaskCompletionSource(TaskCreationOptions.RunContinuationsAsynchronously);
        // A batch that nobody awaits (QoS 0) must not raise an unobserved exception when the service stops.
        _ = source.Task.ContinueWith(static t => _ = t.Exception, CancellationToken.None, TaskContinuationOptions.OnlyOnFaulted, TaskScheduler.Default);
        return source;
    }
}
