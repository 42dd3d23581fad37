using TankChem.Monitoring.Configuration;
using TankChem.Monitoring.Ports;
using TankChem.Mqtt.Broker;
using TankChem.Mqtt.Outgoing;

namespace TankChem.Mqtt.Tests.Doubles;

/// <summary>The MQTT room in a host of its own, its embedded broker on a free port.</summary>
public sealed class BrokerHost : IAsyncDisposable
{
    private readonly WebApplication application;

    private BrokerHost(WebApplication application) => this.application = application;

    public FakeIntake Intake => (FakeIntake)application.Services.GetRequiredService<IReadingIntake>();

    public FakeOperations Operations => (FakeOperations)application.Services.GetRequiredService<IOperations>();

    public MqttCounters Counters => application.Services.GetRequiredService<MqttCounters>();

    public Announcer Announcer => application.Services.GetRequiredService<Announcer>();

    public int Port => application.Services.GetRequiredService<EmbeddedBroker>().Port;

    public static Task<BrokerHost> StartAsync() => StartAsync(new MqttSettings { Embedded = new EmbeddedBrokerOptions { Port = 0 } }, new FakeFarm());

    public static async Task<BrokerHost> StartAsync(MqttSettings settings, FakeFarm farm)
    {
        WebApplicationBuilder builder = WebApplication.CreateEmptyBuilder(new WebApplicationOptions());
        builder.Logging.SetMinimumLevel(LogLevel.None);
        builder.Services.AddSingleton(TimeProvider.System);
        builder.Services.AddSingleton<IReadingIntake, FakeIntake>();
        builder.Services.AddSingleton<IOperations, FakeOperations>();
        builder.Services.AddSingleton<IFarm>(farm);
        builder.Services.AddTankChemMqtt(settings);
        builder.WebHost.UseKestrelCore().ConfigureKestrel(kestrel => kestrel.ListenTankChemMqtt());
        WebApplication host = builder.Build();
        await host.StartAsync(TestContext.Current.CancellationToken);
        return new BrokerHost(host);
    }

    public Task StopAsync() => application.StopAsync(TestContext.Current.CancellationToken);

    public async ValueTask DisposeAsync() => await application.DisposeAsync();
}
