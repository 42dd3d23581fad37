using MQTTnet;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Ports;
using TankChem.Mqtt.Tests.Doubles;

namespace TankChem.Mqtt.Tests.Broker;

public sealed class CommandTests
{
    private const string Topic = "tankchem/cmd/hollow-weir/tank-1/alarm/co2-high";

    [Fact]
    public async Task Command_UntilDone_IsNotAcknowledged()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient client = await TestClient.ConnectAsync(host.Port);

        Task<MqttClientPublishResult> publish = client.PublishAsync(Topic, """{"action":"acknowledge","who":"M. Ruiz","reason":"degasser restarted"}""");
        (AlarmCommand command, TaskCompletionSource<OperationResult> result) = await host.Operations.NextAsync();
        Assert.False(publish.IsCompleted);
        result.SetResult(OperationResult.Success);
        await publish.WaitAsync(Wait.Long, TestClient.Stop);

        Assert.Equal(AlarmAction.Acknowledge, command.Action);
        Assert.Equal("co2-high", command.Key.Rule);
        Assert.Equal("tank-1", command.Key.Place.Place);
        Assert.Equal("M. Ruiz", command.Who);
        Assert.False(host.Intake.HasMore);
    }

    [Fact]
    public async Task Command_Refused_IsAcknowledgedAndKeptWithTheReason()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient client = await TestClient.ConnectAsync(host.Port);

        Task<MqttClientPublishResult> publish = client.PublishAsync(Topic, """{"action":"reset","who":"M. Ruiz"}""");
        (_, TaskCompletionSource<OperationResult> result) = await host.Operations.NextAsync();
        result.SetResult(new OperationResult(false, "the condition still holds"));
        await publish.WaitAsync(Wait.Long, TestClient.Stop);

        Assert.Equal("command refused: the condition still holds", (await host.Intake.NextAsync()).Reason);
    }

    [Theory]
    [InlineData("""{"action":"acknowledge"}""", "who")]
    [InlineData("""{"action":"shout","who":"M. Ruiz"}""", "action")]
    [InlineData("""{"action":"acknowledge","action":"shelve","who":"M. Ruiz"}""", "twice")]
    [InlineData("acknowledge", "JSON")]
    [InlineData("", "")]
    public async Task Command_Unreadable_IsAcknowledgedAndKeptWithTheReason(string payload, string reason)
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient client = await TestClient.ConnectAsync(host.Port);

        await client.PublishAsync(Topic, payload).WaitAsync(Wait.Long, TestClient.Stop);

        Assert.Contains(reason, (await host.Intake.NextAsync()).Reason, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Command_ItsStoreFails_ClosesTheConnectionUnacknowledged()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        await using TestClient client = await TestClient.ConnectAsync(host.Port);

        Task<MqttClientPublishResult> publish = client.PublishAsync(Topic, """{"action":"acknowledge","who":"M. Ruiz"}""");
        (_, TaskCompletionSource<OperationResult> result) = await host.Operations.NextAsync();
        result.SetException(new InvalidOperationException("The store is gone."));

        await client.Disconnected;
        await Assert.ThrowsAnyAsync<Exception>(() => publish);
    }
}
