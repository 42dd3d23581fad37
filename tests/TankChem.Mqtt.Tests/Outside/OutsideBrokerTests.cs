using System.Threading.Channels;
using MQTTnet;
using TankChem.Monitoring.Configuration;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;
using TankChem.Mqtt.Tests.Doubles;

namespace TankChem.Mqtt.Tests.Outside;

public sealed class OutsideBrokerTests
{
    private const string Ph = "tankchem/in/hollow-weir/tank-1/ph";

    [Fact]
    public async Task Publish_OutsideWhileConnected_IsLive()
    {
        await using Mosquitto broker = await Mosquitto.StartAsync();
        var troubles = new Troubles();
        await using BrokerHost host = await troubles.StartAsync(broker.Port);
        await troubles.NextAsync(null);

        Assert.Equal(0, await Mosquitto.PublishAsync(broker.Port, "-t", Ph, "-m", "7.24"));

        Offer offer = await host.Intake.NextAsync();
        Assert.Equal(7.24, offer.Reading.RawValue);
        Assert.Equal(ReadingOrigin.Live, offer.Arrival.Origin);
    }

    [Fact]
    public async Task Publish_RetainedBeforehand_IsRetained()
    {
        await using Mosquitto broker = await Mosquitto.StartAsync();
        Assert.Equal(0, await Mosquitto.PublishAsync(broker.Port, "-t", Ph, "-m", "7.24", "-r"));
        Assert.Equal(0, await Mosquitto.PublishAsync(broker.Port, "-t", "tankchem/cmd/hollow-weir/tank-1/alarm/co2-high", "-m", """{"action":"acknowledge","who":"M. Ruiz"}""", "-r"));
        var troubles = new Troubles();
        await using BrokerHost host = await troubles.StartAsync(broker.Port);

        Offer[] offers = [await host.Intake.NextAsync(), await host.Intake.NextAsync()];

        Assert.All(offers, o => Assert.Equal(ReadingOrigin.Retained, o.Arrival.Origin));
        Assert.Equal(7.24, Assert.Single(offers, o => o.Arrival.Unreadable is null).Reading.RawValue);
        Assert.Contains("not carried out", Assert.Single(offers, o => o.Arrival.Unreadable is not null).Reason, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Broker_RestartedWithUnacknowledgedMessages_TheyComeAgainAsBacklog()
    {
        await using Mosquitto broker = await Mosquitto.StartAsync();
        var troubles = new Troubles();
        await using BrokerHost host = await troubles.StartAsync(broker.Port);
        await troubles.NextAsync(null);
        host.Intake.CommitsAtOnce = false;
        var first = new List<Offer>();
        for (int i = 0; i < 5; i++)
        {
            Assert.Equal(0, await Mosquitto.PublishAsync(broker.Port, "-t", Ph, "-m", $"7.{i}"));
            first.Add(await host.Intake.NextAsync());
        }

        await broker.StopAsync();
        Assert.Contains($"127.0.0.1:{broker.Port}", await troubles.NextAsync("No connection"), StringComparison.Ordinal);

        // On disk only now: the acknowledgements are those of a connection that is gone, and must not go out on the next one.
        foreach (Offer offer in first)
            offer.OnDisk.SetResult();
        host.Intake.CommitsAtOnce = true;
        await broker.StartAgainAsync();

        for (int i = 0; i < 5; i++)
        {
            Offer again = await host.Intake.NextAsync();
            Assert.Equal(first[i].Reading.RawValue, again.Reading.RawValue);
            Assert.Equal(ReadingOrigin.Backlog, again.Arrival.Origin);
        }

        await troubles.NextAsync(null);
        await LiveAgainAsync(broker, host);
    }

    [Fact]
    public async Task Service_AwayWhileOthersPublish_GetsTheBacklogOnce()
    {
        await using Mosquitto broker = await Mosquitto.StartAsync();
        var troubles = new Troubles();
        await using (BrokerHost before = await troubles.StartAsync(broker.Port))
        {
            await troubles.NextAsync(null);
            await before.StopAsync();
        }

        for (int i = 0; i < 60; i++)
            Assert.Equal(0, await Mosquitto.PublishAsync(broker.Port, "-t", Ph, "-m", $"{i}"));
        await using BrokerHost host = await troubles.StartAsync(broker.Port);
        for (int i = 0; i < 60; i++)
        {
            Offer offer = await host.Intake.NextAsync();
            Assert.Equal(i, offer.Reading.RawValue);
            Assert.Equal(ReadingOrigin.Backlog, offer.Arrival.Origin);
        }

        await troubles.NextAsync(null);
        await LiveAgainAsync(broker, host);
    }

    [Fact]
    public async Task Commit_Fails_TheMessageComesAgain()
    {
        await using Mosquitto broker = await Mosquitto.StartAsync();
        var troubles = new Troubles();
        await using BrokerHost host = await troubles.StartAsync(broker.Port);
        await troubles.NextAsync(null);
        host.Intake.CommitsAtOnce = false;
        Assert.Equal(0, await Mosquitto.PublishAsync(broker.Port, "-t", Ph, "-m", "7.24"));
        Offer first = await host.Intake.NextAsync();
        host.Intake.CommitsAtOnce = true;

        first.OnDisk.SetException(new InvalidOperationException("The store is gone."));

        Assert.Contains("The store is gone", await troubles.NextAsync("No connection"), StringComparison.Ordinal);
        Assert.Equal(7.24, (await host.Intake.NextAsync()).Reading.RawValue);
    }

    [Fact]
    public async Task Announce_GoesToTheOutsideBrokerToo()
    {
        await using Mosquitto broker = await Mosquitto.StartAsync();
        var troubles = new Troubles();
        await using BrokerHost host = await troubles.StartAsync(broker.Port, new FakeFarm { Places = [FakeFarm.Tank("scape", true)] });
        await troubles.NextAsync(null);
        await using TestClient valve = await TestClient.ConnectAsync(broker.Port, id: "valve");
        await valve.SubscribeAsync("tankchem/out/hollow-weir/scape/permit/co2");
        Assert.Equal("stop", (await valve.NextAsync()).ConvertPayloadToString());
        await valve.SubscribeAsync("tankchem/out/hollow-weir/tank-1/water");
        host.Announcer.Announce(FakeFarm.Water("tank-1", WaterStatus.Ok));
        Assert.Contains("\"status\":\"ok\"", (await valve.NextAsync()).ConvertPayloadToString(), StringComparison.Ordinal);

        await valve.SubscribeAsync("tankchem/out/service");
        Assert.Equal("online", (await valve.NextAsync()).ConvertPayloadToString());
        await host.StopAsync();
        Assert.Equal("offline", (await valve.NextAsync()).ConvertPayloadToString());
    }

    /// <summary>After the backlog new messages are live; the marker may still be on its way when the first is sent.</summary>
    private static async Task LiveAgainAsync(Mosquitto broker, BrokerHost host)
    {
        Offer offer;
        do
        {
            Assert.Equal(0, await Mosquitto.PublishAsync(broker.Port, "-t", Ph, "-m", "6.9"));
            offer = await host.Intake.NextAsync();
        }
        while (offer.Arrival.Origin == ReadingOrigin.Backlog);
        Assert.Equal(ReadingOrigin.Live, offer.Arrival.Origin);
    }

    /// <summary>What the room says of its connection, in order.</summary>
    private sealed class Troubles
    {
        private readonly Channel<string?> told = Channel.CreateUnbounded<string?>();

        public Task<BrokerHost> StartAsync(int port, FakeFarm? farm = null) =>
            BrokerHost.StartAsync(new MqttSettings { Outside = new OutsideBrokerOptions { Host = "127.0.0.1", Port = port }, ReportTrouble = (_, sentence) => told.Writer.TryWrite(sentence) }, farm ?? new FakeFarm());

        /// <summary>Waits for the next sentence of this beginning; null is that all is well.</summary>
        public async Task<string?> NextAsync(string? beginning)
        {
            while (true)
            {
                string? sentence = await told.Reader.ReadAsync(TestClient.Stop).AsTask().WaitAsync(Wait.Long, TestClient.Stop);
                if (beginning is null ? sentence is null : sentence?.StartsWith(beginning, StringComparison.Ordinal) == true)
                    return sentence;
            }
        }
    }
}
