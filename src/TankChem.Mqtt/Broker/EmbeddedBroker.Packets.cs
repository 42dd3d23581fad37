using MQTTnet;
using MQTTnet.Formatter;
using MQTTnet.Packets;
using MQTTnet.Protocol;
using MQTTnet.Server;
using TankChem.Monitoring.Readings;
using TankChem.Mqtt.Payloads;
using TankChem.Mqtt.Topics;

namespace TankChem.Mqtt.Broker;

/// <summary>What the broker does with each packet.</summary>
public sealed partial class EmbeddedBroker
{
    private const string RefusedOut = "topic: only the service speaks under tankchem/out/; the message was refused.";

    /// <summary>Aliases that a connection may use for topics (MQTT 5).</summary>
    private const ushort TopicAliasMax = 256;

    private Task ValidateAsync(ValidatingConnectionEventArgs args)
    {
        if (connections.Count > settings.ClientsMax)
        {
            counters.CountConnectionRefused();
            args.ReasonCode = MqttConnectReasonCode.ServerBusy;
            args.ReasonString = $"There are already {settings.ClientsMax} clients.";
            return Task.CompletedTask;
        }

        // MQTT 3.1.1 has no way to tell a client the id it was given, and MQTTnet refuses an empty one there.
        string id = args.ClientId;
        if (string.IsNullOrEmpty(id) && args.ProtocolVersion == MqttProtocolVersion.V500)
            args.AssignedClientIdentifier = id = $"assigned-{Guid.NewGuid():N}";
        if (connections.TryGetValue(args.RemoteEndPoint, out ClientConnection? connection))
            connection.ClientId = id;
        return Task.CompletedTask;
    }

    private Task MarkInboundAsync(InterceptingPacketEventArgs args)
    {
        if (!connections.TryGetValue(args.RemoteEndPoint, out ClientConnection? connection))
        {
            args.ProcessPacket = false;
            return Task.CompletedTask;
        }

        switch (args.Packet)
        {
            case MqttPublishPacket publish:
                publish.UserProperties = new PublishMark(connection, publish.PacketIdentifier, publish.UserProperties);
                break;
            case MqttPubRelPacket release:
                connection.Tickets.Release(release.PacketIdentifier);
                break;
            case MqttPubAckPacket or MqttPubCompPacket:
                connection.CountAcknowledged();
                break;
        }

        return Task.CompletedTask;
    }

    private async Task TakeAsync(InterceptingPublishEventArgs args)
    {
        MqttApplicationMessage message = args.ApplicationMessage;
        if (message.UserProperties is OwnProperties)
            return;
        var mark = message.UserProperties as PublishMark;
        if (mark is not null)
            message.UserProperties = mark.Properties;

        // A retained reading would come back to later subscribers as if it were of now; this broker takes it as live and keeps none.
        message.Retain = false;
        args.ProcessPublish = TopicText.Fault(message.Topic) is null;
        bool isExactlyOnce = message.QualityOfServiceLevel == MqttQualityOfServiceLevel.ExactlyOnce;
        if (mark is not null && isExactlyOnce && mark.Connection.Tickets.IsHeld(mark.PacketIdentifier))
        {
            args.ProcessPublish = false;
            return;
        }

        var incoming = new IncomingMessage(message.Topic, message.Payload, message.ContentType, args.ClientId, clock.GetUtcNow(), ReadingOrigin.Live);
        Task onDisk = message.Topic.StartsWith(TopicName.Out, StringComparison.Ordinal)
            ? await RefuseAsync(args, incoming)
            : await door.EnterAsync(incoming, args.CancellationToken);
        if (mark is not null && message.QualityOfServiceLevel != MqttQualityOfServiceLevel.AtMostOnce)
            mark.Connection.Tickets.Add(mark.PacketIdentifier, onDisk, isExactlyOnce);
    }

    private ValueTask<Task> RefuseAsync(InterceptingPublishEventArgs args, in IncomingMessage incoming)
    {
        counters.CountRefused();
        args.ProcessPublish = false;
        args.Response.ReasonCode = MqttPubAckReasonCode.NotAuthorized;
        args.Response.ReasonString = RefusedOut;
        return door.KeepUnreadableAsync(incoming, RefusedOut, args.CancellationToken);
    }

    private async Task HoldAcknowledgementAsync(InterceptingPacketEventArgs args)
    {
        switch (args.Packet)
        {
            case MqttConnAckPacket welcome:
                welcome.MaximumPacketSize = PacketBytesMax;
                welcome.TopicAliasMaximum = TopicAliasMax;
                welcome.SharedSubscriptionAvailable = false;
                break;
            case MqttPubAckPacket or MqttPubRecPacket:
                args.ProcessPacket = connections.TryGetValue(args.RemoteEndPoint, out ClientConnection? connection)
                    && await IsOnDiskAsync(connection, (MqttPacketWithIdentifier)args.Packet, args);
                break;
            case MqttPublishPacket { QualityOfServiceLevel: not MqttQualityOfServiceLevel.AtMostOnce }:
                if (connections.TryGetValue(args.RemoteEndPoint, out ClientConnection? subscriber) && subscriber.CountSent() > WaitingPerSubscriberMax)
                    DropSlow(subscriber, args.ClientId);
                break;
        }
    }

    /// <summary>Waits until what a packet acknowledges is on disk.</summary>
    /// <returns>False when it is not, or when another connection of the same client id owes the acknowledgement: then it must not be sent.</returns>
    private async Task<bool> IsOnDiskAsync(ClientConnection connection, MqttPacketWithIdentifier packet, InterceptingPacketEventArgs args)
    {
        if (!connection.Tickets.TryTake(packet.PacketIdentifier, out Task? onDisk))
            return false;
        try
        {
            await onDisk.WaitAsync(args.CancellationToken);
            return true;
        }
        catch (OperationCanceledException) when (args.CancellationToken.IsCancellationRequested)
        {
            return false;
        }
#pragma warning disable CA1031 // Whatever kept it from the disk: an acknowledgement would be a lie, and MQTTnet would swallow the exception and go on.
        catch (Exception e)
#pragma warning restore CA1031
        {
            counters.CountCommitFailure();
            LogCommitFailed(e, args.ClientId);
            connection.Abort("A message did not reach the disk.");
            return false;
        }
    }

    private Task DropSlowSubscriberAsync(QueueMessageOverwrittenEventArgs args)
    {
        foreach (ClientConnection connection in connections.Values)
        {
            if (connection.ClientId == args.ReceiverClientId)
                DropSlow(connection, args.ReceiverClientId);
        }

        return Task.CompletedTask;
    }

    private void DropSlow(ClientConnection connection, string clientId)
    {
        counters.CountSlowSubscriber();
        LogSlowSubscriber(clientId);
        connection.Abort("Messages are not taken.");
    }
}
