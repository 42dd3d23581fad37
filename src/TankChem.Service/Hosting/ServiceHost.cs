using Microsoft.Extensions.Logging.Console;
using Prometheus;
using TankChem.Dashboard;
using TankChem.Monitoring.Configuration;
using TankChem.Monitoring.Ports;
using TankChem.Mqtt;
using TankChem.Mqtt.Broker;
using TankChem.Service.CommandLine;
using TankChem.Service.Demo;
using TankChem.Service.Http;
using TankChem.Service.Pipeline;
using TankChem.Storage;

namespace TankChem.Service.Hosting;

/// <summary>Puts the rooms together and runs them.</summary>
internal static class ServiceHost
{
    private const int IntakeMessagesMax = 20_000;

    public static async Task<int> RunAsync(ServiceSettings settings, CancellationToken cancellationToken)
    {
        DataFolder.EnsureWritable(settings.DataFolder);
        Listener.EnsureFree(settings.Http.Host, settings.Http.Port, "The dashboard", "--http");
        if (settings.Configuration.EmbeddedBroker is { Port: > 0 } broker)
            Listener.EnsureFree(broker.Bind, broker.Port, "The MQTT broker", "--mqtt-port");
        using SqliteStore store = OpenStore(settings);
        await using WebApplication app = Build(settings, store, TimeProvider.System);
        foreach (ConfigurationNote warning in settings.Warnings)
            app.Logger.LogWarning("{Path}: {Warning}", warning.Path, warning.Text);
        if (settings.IsDemo)
            app.Services.GetRequiredService<DemoHistory>().WriteOnce();
        try
        {
            await app.StartAsync(cancellationToken);
        }
        catch (IOException e)
        {
            throw new RunFailedException($"A port cannot be used: {e.Message}; --http and --mqtt-port take others.", e);
        }

        await Console.Out.WriteLineAsync($"TankChem is ready{(settings.IsDemo ? " (demo: invented site, simulated water)" : "")}: dashboard {settings.Http.GetLeftPart(UriPartial.Authority)}, {MqttText(settings, app.Services)}, data in {settings.DataFolder}");
        await app.WaitForShutdownAsync(cancellationToken);
        return Environment.ExitCode;
    }

    /// <summary>The application, not started.</summary>
    public static WebApplication Build(ServiceSettings settings, SqliteStore store, TimeProvider clock)
    {
        WebApplicationBuilder builder = WebApplication.CreateBuilder(new WebApplicationOptions
        {
            ContentRootPath = AppContext.BaseDirectory,
            ApplicationName = typeof(ServiceHost).Assembly.GetName().Name,
        });
        builder.WebHost.UseStaticWebAssets();
        builder.Host.UseSystemd();
        builder.Logging.ClearProviders();
        builder.Logging.AddSimpleConsole(o => o.SingleLine = true);
        builder.Services.Configure<ConsoleLoggerOptions>(o => o.LogToStandardErrorThreshold = LogLevel.Trace);
        builder.Logging.AddFilter("Microsoft", LogLevel.Warning);
        builder.WebHost.ConfigureKestrel(kestrel =>
        {
            foreach (var address in Listener.Addresses(settings.Http.Host))
                kestrel.Listen(address, settings.Http.Port);
            kestrel.ListenTankChemMqtt();
        });

        AddPipeline(builder.Services, settings, store, clock);
        builder.Services.AddOpenApi("v1");
        builder.Services.AddProblemDetails();
        builder.Services.AddTankChemDashboard();
        if (settings.IsDemo)
            DemoServices.Add(builder.Services);

        WebApplication app = builder.Build();
        app.UseExceptionHandler();
        app.UseMiddleware<OwnOriginMiddleware>();
        app.UseAntiforgery();
        app.MapTankChemApi();
        app.MapOpenApi("/openapi/{documentName}.json");
        app.MapMetrics(registry: app.Services.GetRequiredService<CollectorRegistry>());
        app.MapTankChemDashboard();
        return app;
    }

    private static void AddPipeline(IServiceCollection services, ServiceSettings settings, SqliteStore store, TimeProvider clock)
    {
        var farm = new Farm(clock, settings.IsDemo);
        services.AddSingleton(clock);
        services.AddSingleton(settings);
        services.AddSingleton(farm);
        services.AddSingleton<IFarm>(farm);
        services.AddSingleton(store.Journal);
        services.AddSingleton(store.History);
        services.AddSingleton(store.Recovery);
        services.AddSingleton(_ => Metrics.NewCustomRegistry());
        services.AddSingleton<IMetricFactory>(p => Metrics.WithCustomRegistry(p.GetRequiredService<CollectorRegistry>()));
        services.AddSingleton(p =>
        {
            ServiceMetrics.Add(p.GetRequiredService<CollectorRegistry>(), p.GetRequiredService<IMetricFactory>(), farm, p.GetRequiredService<MqttCounters>());
            return new PipelineMetrics(p.GetRequiredService<IMetricFactory>());
        });
        services.AddSingleton(_ => new IntakeBuffer(IntakeMessagesMax));
        services.AddSingleton<IReadingIntake>(p => p.GetRequiredService<IntakeBuffer>());
        services.AddSingleton(p => new FarmEngine(settings.Configuration.Sites, store.Recovery, farm, p.GetRequiredService<IAnnouncer>(), p.GetRequiredService<ILogger<FarmEngine>>()));
        services.AddSingleton(p => new FarmPipeline(
            p.GetRequiredService<FarmEngine>(), store.Journal, p.GetRequiredService<IntakeBuffer>(), farm, clock, p.GetRequiredService<PipelineMetrics>(), p.GetRequiredService<ILogger<FarmPipeline>>()));
        services.AddSingleton(_ => DoseLedger.Load(store.History, clock.GetUtcNow()));
        services.AddSingleton<IOperations>(p => new Operations(p.GetRequiredService<FarmPipeline>(), farm, store.History, store.Recovery, p.GetRequiredService<DoseLedger>()));

        // Stopped in reverse: the brokers stop taking before the writer writes the rest and ends.
        services.AddHostedService<PipelineService>();
        services.AddTankChemMqtt(new MqttSettings
        {
            Embedded = settings.Configuration.EmbeddedBroker,
            Outside = settings.Configuration.OutsideBroker,
            Mappings = settings.Configuration.Mappings,
            IsDemo = settings.IsDemo,
            ReportTrouble = farm.SetTrouble,
        });
    }

    private static SqliteStore OpenStore(ServiceSettings settings)
    {
        try
        {
            return SqliteStore.Open(Path.Combine(settings.DataFolder, settings.Configuration.SqliteFile));
        }
        catch (StoreOpenException e)
        {
            throw new RunFailedException(e.Message, e);
        }
    }

    private static string MqttText(ServiceSettings settings, IServiceProvider services)
    {
        List<string> brokers = [];
        if (settings.Configuration.EmbeddedBroker is { } embedded)
            brokers.Add($"MQTT {embedded.Bind}:{services.GetRequiredService<EmbeddedBroker>().Port}");
        if (settings.Configuration.OutsideBroker is { } outside)
            brokers.Add($"outside broker {outside.Host}:{outside.Port}");
        return brokers.Count == 0 ? "no MQTT" : string.Join(", ", brokers);
    }
}
