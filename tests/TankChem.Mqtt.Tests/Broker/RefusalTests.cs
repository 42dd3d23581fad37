using System.Net;
using System.Net.Sockets;
using MQTTnet;
using MQTTnet.Formatter;
using TankChem.Monitoring.Configuration;
using TankChem.Mqtt.Broker;
using TankChem.Mqtt.Tests.Doubles;

namespace TankChem.Mqtt.Tests.Broker;

public sealed class RefusalTests
{
    private const string Permit = "tankchem/out/hollow-weir/scape/permit/co2";

    [Fact]
    public async Task Publish_UnderOutVersion5_IsNotAuthorisedAndKept()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient listener = await TestClient.ConnectAsync(host.Port, id: "valve");
        await listener.SubscribeAsync(Permit);
        await using TestClient client = await TestClient.ConnectAsync(host.Port, MqttProtocolVersion.V500);

        MqttClientPublishResult result = await client.PublishAsync(Permit, "allow");

        Assert.Equal(MqttClientPublishReasonCode.NotAuthorized, result.ReasonCode);
        Assert.Contains("only the service speaks", (await host.Intake.NextAsync()).Reason, StringComparison.Ordinal);
        Assert.Equal(1, host.Counters.Refused);
        await AssertNothingPassedAsync(client, listener);
    }

    [Fact]
    public async Task Publish_UnderOutVersion311_IsAcknowledgedDroppedAndKept()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient listener = await TestClient.ConnectAsync(host.Port, id: "valve");
        await listener.SubscribeAsync(Permit);
        await using TestClient client = await TestClient.ConnectAsync(host.Port);

        await client.PublishAsync(Permit, "allow"u8.ToArray(), retain: true);

        Offer offer = await host.Intake.NextAsync();
        Assert.Equal(Permit, offer.Arrival.Unreadable!.Topic);
        Assert.Equal("probe-1", offer.Arrival.Unreadable.Client);
        await AssertNothingPassedAsync(client, listener);
    }

    [Theory]
    [InlineData("tankchem/in/Hollow-Weir/tank-1/ph", "level 3, <site>")]
    [InlineData("tankchem/in/hollow-weir//ph", "level 4, <place>, is empty")]
    [InlineData("TANKCHEM/in/hollow-weir/tank-1/ph", "capitals")]
    [InlineData("$SYS/uptime", "begins with $")]
    [InlineData("home/kitchen", "no mapping")]
    [InlineData("tankchem/answer/hollow-weir/tank-1/dose/7", "no order")]
    public async Task Publish_ToAWrongTopic_IsAcknowledgedAndKeptWithItsReason(string topic, string reason)
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient client = await TestClient.ConnectAsync(host.Port);

        await client.PublishAsync(topic, "7.24");

        Offer offer = await host.Intake.NextAsync();
        Assert.Contains(reason, offer.Reason, StringComparison.Ordinal);
        Assert.Equal("7.24"u8.ToArray(), offer.Arrival.Unreadable!.Head.ToArray());
        Assert.Equal(1, host.Counters.Unreadable);
    }

    [Theory]
    [InlineData("tankchem/in/+/tank-1/ph", "wildcard")]
    [InlineData("tankchem/in/a\0b/tank-1/ph", "control character U+0000")]
    [InlineData("tankchem/in/a\u0080b/tank-1/ph", "control character U+0080")]
    public async Task Publish_TopicThatNoGoodClientSends_IsKeptWithItsReason(string topic, string reason)
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await RawAcknowledgedAsync(host.Port, System.Text.Encoding.UTF8.GetBytes(topic));
        Assert.Contains(reason, (await host.Intake.NextAsync()).Reason, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Publish_TopicOfInvalidUtf8_IsKeptWithItsReason()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await RawAcknowledgedAsync(host.Port, [(byte)'a', 0xc3, 0x28, (byte)'b']);
        Assert.Contains("not UTF-8", (await host.Intake.NextAsync()).Reason, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Publish_PacketAtTheLimit_IsAcknowledgedAndItsHeadKept()
    {
        const string topic = "tankchem/in/hollow-weir/tank-1/ph";
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient client = await TestClient.ConnectAsync(host.Port);

        // Fixed header 1 + 3, topic 2 + its length, packet identifier 2.
        byte[] payload = new byte[EmbeddedBroker.PacketBytesMax - 4 - 2 - topic.Length - 2];
        payload.AsSpan().Fill((byte)'9');
        await client.PublishAsync(topic, payload);

        Offer offer = await host.Intake.NextAsync();
        Assert.Equal(payload.Length, offer.Arrival.Unreadable!.Length);
        Assert.Equal(4096, offer.Arrival.Unreadable.Head.Length);
    }

    [Theory]
    [InlineData(EmbeddedBroker.PacketBytesMax)]
    [InlineData(10_000_000)]
    public async Task Publish_PacketOverTheLimit_ClosesTheConnectionAndIsNoted(int length)
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient client = await TestClient.ConnectAsync(host.Port);

        await Assert.ThrowsAnyAsync<Exception>(() => client.PublishAsync("tankchem/in/hollow-weir/tank-1/ph", new byte[length]));

        await client.Disconnected;
        Offer offer = await host.Intake.NextAsync();
        Assert.Contains("over the limit", offer.Reason, StringComparison.Ordinal);
        Assert.Equal("tankchem/in/hollow-weir/tank-1/ph", offer.Arrival.Unreadable!.Topic);
        Assert.Equal("probe-1", offer.Arrival.Unreadable.Client);
        Assert.Equal(1, host.Counters.Oversized);
    }

    [Fact]
    public async Task Connect_Version5WithoutAnId_GetsOne()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient client = await TestClient.ConnectAsync(host.Port, MqttProtocolVersion.V500, null);
        Assert.StartsWith("assigned-", client.AssignedId, StringComparison.Ordinal);
        await client.PublishAsync("tankchem/in/hollow-weir/tank-1/ph", "7.24");
        Assert.Equal(7.24, (await host.Intake.NextAsync()).Reading.RawValue);
    }

    [Fact]
    public async Task Connect_OneTooMany_IsRefused()
    {
        await using BrokerHost host = await BrokerHost.StartAsync(new MqttSettings { Embedded = new EmbeddedBrokerOptions { Port = 0 }, ClientsMax = 1 }, new FakeFarm());
        await using TestClient first = await TestClient.ConnectAsync(host.Port, id: "first");
        await Assert.ThrowsAnyAsync<Exception>(async () =>
        {
            await using TestClient second = await TestClient.ConnectAsync(host.Port, id: "second");
            await second.PublishAsync("tankchem/in/hollow-weir/tank-1/ph", "7.24");
        });
        await first.PublishAsync("tankchem/in/hollow-weir/tank-1/ph", "7.25");
        Assert.Equal(7.25, (await host.Intake.NextAsync()).Reading.RawValue);
        Assert.Equal(1, host.Counters.ConnectionsRefused);
    }

    [Fact]
    public async Task Start_AddressOfOtherMachines_IsRefused()
    {
        InvalidOperationException e = await Assert.ThrowsAsync<InvalidOperationException>(() =>
            BrokerHost.StartAsync(new MqttSettings { Embedded = new EmbeddedBrokerOptions { Port = 0, Bind = "0.0.0.0" } }, new FakeFarm()));
        Assert.Contains("mqtt.embedded.bind: 0.0.0.0", e.Message, StringComparison.Ordinal);
    }

    private static async Task AssertNothingPassedAsync(TestClient sender, TestClient listener)
    {
        await listener.SubscribeAsync("tankchem/in/#");
        await sender.PublishAsync("tankchem/in/hollow-weir/tank-1/ph", "7.24");
        Assert.Equal("tankchem/in/hollow-weir/tank-1/ph", (await listener.NextAsync()).Topic);
    }

    /// <summary>Sends a QoS 1 message of any topic bytes over a bare socket, MQTT 3.1.1, and waits for its PUBACK.</summary>
    private static async Task RawAcknowledgedAsync(int port, byte[] topic)
    {
        using var tcp = new TcpClient();
        await tcp.ConnectAsync(IPAddress.Loopback, port, TestClient.Stop);
        NetworkStream stream = tcp.GetStream();
        await stream.WriteAsync(new byte[] { 0x10, 13, 0, 4, (byte)'M', (byte)'Q', (byte)'T', (byte)'T', 4, 2, 0, 0, 0, 1, (byte)'r' }, TestClient.Stop);
        byte[] answer = new byte[4];
        await stream.ReadExactlyAsync(answer, TestClient.Stop).AsTask().WaitAsync(Wait.Long, TestClient.Stop);
        Assert.Equal([0x20, 2, 0, 0], answer);
        await stream.WriteAsync((byte[])[0x32, (byte)(2 + topic.Length + 2 + 1), 0, (byte)topic.Length, .. topic, 0, 9, (byte)'7'], TestClient.Stop);
        await stream.ReadExactlyAsync(answer, TestClient.Stop).AsTask().WaitAsync(Wait.Long, TestClient.Stop);
        Assert.Equal([0x40, 2, 0, 9], answer);
    }
}
