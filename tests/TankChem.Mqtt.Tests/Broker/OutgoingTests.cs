using System.Text.Json;
using MQTTnet;
using MQTTnet.Formatter;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Configuration;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Water;
using TankChem.Mqtt.Tests.Doubles;

namespace TankChem.Mqtt.Tests.Broker;

public sealed class OutgoingTests
{
    private static readonly MqttSettings Settings = new() { Embedded = new EmbeddedBrokerOptions { Port = 0 } };

    [Fact]
    public async Task Start_PlaceWithCo2_ItsValveIsToldToStop()
    {
        var farm = new FakeFarm { Places = [FakeFarm.Tank("scape", true), FakeFarm.Tank("tank-1", false)] };
        await using BrokerHost host = await BrokerHost.StartAsync(Settings, farm);
        await using TestClient valve = await TestClient.ConnectAsync(host.Port, id: "valve");

        await valve.SubscribeAsync("tankchem/out/+/+/permit/co2");

        MqttApplicationMessage permit = await valve.NextAsync();
        Assert.Equal("tankchem/out/hollow-weir/scape/permit/co2", permit.Topic);
        Assert.Equal("stop", permit.ConvertPayloadToString());
    }

    [Fact]
    public async Task Start_AndStop_TheServiceSaysSo()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient client = await TestClient.ConnectAsync(host.Port);
        await client.SubscribeAsync("tankchem/out/service");
        Assert.Equal("online", (await client.NextAsync()).ConvertPayloadToString());

        await host.StopAsync();

        Assert.Equal("offline", (await client.NextAsync()).ConvertPayloadToString());
    }

    [Fact]
    public async Task Announce_Water_IsRetainedAsTheBodyOverHttp()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient client = await TestClient.ConnectAsync(host.Port, MqttProtocolVersion.V500);
        await client.SubscribeAsync("tankchem/out/hollow-weir/tank-1/water");

        host.Announcer.Announce(FakeFarm.Water("tank-1", WaterStatus.Partial));
        MqttApplicationMessage live = await client.NextAsync();
        await using TestClient later = await TestClient.ConnectAsync(host.Port, id: "later");
        await later.SubscribeAsync("tankchem/out/hollow-weir/tank-1/water");

        MqttApplicationMessage kept = await later.NextAsync();
        Assert.True(kept.Retain);
        Assert.Equal("application/json", live.ContentType);
        Assert.Equal(live.ConvertPayloadToString(), kept.ConvertPayloadToString());
        using JsonDocument body = JsonDocument.Parse(live.ConvertPayloadToString());
        Assert.Equal("partial", body.RootElement.GetProperty("status").GetString());
        Assert.False(body.RootElement.TryGetProperty("demo", out _));
    }

    [Fact]
    public async Task Announce_InADemo_EveryMessageSaysSo()
    {
        await using BrokerHost host = await BrokerHost.StartAsync(Settings with { IsDemo = true }, new FakeFarm());
        await using TestClient client = await TestClient.ConnectAsync(host.Port, MqttProtocolVersion.V500);
        await client.SubscribeAsync("tankchem/out/#");
        MqttApplicationMessage online = await client.NextAsync();
        host.Announcer.Announce(FakeFarm.Water("tank-1", WaterStatus.Ok));
        MqttApplicationMessage water = await client.NextAsync();

        Assert.Equal("online", online.ConvertPayloadToString());
        Assert.All([online, water], m => Assert.Equal("demo", Assert.Single(m.UserProperties).Name));
        using JsonDocument body = JsonDocument.Parse(water.ConvertPayloadToString());
        Assert.True(body.RootElement.GetProperty("demo").GetBoolean());
    }

    [Fact]
    public async Task Announce_Alarm_IsRetainedUnderItsRule()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient client = await TestClient.ConnectAsync(host.Port);
        var alarm = new AlarmView
        {
            Key = new AlarmKey(new PlaceKey("hollow-weir", "tank-1"), "co2-high"),
            PlaceName = "Grow-out 1",
            Title = "CO2 high",
            Quantity = "co2",
            Priority = AlarmPriority.High,
            State = AlarmState.Normal with { Phase = AlarmPhase.Unacknowledged },
            Sentence = "CO2 is 22 mg/L, above 15 mg/L.",
            FirstAction = "Gas off, more air.",
            Consequence = "Stock is lost.",
        };
        host.Announcer.Announce(alarm);
        host.Announcer.Announce(alarm with { State = AlarmState.Normal with { Phase = AlarmPhase.Acknowledged } });

        await client.SubscribeAsync("tankchem/out/hollow-weir/tank-1/alarm/co2-high");
        string state;
        do
        {
            using JsonDocument body = JsonDocument.Parse((await client.NextAsync()).ConvertPayloadToString());
            state = body.RootElement.GetProperty("state").GetString()!;
        }
        while (state == "unacknowledged");
        Assert.Equal("acknowledged", state);
    }

    [Fact]
    public async Task Announce_AThousandTimes_CoalescesToTheNewest()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient client = await TestClient.ConnectAsync(host.Port);
        await client.SubscribeAsync("tankchem/out/hollow-weir/tank-1/water");
        for (int i = 0; i < 1_000; i++)
            host.Announcer.Announce(FakeFarm.Water("tank-1", WaterStatus.Partial) with { Reason = $"{i}" });

        string? reason;
        int messages = 0;
        do
        {
            using JsonDocument body = JsonDocument.Parse((await client.NextAsync()).ConvertPayloadToString());
            reason = body.RootElement.GetProperty("reason").GetString();
            messages++;
        }
        while (reason != "999");
        Assert.InRange(messages, 1, 100);
    }
}
