using System.ComponentModel;
using System.Diagnostics;
using TankChem.TestKit;

namespace TankChem.Mqtt.Tests.Doubles;

/// <summary>A real mosquitto on a free port of loopback, which keeps its sessions on disk over a restart.</summary>
public sealed class Mosquitto : IAsyncDisposable
{
    private readonly TemporaryFolder folder = new();
    private Process? process;

    public int Port { get; } = FreePort.Next();

    public static async Task<Mosquitto> StartAsync()
    {
        var broker = new Mosquitto();
        await File.WriteAllTextAsync(
            broker.folder.File("mosquitto.conf"),
            $"listener {broker.Port} 127.0.0.1\nallow_anonymous true\npersistence true\npersistence_location {broker.folder.FullName}/\nlog_dest stderr\nlog_type all\n" + (Environment.IsPrivilegedProcess ? "user root\n" : ""),
            TestContext.Current.CancellationToken);
        try
        {
            await broker.StartAgainAsync();
            return broker;
        }
        catch
        {
            await broker.DisposeAsync();
            throw;
        }
    }

    public async Task StartAgainAsync()
    {
        process = Start("mosquitto", ["-c", folder.File("mosquitto.conf")]);
        while (await process.StandardError.ReadLineAsync(TestContext.Current.CancellationToken).AsTask().WaitAsync(Wait.Long, TestContext.Current.CancellationToken) is { } line)
        {
            if (line.EndsWith("running", StringComparison.Ordinal))
            {
                // What it goes on saying is read away, so that it never waits for a reader.
                _ = process.StandardError.ReadToEndAsync(CancellationToken.None);
                return;
            }
        }

        throw new InvalidOperationException("mosquitto did not start.");
    }

    /// <summary>Ends it in an orderly way: it writes its sessions down.</summary>
    public async Task StopAsync()
    {
        using Process kill = Start("kill", ["-TERM", $"{process!.Id}"]);
        await process.WaitForExitAsync(TestContext.Current.CancellationToken).WaitAsync(Wait.Long, TestContext.Current.CancellationToken);
        process.Dispose();
        process = null;
    }

    /// <summary>Runs <c>mosquitto_pub</c> against a port to its end.</summary>
    /// <returns>Its exit status.</returns>
    public static async Task<int> PublishAsync(int port, params string[] arguments)
    {
        using Process publisher = Start("mosquitto_pub", ["-h", "127.0.0.1", "-p", $"{port}", "-q", "1", .. arguments]);
        await publisher.WaitForExitAsync(TestContext.Current.CancellationToken).WaitAsync(Wait.Long, TestContext.Current.CancellationToken);
        return publisher.ExitCode;
    }

    public async ValueTask DisposeAsync()
    {
        if (process is not null)
        {
            process.Kill();
            await process.WaitForExitAsync();
            process.Dispose();
        }

        folder.Dispose();
    }

    private static Process Start(string program, string[] arguments)
    {
        var start = new ProcessStartInfo(program, arguments) { RedirectStandardError = true, UseShellExecute = false };
        start.Environment["PATH"] += ":/usr/sbin:/sbin";
        string? path = start.Environment["PATH"]!.Split(':').Select(f => Path.Combine(f, program)).FirstOrDefault(File.Exists);
        start.FileName = path ?? throw new Win32Exception($"{program} is missing: on Debian or Ubuntu, apt-get install mosquitto mosquitto-clients.");
        return Process.Start(start)!;
    }
}
