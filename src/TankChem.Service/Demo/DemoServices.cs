using TankChem.Monitoring.Ports;
using TankChem.Service.Hosting;
using TankChem.Service.Pipeline;
using TankChem.Simulation.Demo;

namespace TankChem.Service.Demo;

/// <summary>What runs only in a demo.</summary>
internal static class DemoServices
{
    /// <summary>Any seed gives a site; this one is the one of the documentation's pictures.</summary>
    private const int Seed = 1879;

    /// <summary>The scenario that ends now.</summary>
    public static DemoScenario Scenario(TimeProvider clock) => DemoSite.Create(clock.GetUtcNow(), Seed);

    public static void Add(IServiceCollection services)
    {
        services.AddSingleton(p => p.GetRequiredService<ServiceSettings>().Demo ?? throw new InvalidOperationException("A demo needs its scenario in the settings."));
        services.AddSingleton(p => new DemoHistory(
            p.GetRequiredService<DemoScenario>(), p.GetRequiredService<FarmEngine>(), p.GetRequiredService<IJournal>(), p.GetRequiredService<IRecovery>(), p.GetRequiredService<ILogger<DemoHistory>>()));
        services.AddHostedService<DemoPublisher>();
    }
}
