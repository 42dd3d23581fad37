using System.Text;
using System.Threading.Channels;
using MQTTnet;
using MQTTnet.Formatter;
using MQTTnet.Protocol;

namespace TankChem.Mqtt.Tests.Doubles;

/// <summary>A real MQTT client over TCP.</summary>
public sealed class TestClient : IAsyncDisposable
{
    private readonly IMqttClient client;
    private readonly Channel<MqttApplicationMessage> received = Channel.CreateUnbounded<MqttApplicationMessage>();
    private readonly TaskCompletionSource disconnected = new(TaskCreationOptions.RunContinuationsAsynchronously);

    private TestClient(IMqttClient client) => this.client = client;

    public static CancellationToken Stop => TestContext.Current.CancellationToken;

    public string? AssignedId { get; private set; }

    public Task Disconnected => disconnected.Task.WaitAsync(Wait.Long, Stop);

    public static async Task<TestClient> ConnectAsync(int port, MqttProtocolVersion version = MqttProtocolVersion.V311, string? id = "probe-1")
    {
        IMqttClient inner = new MqttClientFactory().CreateMqttClient();
        var test = new TestClient(inner);
        inner.ApplicationMessageReceivedAsync += e =>
        {
            test.received.Writer.TryWrite(e.ApplicationMessage);
            return Task.CompletedTask;
        };
        inner.DisconnectedAsync += _ =>
        {
            test.disconnected.TrySetResult();
            return Task.CompletedTask;
        };
        MqttClientOptions options = new MqttClientOptionsBuilder().WithTcpServer("127.0.0.1", port).WithProtocolVersion(version).WithClientId(id ?? "").WithTimeout(Wait.Long).Build();
        MqttClientConnectResult result = await inner.ConnectAsync(options, Stop);
        test.AssignedId = result.AssignedClientIdentifier;
        return test;
    }

    public Task<MqttClientPublishResult> PublishAsync(string topic, string payload, int qos = 1) => PublishAsync(topic, Encoding.UTF8.GetBytes(payload), qos);

    public Task<MqttClientPublishResult> PublishAsync(string topic, byte[] payload, int qos = 1, bool retain = false, string? contentType = null)
    {
        MqttApplicationMessageBuilder message = new MqttApplicationMessageBuilder().WithTopic(topic).WithPayload(payload).WithQualityOfServiceLevel((MqttQualityOfServiceLevel)qos).WithRetainFlag(retain);
        if (contentType is not null)
            message.WithContentType(contentType);
        return client.PublishAsync(message.Build(), Stop);
    }

    public Task SubscribeAsync(string filter) => client.SubscribeAsync(filter, MqttQualityOfServiceLevel.AtLeastOnce, Stop);

    public async Task<MqttApplicationMessage> NextAsync() => await received.Reader.ReadAsync(Stop).AsTask().WaitAsync(Wait.Long, Stop);

    public async ValueTask DisposeAsync()
    {
        await client.TryDisconnectAsync();
        client.Dispose();
    }
}
