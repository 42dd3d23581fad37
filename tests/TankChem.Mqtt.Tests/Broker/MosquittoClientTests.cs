using TankChem.Mqtt.Tests.Doubles;

namespace TankChem.Mqtt.Tests.Broker;

/// <summary>The embedded broker as another program's client sees it.</summary>
public sealed class MosquittoClientTests
{
    [Theory]
    [InlineData("311")]
    [InlineData("5")]
    public async Task MosquittoPub_PlainNumber_ArrivesAndIsAcknowledged(string version)
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        int status = await Mosquitto.PublishAsync(host.Port, "-V", version, "-i", "probe-1", "-t", "tankchem/in/hollow-weir/tank-1/ph", "-m", "7.24");
        Assert.Equal(0, status);
        Assert.Equal(7.24, (await host.Intake.NextAsync()).Reading.RawValue);
    }

    [Fact]
    public async Task MosquittoPub_ContentType_IsHonoured()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        int status = await Mosquitto.PublishAsync(
            host.Port, "-V", "5", "-i", "probe-1", "-t", "tankchem/in/hollow-weir/tank-1", "-m", """[{"n":"ph","v":7.24},{"n":"temperature","v":13.5}]""", "-D", "publish", "content-type", "application/senml+json");
        Assert.Equal(0, status);
        Assert.Equal([7.24, 13.5], (await host.Intake.NextAsync()).Arrival.Readings.Select(r => r.RawValue));
    }

    [Fact]
    public async Task MosquittoPub_CommitFails_KnowsThatItDid()
    {
        await using BrokerHost host = await BrokerHost.StartAsync();
        host.Intake.CommitsAtOnce = false;
        Task<int> publish = Mosquitto.PublishAsync(host.Port, "-i", "probe-1", "-t", "tankchem/in/hollow-weir/tank-1/ph", "-m", "7.24");
        Offer first = await host.Intake.NextAsync();
        first.OnDisk.SetException(new InvalidOperationException("The store is gone."));

        Assert.NotEqual(0, await publish);
    }
}
