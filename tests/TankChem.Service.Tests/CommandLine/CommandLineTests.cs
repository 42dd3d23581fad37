using System.Net;
using System.Net.Sockets;
using TankChem.TestKit;

namespace TankChem.Service.Tests.CommandLine;

public sealed class CommandLineTests : IDisposable
{
    private const string Head = "temperature_c,salinity,ph,alkalinity_umol_kg\n";
    private readonly TemporaryFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Theory]
    [InlineData("--help")]
    [InlineData("demo", "--help")]
    [InlineData("run", "--help")]
    [InlineData("solve", "--help")]
    [InlineData("check-config", "--help")]
    public async Task Help_EachVerb_IsDone(params string[] arguments)
    {
        ProgramRun run = await ProgramRun.TankChemAsync("", arguments);

        Assert.Equal((0, ""), (run.ExitCode, run.Error));
        Assert.Contains("Usage", run.Output, StringComparison.OrdinalIgnoreCase);
    }

    [Theory]
    [InlineData("swim")]
    [InlineData("run", "--fast")]
    [InlineData("solve", "--input", "-")]
    [InlineData("run", "--mqtt-port", "70000")]
    [InlineData("run", "--http", "http://0.0.0.0:5080")]
    [InlineData("run", "--http", "five thousand")]
    [InlineData("run", "--config", "no-such-file.json")]
    [InlineData("check-config", "no-such-file.json")]
    public async Task WrongUse_IsToldInWordsAndExits2(params string[] arguments)
    {
        ProgramRun run = await ProgramRun.TankChemAsync("", arguments);

        Assert.Equal(2, run.ExitCode);
        Assert.NotEmpty(run.Error);
        Assert.DoesNotContain("   at ", run.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_PortInUse_NamesThePortAndTheOption()
    {
        using var listener = new TcpListener(IPAddress.Loopback, 0);
        listener.Start();
        int taken = ((IPEndPoint)listener.LocalEndpoint).Port;

        ProgramRun http = await ProgramRun.TankChemAsync("", "run", "--data", folder.FullName, "--http", $"http://127.0.0.1:{taken}", "--mqtt-port", $"{FreePort.Next()}");
        ProgramRun mqtt = await ProgramRun.TankChemAsync("", "run", "--data", folder.FullName, "--http", $"http://127.0.0.1:{FreePort.Next()}", "--mqtt-port", $"{taken}");

        Assert.Equal(1, http.ExitCode);
        Assert.Contains($"port {taken}", http.Error, StringComparison.Ordinal);
        Assert.Contains("--http", http.Error, StringComparison.Ordinal);
        Assert.Equal(1, mqtt.ExitCode);
        Assert.Contains("--mqtt-port", mqtt.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_DataFolderIsAFile_IsOneClearLine()
    {
        File.WriteAllText(folder.File("data"), "not a folder");

        ProgramRun run = await ProgramRun.TankChemAsync("", "run", "--data", folder.File("data"), "--http", $"http://127.0.0.1:{FreePort.Next()}", "--mqtt-port", $"{FreePort.Next()}");

        Assert.Equal(1, run.ExitCode);
        Assert.Contains("--data", Assert.Single(run.Error.Trim().Split('\n')), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_StoreIsNoDatabase_SaysSoAndLeavesIt()
    {
        File.WriteAllText(folder.File("tankchem.db"), new string('x', 8_192));

        ProgramRun run = await ProgramRun.TankChemAsync("", "run", "--data", folder.FullName, "--http", $"http://127.0.0.1:{FreePort.Next()}", "--mqtt-port", $"{FreePort.Next()}");

        Assert.Equal(1, run.ExitCode);
        Assert.Contains("not a TankChem store", run.Error, StringComparison.Ordinal);
        Assert.Equal(8_192, new FileInfo(folder.File("tankchem.db")).Length);
    }

    [Fact]
    public async Task CheckConfig_FaultsAndWarnings_EachWithItsPath()
    {
        File.WriteAllText(folder.File("bad.json"), """{ "sites": [ { "id": "a", "tanks": [ { "id": "t", "volume": "much" } ] } ], "htp": {} }""");
        File.WriteAllText(folder.File("good.json"), """{ "sites": [ { "id": "a", "tanks": [ { "id": "t", "volume": "9 m3" } ] } ] }""");

        ProgramRun bad = await ProgramRun.TankChemAsync("", "check-config", folder.File("bad.json"));
        ProgramRun good = await ProgramRun.TankChemAsync("", "check-config", folder.File("good.json"));

        Assert.Equal(2, bad.ExitCode);
        Assert.Contains("$.sites[0].tanks[0].volume", bad.Error, StringComparison.Ordinal);
        Assert.Contains("$.htp", bad.Error, StringComparison.Ordinal);
        Assert.Equal(0, good.ExitCode);
        Assert.Contains("warning: $.sites[0].tanks[0]", good.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Solve_StandardStreams_ExitsByWhatWasSolved()
    {
        ProgramRun all = await ProgramRun.TankChemAsync(Head + "15,0,7.2,2000\n", "solve", "--input", "-", "--output", "-");
        ProgramRun some = await ProgramRun.TankChemAsync(Head + "15,0,7.2,2000\n15,0,cold,2000\n", "solve", "--input", "-", "--output", "-");
        ProgramRun none = await ProgramRun.TankChemAsync("temperature_c,ph\n15,7\n", "solve", "--input", "-", "--output", "-");

        Assert.Equal((0, 1, 2), (all.ExitCode, some.ExitCode, none.ExitCode));
        Assert.Equal(3, some.Output.TrimEnd().Split('\n').Length);
    }

    [Fact]
    public async Task Solve_Files_WritesTheAnswer()
    {
        File.WriteAllText(folder.File("in.csv"), Head + "25,35,8.1,2300\n");

        ProgramRun run = await ProgramRun.TankChemAsync("", "solve", "--input", folder.File("in.csv"), "--output", folder.File("out.csv"));

        Assert.Equal(0, run.ExitCode);
        Assert.Contains("co2_mg_l", File.ReadAllText(folder.File("out.csv")), StringComparison.Ordinal);
    }
}
