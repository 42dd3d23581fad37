using System.Collections.Concurrent;
using Microsoft.Extensions.Logging;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Bodies;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Water;

namespace TankChem.Mqtt.Outgoing;

/// <summary>Makes outgoing messages of what is on disk, and gives them to every broker. Never blocks; the newest of each topic wins.</summary>
public sealed partial class Announcer : IAnnouncer
{
    /// <summary>Topics that may wait for one broker: 2,000 tanks with ten alarms each, and room.</summary>
    private const int TopicsMax = 50_000;

    /// <summary>A topic is sent at most this often; what comes faster is coalesced.</summary>
    private static readonly TimeSpan Pace = TimeSpan.FromMilliseconds(50);

    private readonly IFarm farm;
    private readonly bool isDemo;
    private readonly MqttCounters counters;
    private readonly TimeProvider clock;
    private readonly ILogger<Announcer> logger;
    private readonly ConcurrentDictionary<string, Func<OutgoingMessage>> latest = new(StringComparer.Ordinal);
    private readonly Lock gate = new();
    private Outbox[] outboxes = [];

    internal Announcer(IFarm farm, MqttSettings settings, MqttCounters counters, TimeProvider clock, ILogger<Announcer> logger)
    {
        this.logger = logger;
        this.farm = farm;
        this.counters = counters;
        this.clock = clock;
        isDemo = settings.IsDemo;
        Offline = OutgoingMessage.Word(ServiceTopic, "offline", isDemo);
        OutgoingMessage online = OutgoingMessage.Word(ServiceTopic, "online", isDemo);
        latest[ServiceTopic] = () => online;
    }

    internal const string ServiceTopic = "tankchem/out/service";

    /// <summary>The farewell, and the will that an outside broker speaks for the service.</summary>
    internal OutgoingMessage Offline { get; }

    /// <inheritdoc/>
    public void Announce(WaterState water)
    {
        ArgumentNullException.ThrowIfNull(water);
        Put($"tankchem/out/{water.Place.Site}/{water.Place.Place}/water", topic => new OutgoingMessage(topic, WaterBody.ToUtf8(water, isDemo), true, isDemo));
        EnsurePermit(farm.Find(water.Place)?.Definition);
    }

    /// <inheritdoc/>
    public void Announce(AlarmView alarm)
    {
        ArgumentNullException.ThrowIfNull(alarm);
        PlaceKey place = alarm.Key.Place;
        Put($"tankchem/out/{place.Site}/{place.Place}/alarm/{alarm.Key.Rule}", topic => new OutgoingMessage(topic, AlarmBody.ToUtf8(alarm, isDemo), true, isDemo));
    }

    /// <summary>Opens the way to one broker.</summary>
    internal Outbox Open()
    {
        var outbox = new Outbox(TopicsMax, counters);
        lock (gate)
            outboxes = [.. outboxes, outbox];
        return outbox;
    }

    /// <summary>Sends to one broker everything that holds now, and then what changes, until it is stopped or a message cannot be sent.</summary>
    /// <param name="outbox">What has to go there.</param>
    /// <param name="send">Hands one message over.</param>
    /// <param name="cancellationToken">Stops it.</param>
    internal async Task RunAsync(Outbox outbox, Func<OutgoingMessage, CancellationToken, Task> send, CancellationToken cancellationToken)
    {
        TakeInitialStates();
        foreach ((string topic, Func<OutgoingMessage> message) in latest)
            outbox.Put(topic, message);
        try
        {
            while (true)
            {
                await outbox.WaitAsync(cancellationToken);
                while (outbox.Take() is { } make)
                {
                    if (TryMake(make) is not { } message)
                        continue;
                    await send(message, cancellationToken);
                    counters.CountSent();
                }

                await Task.Delay(Pace, clock, cancellationToken);
            }
        }
        catch (OperationCanceledException) when (cancellationToken.IsCancellationRequested)
        {
            // Stopped: what was not sent is sent anew after the next start, from what is on disk.
            return;
        }
    }

    private OutgoingMessage? TryMake(Func<OutgoingMessage> make)
    {
        try
        {
            return make();
        }
#pragma warning disable CA1031 // One body that cannot be written must not silence the other places.
        catch (Exception e)
#pragma warning restore CA1031
        {
            LogNotWritten(e);
            return null;
        }
    }

    private void TakeInitialStates()
    {
        foreach (PlaceSnapshot place in farm.Places)
        {
            EnsurePermit(place.Definition);
            PlaceKey key = place.Definition.Key;
            string waterTopic = $"tankchem/out/{key.Site}/{key.Place}/water";
            if (!latest.ContainsKey(waterTopic))
                Announce(place.Water);
            foreach (AlarmView alarm in place.Alarms)
            {
                if (!latest.ContainsKey($"tankchem/out/{key.Site}/{key.Place}/alarm/{alarm.Key.Rule}"))
                    Announce(alarm);
            }
        }
    }

    /// <summary>The valve of a place with CO2 injection is told to close. This version has no engine that could grant a permit, so it never says anything else.</summary>
    private void EnsurePermit(PlaceDefinition? place)
    {
        if (place is not { Co2Injection: true })
            return;
        string topic = $"tankchem/out/{place.Key.Site}/{place.Key.Place}/permit/co2";
        if (!latest.ContainsKey(topic))
            Put(topic, t => OutgoingMessage.Word(t, "stop", isDemo));
    }

    private void Put(string topic, Func<string, OutgoingMessage> make)
    {
        OutgoingMessage Message() => make(topic);
        latest[topic] = Message;
        foreach (Outbox outbox in outboxes)
            outbox.Put(topic, Message);
    }

    [LoggerMessage(EventId = 3011, Level = LogLevel.Error, Message = "The body of an outgoing message cannot be written; it was left out")]
    private partial void LogNotWritten(Exception exception);
}
