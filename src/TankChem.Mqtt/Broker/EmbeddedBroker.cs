using System.Collections.Concurrent;
using System.Net;
using Microsoft.AspNetCore.Connections;
using Microsoft.AspNetCore.Server.Kestrel.Core;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using MQTTnet;
using MQTTnet.AspNetCore;
using MQTTnet.Protocol;
using MQTTnet.Server;
using TankChem.Mqtt.Outgoing;

namespace TankChem.Mqtt.Broker;

/// <summary>The broker inside the service. Kestrel carries its connections; a PUBACK or PUBREC leaves only when the message is on disk.</summary>
public sealed partial class EmbeddedBroker : IHostedService, IDisposable
{
    /// <summary>Longest packet, bytes; a longer one closes its connection.</summary>
    public const int PacketBytesMax = 256 * 1024;

    /// <summary>Connections beyond <see cref="MqttSettings.ClientsMax"/> that still get an answer, the refusal.</summary>
    private const int ConnectionsToSpare = 64;

    /// <summary>Messages that may wait for a subscriber, and that it may owe acknowledgements for: enough for every retained state of a large farm.</summary>
    private const int WaitingPerSubscriberMax = 20_000;

    private static readonly TimeSpan ConnectWithin = TimeSpan.FromSeconds(10);
    private static readonly TimeSpan FarewellWithin = TimeSpan.FromSeconds(1);
    private static readonly TimeSpan FarewellCheck = TimeSpan.FromMilliseconds(20);

    private readonly MqttSettings settings;
    private readonly MessageDoor door;
    private readonly Announcer announcer;
    private readonly MqttCounters counters;
    private readonly TimeProvider clock;
    private readonly IHostApplicationLifetime lifetime;
    private readonly ILogger<EmbeddedBroker> logger;
    private readonly MqttServer server;
    private readonly Outbox outbox;
    private readonly ConcurrentDictionary<EndPoint, ClientConnection> connections = new();
    private readonly CancellationTokenSource stopping = new();
    private readonly Lock stopGate = new();
    private readonly List<ListenOptions> listeners = [];
    private Task? stopped;
    private Task? outgoing;

    internal EmbeddedBroker(MqttSettings settings, MessageDoor door, Announcer announcer, MqttConnectionHandler handler, MqttCounters counters, TimeProvider clock, IHostApplicationLifetime lifetime, ILogger<EmbeddedBroker> logger)
    {
        this.settings = settings;
        this.door = door;
        this.announcer = announcer;
        this.counters = counters;
        this.clock = clock;
        this.lifetime = lifetime;
        this.logger = logger;
        MqttServerOptions options = new MqttServerOptionsBuilder()
            .WithoutDefaultEndpoint()
            .WithDefaultCommunicationTimeout(ConnectWithin)
            .WithMaxPendingMessagesPerClient(WaitingPerSubscriberMax)
            .WithPendingMessagesOverflowStrategy(MqttPendingMessagesOverflowStrategy.DropOldestQueuedMessage)
            .Build();
        outbox = announcer.Open();
        server = new MqttServer(options, [handler], new MqttLog(logger));
        server.ValidatingConnectionAsync += ValidateAsync;
        server.InterceptingInboundPacketAsync += MarkInboundAsync;
        server.InterceptingPublishAsync += TakeAsync;
        server.InterceptingOutboundPacketAsync += HoldAcknowledgementAsync;
        server.QueuedApplicationMessageOverwrittenAsync += DropSlowSubscriberAsync;
    }

    /// <summary>The port it listens on once the host has started; 0 before, and when it has no listener.</summary>
    public int Port => listeners.Count == 0 ? 0 : listeners[0].IPEndPoint?.Port ?? 0;

    /// <inheritdoc/>
    public async Task StartAsync(CancellationToken cancellationToken)
    {
        await server.StartAsync();

        // Kestrel waits for its connections to end when the host stops, and clients of a broker stay: they are sent away as soon as the stop begins.
        lifetime.ApplicationStopping.Register(() => _ = StopOnceAsync());
        outgoing = announcer.RunAsync(outbox, SendAsync, stopping.Token);
    }

