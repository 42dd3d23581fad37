using Microsoft.AspNetCore.Connections;

namespace TankChem.Mqtt.Broker;

/// <summary>One TCP connection to the embedded broker. Not a client: a client id may move from one connection to the next.</summary>
internal sealed class ClientConnection(ConnectionContext context)
{
    private int unacknowledged;

    /// <summary>What its acknowledgements wait for.</summary>
    public CommitTickets Tickets { get; } = new();

    /// <summary>The client's id, once it has said it.</summary>
    public string? ClientId { get; set; }

    /// <summary>The packet that was over the limit; null while there was none.</summary>
    public OversizedPacket? Oversized { get; set; }

    /// <summary>Counts a message sent to it that it has to acknowledge.</summary>
    /// <returns>How many it owes.</returns>
    public int CountSent() => Interlocked.Increment(ref unacknowledged);

    /// <summary>Counts an acknowledgement of it.</summary>
    public void CountAcknowledged() => Interlocked.Decrement(ref unacknowledged);

    /// <summary>Closes it at once; its client sends again what was not acknowledged.</summary>
    public void Abort(string why) => context.Abort(new ConnectionAbortedException(why));
}

/// <summary>A packet over the limit.</summary>
/// <param name="Length">Its length, bytes.</param>
/// <param name="Topic">Its topic as far as it was received; empty when it was none of a message.</param>
internal sealed record OversizedPacket(long Length, string Topic);
