using System.Buffers;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Bodies;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Mqtt.Payloads;
using TankChem.Mqtt.Topics;

namespace TankChem.Mqtt;

/// <summary>The one way in for messages of both brokers: readings to the intake, commands to the alarms, the rest to the unreadable store.</summary>
internal sealed class MessageDoor(PayloadReader reader, IReadingIntake intake, IOperations operations, MqttCounters counters) : IDisposable
{
    /// <summary>Payloads from this size on count against <see cref="LargeMax"/>; the intake's own bound counts messages, whatever their size.</summary>
    private const int LargeBytes = 4096;

    /// <summary>Large payloads that may wait for the disk at one time; each unfolds to a few times its size.</summary>
    private const int LargeMax = 64;

    private const int CommandsMax = 16;

    private readonly SemaphoreSlim large = new(LargeMax);
    private readonly SemaphoreSlim commands = new(CommandsMax);

    /// <summary>Takes a message.</summary>
    /// <returns>The outer task ends when there is room for it, the inner one when it is on disk, or done; it fails when it is not and has to be sent again.</returns>
    public ValueTask<Task> EnterAsync(in IncomingMessage message, CancellationToken cancellationToken)
    {
        counters.CountTaken();
        if (reader.TryName(message.Topic, out TopicName? name, out _) && name.Kind == TopicKind.AlarmCommand)
            return CommandAsync(message with { Payload = new ReadOnlySequence<byte>(message.Payload.ToArray()) }, new AlarmKey(name.Place, name.Rule), cancellationToken);
        Arrival arrival = reader.Read(message);
        if (arrival.Unreadable is not null)
            counters.CountUnreadable();
        return message.Payload.Length < LargeBytes ? intake.OfferAsync(arrival, cancellationToken) : OfferLargeAsync(arrival, cancellationToken);
    }

    /// <summary>Keeps a message with the reason why it was not taken.</summary>
    public ValueTask<Task> KeepUnreadableAsync(in IncomingMessage message, string reason, CancellationToken cancellationToken)
    {
        counters.CountUnreadable();
        return intake.OfferAsync(PayloadReader.Unreadable(message, reason, []), cancellationToken);
    }

    /// <summary>Keeps the note that a packet was longer than is taken; of its payload nothing was received.</summary>
    public ValueTask<Task> KeepOversizedAsync(string topic, long length, long limit, string? client, DateTimeOffset at, CancellationToken cancellationToken)
    {
        counters.CountUnreadable();
        var note = new UnreadablePayload(
            TopicText.Shown(topic), at, length, ReadOnlyMemory<byte>.Empty, $"packet: {length} bytes, over the limit of {limit}; the connection was closed. Smaller packs would be right.", client is null ? null : TopicText.Shown(client));
        return intake.OfferAsync(new Arrival { ReceivedAt = at, Origin = ReadingOrigin.Live, Unreadable = note }, cancellationToken);
    }

    public void Dispose()
    {
        large.Dispose();
        commands.Dispose();
    }

    private async ValueTask<Task> OfferLargeAsync(Arrival arrival, CancellationToken cancellationToken)
    {
        await large.WaitAsync(cancellationToken);
        Task? onDisk = null;
        try
        {
            onDisk = await intake.OfferAsync(arrival, cancellationToken);
        }
        finally
        {
            if (onDisk is null)
                large.Release();
        }

        _ = onDisk.ContinueWith(static (_, held) => ((SemaphoreSlim)held!).Release(), large, CancellationToken.None, TaskContinuationOptions.ExecuteSynchronously, TaskScheduler.Default);
        return onDisk;
    }

    private async ValueTask<Task> CommandAsync(IncomingMessage message, AlarmKey key, CancellationToken cancellationToken)
    {
        await commands.WaitAsync(cancellationToken);
        return CarryOutAsync(message, key);
    }

    private async Task CarryOutAsync(IncomingMessage message, AlarmKey key)
    {
        try
        {
            if (await RefusalAsync(message, key) is { } refusal)
                await await KeepUnreadableAsync(message, refusal, CancellationToken.None);
        }
        finally
        {
            commands.Release();
        }
    }

    private async Task<string?> RefusalAsync(IncomingMessage message, AlarmKey key)
    {
        // What a person meant for an alarm of then must not reach an alarm of now.
        if (message.Origin != ReadingOrigin.Live)
            return "command: it waited at the broker for an unknown time and is not carried out; send it again, without the retain flag.";
        if (!AlarmCommandBody.TryParse(message.Payload.First, key, out AlarmCommand? command, out string? fault))
            return $"command: {fault}";
        OperationResult result = await operations.CommandAlarmAsync(command!, CancellationToken.None);
        return result.Done ? null : $"command refused: {result.Fault}";
    }
}
