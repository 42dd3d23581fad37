namespace TankChem.Mqtt;

/// <summary>What went through the MQTT room since the start, for <c>/metrics</c>.</summary>
public sealed class MqttCounters
{
    private long taken;
    private long unreadable;
    private long refused;
    private long oversized;
    private long commitFailures;
    private long connections;
    private long connectionsRefused;
    private long slowSubscribers;
    private long sent;
    private long dropped;

    /// <summary>Messages taken in, readable or not.</summary>
    public long Taken => Interlocked.Read(ref taken);

    /// <summary>Messages that could not be read; kept with their reason.</summary>
    public long Unreadable => Interlocked.Read(ref unreadable);

    /// <summary>Publishes under <c>tankchem/out/</c> that were refused.</summary>
    public long Refused => Interlocked.Read(ref refused);

    /// <summary>Connections closed for a packet over the limit.</summary>
    public long Oversized => Interlocked.Read(ref oversized);

    /// <summary>Acknowledgements withheld, and their connections closed, because the store did not take the message.</summary>
    public long CommitFailures => Interlocked.Read(ref commitFailures);

    /// <summary>Connections to the embedded broker that are open now.</summary>
    public long Connections => Interlocked.Read(ref connections);

    /// <summary>Connections refused because there were too many.</summary>
    public long ConnectionsRefused => Interlocked.Read(ref connectionsRefused);

    /// <summary>Subscribers disconnected because they did not take what was sent to them.</summary>
    public long SlowSubscribers => Interlocked.Read(ref slowSubscribers);

    /// <summary>Messages handed to a broker by this service.</summary>
    public long Sent => Interlocked.Read(ref sent);

    /// <summary>Outgoing messages dropped because too many topics waited.</summary>
    public long Dropped => Interlocked.Read(ref dropped);

    internal void CountTaken() => Interlocked.Increment(ref taken);

    internal void CountUnreadable() => Interlocked.Increment(ref unreadable);

    internal void CountRefused() => Interlocked.Increment(ref refused);

    internal void CountOversized() => Interlocked.Increment(ref oversized);

    internal void CountCommitFailure() => Interlocked.Increment(ref commitFailures);

    internal void CountConnection(int change) => Interlocked.Add(ref connections, change);

    internal void CountConnectionRefused() => Interlocked.Increment(ref connectionsRefused);

    internal void CountSlowSubscriber() => Interlocked.Increment(ref slowSubscribers);

    internal void CountSent() => Interlocked.Increment(ref sent);

    internal void CountDropped() => Interlocked.Increment(ref dropped);
}
