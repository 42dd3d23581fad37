using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Ports;

/// <summary>The one door through which readings walk in.</summary>
public interface IReadingIntake
{
    /// <summary>Hands over one message.</summary>
    /// <returns>The outer task ends when there is room in the bounded buffer (back-pressure); the inner one when the message is on disk.
    /// The inner task fails only when the service stops before that: the sender must send again.</returns>
    ValueTask<Task> OfferAsync(Arrival arrival, CancellationToken cancellationToken);
}
