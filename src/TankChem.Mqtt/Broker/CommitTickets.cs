using System.Diagnostics.CodeAnalysis;

namespace TankChem.Mqtt.Broker;

/// <summary>What one connection waits for: packet identifiers whose messages are not known to be on disk yet. At most the 65,535 identifiers there are.</summary>
internal sealed class CommitTickets
{
    private readonly Lock gate = new();
    private readonly Dictionary<ushort, Ticket> tickets = [];

    /// <summary>Notes what the acknowledgement of a packet has to wait for.</summary>
    public void Add(ushort packetIdentifier, Task onDisk, bool untilReleased)
    {
        lock (gate)
        {
            // A client that uses an identifier again before its acknowledgement gets both acknowledged when both are on disk.
            tickets[packetIdentifier] = tickets.TryGetValue(packetIdentifier, out Ticket old) && !old.UntilReleased
                ? new Ticket(Task.WhenAll(old.OnDisk, onDisk), old.Count + 1, untilReleased)
                : new Ticket(onDisk, 1, untilReleased);
        }
    }

    /// <summary>Whether a QoS 2 message of this identifier was taken and not released yet: a repetition of it is the same message.</summary>
    public bool IsHeld(ushort packetIdentifier)
    {
        lock (gate)
            return tickets.TryGetValue(packetIdentifier, out Ticket ticket) && ticket.UntilReleased;
    }

    /// <summary>Takes what an acknowledgement has to wait for.</summary>
    /// <returns>False when this connection owes no such acknowledgement.</returns>
    public bool TryTake(ushort packetIdentifier, [NotNullWhen(true)] out Task? onDisk)
    {
        onDisk = null;
        lock (gate)
        {
            if (!tickets.TryGetValue(packetIdentifier, out Ticket ticket))
                return false;
            onDisk = ticket.OnDisk;
            if (ticket.UntilReleased)
                return true;
            if (ticket.Count > 1)
                tickets[packetIdentifier] = ticket with { Count = ticket.Count - 1 };
            else
                tickets.Remove(packetIdentifier);
            return true;
        }
    }

    /// <summary>Forgets a QoS 2 identifier: its client has released it.</summary>
    public void Release(ushort packetIdentifier)
    {
        lock (gate)
            tickets.Remove(packetIdentifier);
    }

    private readonly record struct Ticket(Task OnDisk, int Count, bool UntilReleased);
}
