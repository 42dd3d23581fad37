using System.Net;
using TankChem.Monitoring.Configuration;
using TankChem.Service.CommandLine;
using TankChem.Service.Demo;
using TankChem.Simulation.Demo;

namespace TankChem.Service.Hosting;

/// <summary>What the command line and the configuration file come to.</summary>
internal sealed record ServiceSettings
{
    private const string DefaultHttp = "http://127.0.0.1:5080";

    /// <summary>Whether the invented site runs.</summary>
    public required bool IsDemo { get; init; }

    /// <summary>The folder that everything is written to, absolute.</summary>
    public required string DataFolder { get; init; }

    /// <summary>Sites, brokers, mappings.</summary>
    public required ServiceConfiguration Configuration { get; init; }

    /// <summary>Address of the dashboard and the API; loopback.</summary>
    public required Uri Http { get; init; }

    /// <summary>What is doubtful in the configuration.</summary>
    public IReadOnlyList<ConfigurationNote> Warnings { get; init; } = [];

    /// <summary>The simulated site of a demo; null otherwise.</summary>
    public DemoScenario? Demo { get; init; }

    /// <summary>Settings of <c>demo</c>.</summary>
    public static ServiceSettings ForDemo(string? data, string? http, int? mqttPort)
    {
        DemoScenario scenario = DemoServices.Scenario(TimeProvider.System);
        return new ServiceSettings
        {
            IsDemo = true,
            Demo = scenario,
            DataFolder = Path.GetFullPath(data ?? "tankchem-data"),
            Http = Loopback(http ?? DefaultHttp, "--http"),
            Configuration = new ServiceConfiguration { Sites = [DemoSetup.Site(scenario)], EmbeddedBroker = new EmbeddedBrokerOptions { Port = mqttPort ?? 1883 } },
        };
    }

    /// <summary>Settings of <c>run</c>.</summary>
    public static ServiceSettings ForRun(FileInfo? config, string? data, string? http, int? mqttPort)
    {
        ServiceConfiguration configuration = new();
        IReadOnlyList<ConfigurationNote> warnings = [];
        if (config is not null)
        {
            ConfigurationResult result = ReadConfiguration(config);
            if (result.Configuration is null)
                throw new UsageException([.. result.Faults.Select(f => $"{config.FullName}: {f.Path}: {f.Text}")]);
            configuration = result.Configuration;
            warnings = result.Warnings;
        }

        if (mqttPort is { } port)
            configuration = configuration with { EmbeddedBroker = (configuration.EmbeddedBroker ?? new EmbeddedBrokerOptions()) with { Port = port } };
        return new ServiceSettings
        {
            IsDemo = false,
            DataFolder = Path.GetFullPath(data ?? DefaultDataFolder()),
            Http = Loopback(http ?? configuration.HttpUrl, http is null ? "http.url" : "--http"),
            Configuration = configuration,
            Warnings = warnings,
        };
    }

    /// <summary>Reads a configuration file.</summary>
    public static ConfigurationResult ReadConfiguration(FileInfo file)
    {
        try
        {
            return ConfigurationReader.Read(File.ReadAllText(file.FullName));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new UsageException($"The configuration {file.FullName} cannot be read: {e.Message}");
        }
    }

    private static string DefaultDataFolder()
    {
        // systemd sets it for a unit with StateDirectory=.
        if (Environment.GetEnvironmentVariable("STATE_DIRECTORY") is { Length: > 0 } state)
            return state;
        string shared = Environment.GetFolderPath(OperatingSystem.IsLinux() ? Environment.SpecialFolder.LocalApplicationData : Environment.SpecialFolder.CommonApplicationData);
        return OperatingSystem.IsLinux() && Environment.IsPrivilegedProcess
            ? "/var/lib/tankchem"
            : Path.Combine(shared.Length > 0 ? shared : ".", "tankchem");
    }

    private static Uri Loopback(string text, string where)
    {
        if (!Uri.TryCreate(text, UriKind.Absolute, out Uri? uri) || uri.Scheme != Uri.UriSchemeHttp || uri.AbsolutePath != "/")
            throw new UsageException($"{where}: \"{text}\" is no address to listen on; right would be {DefaultHttp}.");
        bool loopback = uri.Host == "localhost" || (IPAddress.TryParse(uri.Host.Trim('[', ']'), out IPAddress? address) && IPAddress.IsLoopback(address));
        if (!loopback)
        {
            throw new UsageException(
                $"{where}: {text} would be reachable from other machines, and there is no sign-in yet: anybody on the network could acknowledge alarms. Listen on 127.0.0.1, localhost or [::1].");
        }

        return uri;
    }
}
