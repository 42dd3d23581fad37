using System.Diagnostics;
using TankChem.TestKit;

namespace TankChem.EndToEnd.Tests.Processes;

/// <summary>The Debian package's broker and client: MQTT that we did not write.</summary>
internal sealed class Mosquitto : IDisposable
{
    private static int clients;
    private readonly TemporaryFolder folder = new();
    private readonly Process process;

    public Mosquitto()
    {
        Port = FreePort.Next();
        string config = folder.File("mosquitto.conf");
        File.WriteAllText(config, $"listener {Port} 127.0.0.1\nallow_anonymous true\n");
        process = Process.Start(new ProcessStartInfo(File.Exists("/usr/sbin/mosquitto") ? "/usr/sbin/mosquitto" : "mosquitto", ["-c", config]) { UseShellExecute = false, RedirectStandardError = true, RedirectStandardOutput = true })!;
    }

    /// <summary>Its port.</summary>
    public int Port { get; }

    /// <summary>Publishes one message with QoS 1 and waits for its acknowledgement.</summary>
    public static async Task PublishAsync(int port, string topic, string payload)
    {
        ProgramRun run = await ProgramRun.RunAsync("mosquitto_pub", "", "-h", "127.0.0.1", "-p", $"{port}", "-q", "1", "-i", $"probe-{Interlocked.Increment(ref clients)}", "-t", topic, "-m", payload);
        Assert.True(run.ExitCode == 0, run.Error);
    }

    public void Dispose()
    {
        process.Kill();
        process.WaitForExit();
        process.Dispose();
        folder.Dispose();
    }
}
