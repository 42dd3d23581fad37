using MQTTnet;
using MQTTnet.Formatter;
using TankChem.Monitoring.Readings;
using TankChem.Mqtt.Tests.Doubles;

namespace TankChem.Mqtt.Tests.Broker;

public sealed class AcknowledgementTests
{
    private const string Topic = "tankchem/in/hollow-weir/tank-1/ph";

    [Theory]
    [InlineData(MqttProtocolVersion.V311, 1)]
    [InlineData(MqttProtocolVersion.V500, 1)]
    [InlineData(MqttProtocolVersion.V311, 2)]
    [InlineData(MqttProtocolVersion.V500, 2)]
    public async Task Publish_UntilOnDisk_IsNotAcknowledged(MqttProtocolVersion version, int qos)
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        host.Intake.CommitsAtOnce = false;
        await using TestClient client = await TestClient.ConnectAsync(host.Port, version);

        Task<MqttClientPublishResult> publish = client.PublishAsync(Topic, "7.24", qos);
        Offer offer = await host.Intake.NextAsync();
        Assert.False(publish.IsCompleted);
        offer.OnDisk.SetResult();
        await publish.WaitAsync(Wait.Long, TestClient.Stop);

        Assert.Equal(7.24, offer.Reading.RawValue);
        Assert.Equal(ReadingOrigin.Live, offer.Arrival.Origin);
    }

    [Fact]
    public async Task Publish_SecondOnDiskBeforeFirst_FirstHoldsBoth()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        host.Intake.CommitsAtOnce = false;
        await using TestClient client = await TestClient.ConnectAsync(host.Port);

        Task<MqttClientPublishResult> first = client.PublishAsync(Topic, "7.1");
        Offer firstOffer = await host.Intake.NextAsync();
        Task<MqttClientPublishResult> second = client.PublishAsync(Topic, "7.2");
        Offer secondOffer = await host.Intake.NextAsync();
        secondOffer.OnDisk.SetResult();
        Assert.False(first.IsCompleted);
        firstOffer.OnDisk.SetResult();

        await Task.WhenAll(first, second).WaitAsync(Wait.Long, TestClient.Stop);
    }

    [Theory]
    [InlineData(MqttProtocolVersion.V311)]
    [InlineData(MqttProtocolVersion.V500)]
    public async Task Publish_CommitFails_ClosesTheConnectionUnacknowledged(MqttProtocolVersion version)
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        host.Intake.CommitsAtOnce = false;
        await using TestClient client = await TestClient.ConnectAsync(host.Port, version);

        Task<MqttClientPublishResult> publish = client.PublishAsync(Topic, "7.24");
        Offer offer = await host.Intake.NextAsync();
        offer.OnDisk.SetException(new OperationCanceledException("The service stopped."));

        await client.Disconnected;
        await Assert.ThrowsAnyAsync<Exception>(() => publish);
        Assert.Equal(1, host.Counters.CommitFailures);
    }

    [Fact]
    public async Task Publish_OneClientWaitsForTheDisk_OthersAreServed()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        host.Intake.CommitsAtOnce = false;
        await using TestClient held = await TestClient.ConnectAsync(host.Port, id: "held");
        _ = held.PublishAsync(Topic, "7.1");
        await host.Intake.NextAsync();
        host.Intake.CommitsAtOnce = true;

        await using TestClient other = await TestClient.ConnectAsync(host.Port, id: "other");
        await other.PublishAsync(Topic, "7.2").WaitAsync(Wait.Long, TestClient.Stop);
    }

    [Fact]
    public async Task Publish_WithRetain_IsLiveAndNotKeptForLaterSubscribers()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient client = await TestClient.ConnectAsync(host.Port);
        await client.PublishAsync(Topic, "7.24"u8.ToArray(), retain: true);
        Assert.Equal(ReadingOrigin.Live, (await host.Intake.NextAsync()).Arrival.Origin);

        await using TestClient later = await TestClient.ConnectAsync(host.Port, id: "later");
        await later.SubscribeAsync(Topic);
        await client.PublishAsync(Topic, "7.25");
        Assert.Equal("7.25", (await later.NextAsync()).ConvertPayloadToString());
    }

    [Fact]
    public async Task Publish_FiftyClients_EveryMessageArrivesOnce()
    {
        const int clients = 50, messages = 20;
        await using BrokerHost host = await BrokerHost.StartAsync();
        await Task.WhenAll(Enumerable.Range(0, clients).Select(async c =>
        {
            await using TestClient client = await TestClient.ConnectAsync(host.Port, c % 2 == 0 ? MqttProtocolVersion.V311 : MqttProtocolVersion.V500, $"probe-{c}");
            for (int m = 0; m < messages; m++)
                await client.PublishAsync($"tankchem/in/hollow-weir/tank-{c}/ph", $"{m}");
        }));

        var seen = new HashSet<(string, double)>();
        for (int i = 0; i < clients * messages; i++)
        {
            ParsedReading reading = (await host.Intake.NextAsync()).Reading;
            Assert.True(seen.Add((reading.Series.Place.Place, reading.RawValue)));
        }

        Assert.False(host.Intake.HasMore);
        Assert.Equal(clients * messages, host.Counters.Taken);
    }
}
