using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using MQTTnet;
using MQTTnet.Formatter;
using MQTTnet.Packets;
using MQTTnet.Protocol;
using TankChem.Monitoring.Configuration;
using TankChem.Mqtt.Outgoing;

namespace TankChem.Mqtt.Outside;

/// <summary>Joins an outside broker as a client: connects, and connects again for as long as the service runs. Each connection is an <see cref="OutsideSession"/> of its own.</summary>
public sealed partial class OutsideBroker : BackgroundService
{
    /// <summary>Under which key <see cref="MqttSettings.ReportTrouble"/> hears of it.</summary>
    public const string TroubleKey = "mqtt-outside";

    private static readonly TimeSpan FirstPause = TimeSpan.FromSeconds(1);
    private static readonly TimeSpan LongestPause = TimeSpan.FromMinutes(1);

    /// <summary>How long the broker keeps what comes while the service is away: a week.</summary>
    private const uint SessionExpiryS = 7 * 24 * 3600;

    /// <summary>Messages that may be on their way unacknowledged; measured: 20 to 100 work, 1,000 with a backlog stalled.</summary>
    private const ushort ReceiveMax = 50;

    private static readonly TimeSpan AnswerWithin = TimeSpan.FromSeconds(10);
    private static readonly TimeSpan KeepAlive = TimeSpan.FromSeconds(15);

    private readonly OutsideBrokerOptions broker;
    private readonly MqttSettings settings;
    private readonly MessageDoor door;
    private readonly Announcer announcer;
    private readonly TimeProvider clock;
    private readonly ILogger<OutsideBroker> logger;
    private readonly Outbox outbox;
    private readonly MqttClientFactory clients = new();
    private volatile ConnectionState state;

    internal OutsideBroker(OutsideBrokerOptions broker, MqttSettings settings, MessageDoor door, Announcer announcer, TimeProvider clock, ILogger<OutsideBroker> logger)
    {
        this.broker = broker;
        this.settings = settings;
        this.door = door;
        this.announcer = announcer;
        this.clock = clock;
        this.logger = logger;
        outbox = announcer.Open();
        state = new ConnectionState(false, clock.GetUtcNow(), "not connected yet");
    }

    /// <summary>Whether it is connected, or since when and why it is not.</summary>
    public ConnectionState State => state;

