using System.Threading.Channels;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Mqtt.Tests.Doubles;

/// <summary>An intake whose disk is the test: each message is committed when the test says so, or at once.</summary>
public sealed class FakeIntake : IReadingIntake
{
    private readonly Channel<Offer> offers = Channel.CreateUnbounded<Offer>();

    /// <summary>Whether messages are on disk at once.</summary>
    public bool CommitsAtOnce { get; set; } = true;

    public ValueTask<Task> OfferAsync(Arrival arrival, CancellationToken cancellationToken)
    {
        var offer = new Offer(arrival, new TaskCompletionSource(TaskCreationOptions.RunContinuationsAsynchronously));
        if (CommitsAtOnce)
            offer.OnDisk.SetResult();
        offers.Writer.TryWrite(offer);
        return new ValueTask<Task>(offer.OnDisk.Task);
    }

    /// <summary>The next message that was offered.</summary>
    public async Task<Offer> NextAsync() => await offers.Reader.ReadAsync(TestContext.Current.CancellationToken).AsTask().WaitAsync(Wait.Long, TestContext.Current.CancellationToken);

    /// <summary>Whether a message waits to be looked at.</summary>
    public bool HasMore => offers.Reader.TryPeek(out _);
}

/// <summary>A message that was offered.</summary>
public sealed record Offer(Arrival Arrival, TaskCompletionSource OnDisk)
{
    /// <summary>Its only reading.</summary>
    public ParsedReading Reading => Assert.Single(Arrival.Readings);

    /// <summary>The reason why there is none.</summary>
    public string Reason => Assert.IsType<UnreadablePayload>(Arrival.Unreadable).Reason;
}
