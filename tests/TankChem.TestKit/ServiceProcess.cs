using System.Diagnostics;
using System.Text;

namespace TankChem.TestKit;

/// <summary>The real service as a process of its own, on free ports.</summary>
public sealed class ServiceProcess : IAsyncDisposable
{
    private static readonly TimeSpan StartLongest = TimeSpan.FromSeconds(240);
    private readonly Process process;
    private readonly StringBuilder log = new();
    private readonly TaskCompletionSource ready = new(TaskCreationOptions.RunContinuationsAsynchronously);

    private ServiceProcess(Process process, int httpPort, int mqttPort)
    {
        this.process = process;
        HttpPort = httpPort;
        MqttPort = mqttPort;
        Http = new HttpClient { BaseAddress = new Uri($"http://127.0.0.1:{httpPort}"), Timeout = TimeSpan.FromSeconds(30) };
    }

    /// <summary>Port of dashboard and API.</summary>
    public int HttpPort { get; }

    /// <summary>Port of the embedded broker.</summary>
    public int MqttPort { get; }

    /// <summary>A client of its API.</summary>
    public HttpClient Http { get; }

    /// <summary>What it has written so far.</summary>
    public string Log
    {
        get
        {
            lock (log)
                return log.ToString();
        }
    }

    /// <summary>Starts it and waits until it says that it is ready.</summary>
    /// <param name="verb"><c>run</c> or <c>demo</c>.</param>
    /// <param name="dataFolder">Its data folder.</param>
    /// <param name="more">More arguments.</param>
    public static async Task<ServiceProcess> StartAsync(string verb, string dataFolder, params string[] more)
    {
        int http = FreePort.Next();
        int mqtt = FreePort.Next();
        var start = new ProcessStartInfo("dotnet", [Repository.ServiceAssembly, verb, "--data", dataFolder, "--http", $"http://127.0.0.1:{http}", "--mqtt-port", $"{mqtt}", .. more])
        {
            UseShellExecute = false,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        };
        var service = new ServiceProcess(new Process { StartInfo = start, EnableRaisingEvents = true }, http, mqtt);
        service.process.OutputDataReceived += (_, e) => service.Take(e.Data);
        service.process.ErrorDataReceived += (_, e) => service.Take(e.Data);
        service.process.Exited += (_, _) => service.ready.TrySetException(new InvalidOperationException($"The service ended: {service.Log}"));
        service.process.Start();
        service.process.BeginOutputReadLine();
        service.process.BeginErrorReadLine();
        try
        {
            await service.ready.Task.WaitAsync(StartLongest);
        }
        catch
        {
            await service.DisposeAsync();
            throw;
        }

        return service;
    }

    /// <summary>Takes the power away: SIGKILL, no time to finish anything.</summary>
    public async Task KillAsync()
    {
        process.Kill(true);
        await process.WaitForExitAsync();
    }

    /// <inheritdoc/>
    public async ValueTask DisposeAsync()
    {
        Http.Dispose();
        if (!process.HasExited)
            await KillAsync();
        process.Dispose();
    }

    private void Take(string? line)
    {
        if (line is null)
            return;
        lock (log)
            log.AppendLine(line);
        if (line.StartsWith("TankChem is ready", StringComparison.Ordinal))
            ready.TrySetResult();
    }
}