    /// <inheritdoc/>
    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        TimeSpan pause = FirstPause;
        while (!stoppingToken.IsCancellationRequested)
        {
            string why;
            try
            {
                why = await ServeOneConnectionAsync(stoppingToken);
            }
            catch (OperationCanceledException) when (stoppingToken.IsCancellationRequested)
            {
                return;
            }
#pragma warning disable CA1031 // Whatever ended the connection, the next one is tried; the reason is logged, shown and counted from the state.
            catch (Exception e)
#pragma warning restore CA1031
            {
                why = e.GetBaseException().Message;
                LogConnectionEnded(e, broker.Host, broker.Port);
            }

            if (state.IsConnected)
                pause = FirstPause;
            Lost(why);
            await WaitAsync(pause, stoppingToken);
            pause = pause * 2 < LongestPause ? pause * 2 : LongestPause;
        }
    }

    private async Task<string> ServeOneConnectionAsync(CancellationToken stoppingToken)
    {
        // A client object of its own for each connection: an acknowledgement that comes late can then never go out on a later connection,
        // where it would acknowledge another message.
        using IMqttClient client = clients.CreateMqttClient();
        await using var session = new OutsideSession(client, door, clock, stoppingToken);
        using var connectWithin = CancellationTokenSource.CreateLinkedTokenSource(stoppingToken);
        using var timeout = new CancellationTokenSource(AnswerWithin, clock);
        await using CancellationTokenRegistration expiry = timeout.Token.Register(connectWithin.Cancel);
        MqttClientConnectResult result = await client.ConnectAsync(Options(), connectWithin.Token);
        if (result.ResultCode != MqttClientConnectResultCode.Success)
            return $"it refused the connection: {result.ResultCode} {result.ReasonString}".TrimEnd();
        await session.OpenAsync(result.IsSessionPresent, Filters(), connectWithin.Token);
        Found();
        string why = await session.RunAsync(ct => announcer.RunAsync(outbox, (message, sendStop) => PublishAsync(client, message, sendStop), ct));
        if (stoppingToken.IsCancellationRequested)
            await FarewellAsync(client);
        return why;
    }

    private MqttClientOptions Options()
    {
        MqttClientOptionsBuilder options = new MqttClientOptionsBuilder()
            .WithTcpServer(broker.Host, broker.Port)
            .WithProtocolVersion(MqttProtocolVersion.V500)
            .WithClientId(broker.ClientId)
            .WithCleanStart(false)
            .WithSessionExpiryInterval(SessionExpiryS)
            .WithReceiveMaximum(ReceiveMax)
            .WithMaximumPacketSize(Broker.EmbeddedBroker.PacketBytesMax)
            .WithKeepAlivePeriod(KeepAlive)
            .WithTimeout(AnswerWithin)
            .WithWillTopic(announcer.Offline.Topic)
            .WithWillPayload(announcer.Offline.Body)
            .WithWillContentType("text/plain")
            .WithWillQualityOfServiceLevel(MqttQualityOfServiceLevel.AtLeastOnce)
            .WithWillRetain();
        if (settings.IsDemo)
            options.WithWillUserProperty(OutgoingMessage.DemoProperty, "true"u8.ToArray());
        if (broker.User is not null)
            options.WithCredentials(broker.User, broker.Password ?? "");
        if (broker.Tls)
            options.WithTlsOptions(tls => tls.UseTls());
        return options.Build();
    }

    /// <summary>What to subscribe to. A subscription the session already has brings no retained messages again.</summary>
    private List<MqttTopicFilter> Filters()
    {
        IEnumerable<string> topics = settings.Mappings.Select(m => m.Topic).Prepend("tankchem/cmd/#").Prepend("tankchem/in/#").Append(OutsideSession.MarkerTopic).Distinct(StringComparer.Ordinal);
        return [.. topics.Select(t => new MqttTopicFilterBuilder()
            .WithTopic(t)
            .WithAtLeastOnceQoS()
            .WithRetainHandling(MqttRetainHandling.SendAtSubscribeIfNewSubscriptionOnly)
            .Build())];
    }

    private async Task PublishAsync(IMqttClient client, OutgoingMessage message, CancellationToken cancellationToken)
    {
        using var within = CancellationTokenSource.CreateLinkedTokenSource(cancellationToken);
        using var timeout = new CancellationTokenSource(AnswerWithin, clock);
        await using CancellationTokenRegistration expiry = timeout.Token.Register(within.Cancel);
        MqttClientPublishResult result;
        try
        {
            result = await client.PublishAsync(message.ToMqtt([]), within.Token);
        }
        catch (OperationCanceledException e) when (!cancellationToken.IsCancellationRequested)
        {
            throw new TimeoutException($"The broker did not acknowledge {message.Topic} within {AnswerWithin.TotalSeconds:0} s.", e);
        }

        if (!result.IsSuccess)
            LogRefused(broker.Host, message.Topic, result.ReasonCode);
    }

    private async Task FarewellAsync(IMqttClient client)
    {
        using var within = new CancellationTokenSource(TimeSpan.FromSeconds(2), clock);
        try
        {
            await client.PublishAsync(announcer.Offline.ToMqtt([]), within.Token);
            await client.DisconnectAsync(new MqttClientDisconnectOptions(), within.Token);
        }
#pragma warning disable CA1031 // The service stops; when the farewell does not get through, the broker speaks the will.
        catch (Exception e)
#pragma warning restore CA1031
        {
            LogNoFarewell(e, broker.Host);
        }
    }

    private async Task WaitAsync(TimeSpan pause, CancellationToken stoppingToken)
    {
        try
        {
            await Task.Delay(pause, clock, stoppingToken);
        }
        catch (OperationCanceledException)
        {
            // The loop looks at the token next.
            return;
        }
    }

    private void Found()
    {
        state = new ConnectionState(true, clock.GetUtcNow(), "");
        settings.ReportTrouble(TroubleKey, null);
        LogFound(broker.Host, broker.Port);
    }

    private void Lost(string why)
    {
        DateTimeOffset since = state.IsConnected || state.Reason.Length == 0 ? clock.GetUtcNow() : state.Since;
        state = new ConnectionState(false, since, why);
        settings.ReportTrouble(TroubleKey, $"No connection to the MQTT broker {broker.Host}:{broker.Port} since {since.UtcDateTime:yyyy-MM-dd HH:mm} UTC: {why.TrimEnd('.')}. Readings sent there wait, or are lost, depending on that broker; it is tried again every minute.");
    }

    [LoggerMessage(EventId = 3021, Level = LogLevel.Warning, Message = "The connection to the MQTT broker {Host}:{Port} ended; it is tried again")]
    private partial void LogConnectionEnded(Exception exception, string host, int port);

    [LoggerMessage(EventId = 3022, Level = LogLevel.Information, Message = "Connected to the MQTT broker {Host}:{Port}")]
    private partial void LogFound(string host, int port);

    [LoggerMessage(EventId = 3023, Level = LogLevel.Warning, Message = "The MQTT broker {Host} refuses what the service publishes to {Topic}: {ReasonCode}")]
    private partial void LogRefused(string host, string topic, MqttClientPublishReasonCode reasonCode);

    [LoggerMessage(EventId = 3024, Level = LogLevel.Warning, Message = "The MQTT broker {Host} did not take the farewell; it will speak the will instead")]
    private partial void LogNoFarewell(Exception exception, string host);
}