    /// <inheritdoc/>
    public Task StopAsync(CancellationToken cancellationToken) => StopOnceAsync().WaitAsync(cancellationToken);

    /// <inheritdoc/>
    public void Dispose()
    {
        server.Dispose();
        stopping.Dispose();
    }

    /// <summary>Puts the broker behind a Kestrel listener.</summary>
    internal void Attach(ListenOptions listen)
    {
        listeners.Add(listen);
        listen.Use(next => context => ServeAsync(context, next));
        listen.UseMqtt();
    }

    private async Task ServeAsync(ConnectionContext context, ConnectionDelegate next)
    {
        if (context.RemoteEndPoint is not { } remote || connections.Count >= settings.ClientsMax + ConnectionsToSpare)
        {
            counters.CountConnectionRefused();
            context.Abort(new ConnectionAbortedException("Too many connections."));
            return;
        }

        var connection = new ClientConnection(context);
        connections[remote] = connection;
        counters.CountConnection(1);
        context.Transport = new CappedTransport(new PacketCapReader(context.Transport.Input, PacketBytesMax, connection), context.Transport.Output);
        try
        {
            await next(context);
        }
        finally
        {
            connections.TryRemove(new KeyValuePair<EndPoint, ClientConnection>(remote, connection));
            counters.CountConnection(-1);
            if (connection.Oversized is { } packet)
                await NoteOversizedAsync(connection, packet);
        }
    }

    private async Task NoteOversizedAsync(ClientConnection connection, OversizedPacket packet)
    {
        counters.CountOversized();
        LogOversized(connection.ClientId, packet.Length, PacketBytesMax);
        try
        {
            await await door.KeepOversizedAsync(packet.Topic, packet.Length, PacketBytesMax, connection.ClientId, clock.GetUtcNow(), stopping.Token);
        }
        catch (OperationCanceledException)
        {
            LogOversizedNotKept();
        }
    }

    private async Task SendAsync(OutgoingMessage message, CancellationToken cancellationToken)
    {
        MqttApplicationMessage published = message.ToMqtt(new OwnProperties());
        await server.InjectApplicationMessage(new InjectedMqttApplicationMessage(published) { SenderClientId = "tankchem" }, cancellationToken);
    }

    private Task StopOnceAsync()
    {
        lock (stopGate)
            return stopped ??= StopNowAsync();
    }

    private async Task StopNowAsync()
    {
        await stopping.CancelAsync();
        if (outgoing is null)
            return;
        await outgoing;
        await SendAsync(announcer.Offline, CancellationToken.None);

        // Subscribers are given a moment to take the farewell; one that does not is caught by its own timeout.
        long began = clock.GetTimestamp();
        while (clock.GetElapsedTime(began) < FarewellWithin && (await server.GetSessionsAsync()).Any(s => s.PendingApplicationMessagesCount > 0))
            await Task.Delay(FarewellCheck, clock);
        await server.StopAsync(new MqttServerStopOptions { DefaultClientDisconnectOptions = new MqttServerClientDisconnectOptions { ReasonCode = MqttDisconnectReasonCode.ServerShuttingDown } });
        foreach (ClientConnection connection in connections.Values)
            connection.Abort("The service stops.");
    }

    [LoggerMessage(EventId = 3001, Level = LogLevel.Warning, Message = "Client {Client} sent a packet of {Length} bytes, over the limit of {Max}; its connection was closed")]
    private partial void LogOversized(string? client, long length, int max);

    [LoggerMessage(EventId = 3002, Level = LogLevel.Warning, Message = "The note of an oversized packet was not kept: the service stops")]
    private partial void LogOversizedNotKept();

    [LoggerMessage(EventId = 3003, Level = LogLevel.Error, Message = "A message of client {Client} did not reach the disk; its connection was closed, so that it is sent again")]
    private partial void LogCommitFailed(Exception exception, string client);

    [LoggerMessage(EventId = 3004, Level = LogLevel.Warning, Message = "Client {Client} does not take what it subscribed to; it was disconnected")]
    private partial void LogSlowSubscriber(string client);
}
