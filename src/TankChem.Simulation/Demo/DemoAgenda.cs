namespace TankChem.Simulation.Demo;

/// <summary>What is going to happen, in order of time; at one time in the order it was put down.</summary>
internal sealed class DemoAgenda
{
    private readonly PriorityQueue<Func<IEnumerable<SimulatedEvent>>, (DateTimeOffset At, long Order)> _queue = new();
    private long _order;

    /// <summary>When the next thing happens; null when nothing more is planned.</summary>
    public DateTimeOffset? Next => _queue.TryPeek(out _, out (DateTimeOffset At, long Order) key) ? key.At : null;

    /// <summary>Puts something down.</summary>
    public void Plan(DateTimeOffset at, Func<IEnumerable<SimulatedEvent>> happens) => _queue.Enqueue(happens, (at, _order++));

    /// <summary>Puts something down that only tells.</summary>
    public void Tell(SimulatedEvent told) => Plan(told.At, () => [told]);

    /// <summary>Puts something down that only changes the site.</summary>
    public void Do(DateTimeOffset at, Action happens) => Plan(at, () =>
    {
        happens();
        return [];
    });

    /// <summary>Lets the next thing happen.</summary>
    public IEnumerable<SimulatedEvent> Happen() => _queue.Dequeue()();
}
