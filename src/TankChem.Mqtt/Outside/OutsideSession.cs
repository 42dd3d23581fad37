using System.Threading.Channels;
using MQTTnet;
using MQTTnet.Packets;
using MQTTnet.Protocol;
using TankChem.Monitoring.Readings;
using TankChem.Mqtt.Payloads;
using TankChem.Mqtt.Topics;

namespace TankChem.Mqtt.Outside;

/// <summary>One connection to the outside broker. Messages are acknowledged in their order, each when it is on disk; what is not acknowledged when the
/// connection ends is forgotten here and comes again on the next one.</summary>
internal sealed class OutsideSession : IAsyncDisposable
{
    /// <summary>The service sends itself a message here: what a resumed session delivers before it returns had waited at the broker.</summary>
    public const string MarkerTopic = "tankchem/out/service/marker";

    private const uint MarkerExpiryS = 60;
    private const string Stops = "the service stops";

    private readonly IMqttClient client;
    private readonly MessageDoor door;
    private readonly TimeProvider clock;
    private readonly CancellationTokenSource ending;
    private readonly TaskCompletionSource<string> ended = new(TaskCreationOptions.RunContinuationsAsynchronously);
    private readonly Channel<Owed> owed = Channel.CreateUnbounded<Owed>(new UnboundedChannelOptions { SingleReader = true });
    private readonly byte[] marker = Guid.NewGuid().ToByteArray();
    private volatile bool catchingUp = true;
    private volatile bool isResumed = true;

    public OutsideSession(IMqttClient client, MessageDoor door, TimeProvider clock, CancellationToken stoppingToken)
    {
        this.client = client;
        this.door = door;
        this.clock = clock;
        ending = CancellationTokenSource.CreateLinkedTokenSource(stoppingToken);
        client.ApplicationMessageReceivedAsync += TakeAsync;
        client.DisconnectedAsync += e =>
        {
            ended.TrySetResult(e.Exception?.GetBaseException().Message ?? (string.IsNullOrEmpty(e.ReasonString) ? e.Reason.ToString() : e.ReasonString));
            return Task.CompletedTask;
        };
    }

    /// <summary>Subscribes, and sends the marker.</summary>
    public async Task OpenAsync(bool sessionPresent, IReadOnlyList<MqttTopicFilter> filters, CancellationToken cancellationToken)
    {
        isResumed = sessionPresent;
        var subscription = new MqttClientSubscribeOptions();
        subscription.TopicFilters.AddRange(filters);
        MqttClientSubscribeResult result = await client.SubscribeAsync(subscription, cancellationToken);
        if (result.Items.FirstOrDefault(i => i.ResultCode > MqttClientSubscribeResultCode.GrantedQoS2) is { } refused)
            throw new InvalidOperationException($"The broker refuses the subscription to {refused.TopicFilter.Topic}: {refused.ResultCode}.");
        var message = new MqttApplicationMessage
        {
            Topic = MarkerTopic,
            PayloadSegment = marker,
            QualityOfServiceLevel = MqttQualityOfServiceLevel.AtLeastOnce,
            MessageExpiryInterval = MarkerExpiryS,
        };
        await client.PublishAsync(message, cancellationToken);
    }

    /// <summary>Works until the connection ends.</summary>
    /// <param name="speak">Publishes what the service has to say.</param>
    /// <returns>Why it ended.</returns>
    public async Task<string> RunAsync(Func<CancellationToken, Task> speak)
    {
        Task acknowledging = AcknowledgeAsync();
        Task speaking = speak(ending.Token);
        try
        {
            await Task.WhenAny(ended.Task, acknowledging, speaking);
            if (ended.Task.IsCompleted)
                return await ended.Task;

            // Either of the two ends early only when it failed or the service stops.
            await (acknowledging.IsCompleted ? acknowledging : speaking);
            return Stops;
        }
        catch (OperationCanceledException) when (ending.IsCancellationRequested)
        {
            return Stops;
        }
        finally
        {
            await ending.CancelAsync();
            await ((Task)Task.WhenAll(acknowledging, speaking)).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
        }
    }

    public async ValueTask DisposeAsync()
    {
        client.ApplicationMessageReceivedAsync -= TakeAsync;
        await ending.CancelAsync();
        ending.Dispose();
    }

    /// <summary>Takes one message. It never throws: MQTTnet would go on without acknowledging anything, and say nothing.</summary>
    private async Task TakeAsync(MqttApplicationMessageReceivedEventArgs args)
    {
        args.AutoAcknowledge = false;
        try
        {
            Task onDisk = args.ApplicationMessage.Topic.StartsWith(TopicName.Out, StringComparison.Ordinal) ? HearOwn(args.ApplicationMessage) : await EnterAsync(args.ApplicationMessage);
            if (args.ApplicationMessage.QualityOfServiceLevel != MqttQualityOfServiceLevel.AtMostOnce)
                owed.Writer.TryWrite(new Owed(args, onDisk));
        }
#pragma warning disable CA1031 // The connection ends for it, and the message comes again.
        catch (Exception e)
#pragma warning restore CA1031
        {
            ended.TrySetResult(e.Message);
        }
    }

    private ValueTask<Task> EnterAsync(MqttApplicationMessage message)
    {
        ReadingOrigin origin = message.Retain ? ReadingOrigin.Retained : isResumed && catchingUp ? ReadingOrigin.Backlog : ReadingOrigin.Live;
        return door.EnterAsync(new IncomingMessage(message.Topic, message.Payload, message.ContentType, null, clock.GetUtcNow(), origin), ending.Token);
    }

    private Task HearOwn(MqttApplicationMessage message)
    {
        // A marker of an earlier connection is part of the backlog itself; a mapping of "#" brings the service's other messages back, too.
        if (message.Topic == MarkerTopic && message.Payload.FirstSpan.SequenceEqual(marker))
            catchingUp = false;
        return Task.CompletedTask;
    }

    private async Task AcknowledgeAsync()
    {
        await foreach (Owed next in owed.Reader.ReadAllAsync(ending.Token))
        {
            await next.OnDisk.WaitAsync(ending.Token);
            await next.Message.AcknowledgeAsync(ending.Token);
        }
    }

    /// <summary>An acknowledgement that is owed.</summary>
    private sealed record Owed(MqttApplicationMessageReceivedEventArgs Message, Task OnDisk);
}
