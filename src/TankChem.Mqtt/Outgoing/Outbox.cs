namespace TankChem.Mqtt.Outgoing;

/// <summary>What still has to go to one broker: the newest of each topic, in the order in which topics first had something new. Bounded.</summary>
internal sealed class Outbox(int topicsMax, MqttCounters counters) : IDisposable
{
    private readonly Lock gate = new();
    private readonly Dictionary<string, Func<OutgoingMessage>> newest = new(StringComparer.Ordinal);
    private readonly Queue<string> order = new();
    private readonly SemaphoreSlim filled = new(0, 1);

    /// <summary>Puts a topic's newest message in; an older one that still waits is replaced.</summary>
    public void Put(string topic, Func<OutgoingMessage> message)
    {
        lock (gate)
        {
            if (!newest.ContainsKey(topic))
            {
                if (newest.Count >= topicsMax)
                {
                    counters.CountDropped();
                    return;
                }

                order.Enqueue(topic);
            }

            newest[topic] = message;
            if (filled.CurrentCount == 0)
                filled.Release();
        }
    }

    /// <summary>Waits until there is something.</summary>
    public Task WaitAsync(CancellationToken cancellationToken) => filled.WaitAsync(cancellationToken);

    /// <summary>Takes the next message; null when there is none.</summary>
    public Func<OutgoingMessage>? Take()
    {
        lock (gate)
        {
            if (!order.TryDequeue(out string? topic))
                return null;
            newest.Remove(topic, out Func<OutgoingMessage>? message);
            return message;
        }
    }

    public void Dispose() => filled.Dispose();
}
