using System.Diagnostics;
using System.Globalization;
using TankChem.Monitoring.Readings;
using TankChem.TestKit;
using static TankChem.Storage.Tests.StoreFixture;

namespace TankChem.Storage.Tests;

public sealed class KillTests : IDisposable
{
    private const int Kills = 3;

    private readonly TemporaryFolder folder = new();

    private string File => folder.File("tankchem.db");

    public void Dispose() => folder.Dispose();

    [Fact]
    public async Task Kill_WhileWriting_KeepsEveryCommitThatReturnedAndNoHalfOne()
    {
        for (int kill = 0, reported = 0; kill < Kills; kill++)
        {
            int before = reported;
            reported = await WriteUntilKilledAsync(reported, reported + 20 + (kill * 7));
            Assert.True(reported > before);

            using SqliteStore store = SqliteStore.Open(File);
            DateTimeOffset end = Noon.AddDays(1);
            IReadOnlyList<Reading> readings = await store.History.ReadingsAsync(Tank, "ph", Noon, end, null, int.MaxValue, CancellationToken.None);
            int stored = (await store.History.AlarmJournalAsync(Tank, Noon, end, CancellationToken.None)).Count;
            // The batch under way may be there without having been reported; then all of it is.
            Assert.InRange(stored, reported, reported + 1);
            Assert.Equal(Enumerable.Range(0, stored * CommitWriter.ReadingsPerBatch).Select(i => (double)i), readings.Select(r => r.RawValue));
            Assert.Equal(stored, (await store.History.StateValuesAsync(Tank, Noon, end, CancellationToken.None)).Count);
            StoreInfo info = store.Info();
            Assert.Equal((stored * CommitWriter.ReadingsPerBatch, stored), (info.UsableReadings, info.StateValues));
            reported = stored;
        }
    }

    private async Task<int> WriteUntilKilledAsync(int first, int killAt)
    {
        var start = new ProcessStartInfo(Environment.ProcessPath!) { RedirectStandardOutput = true, UseShellExecute = false };
        start.Environment[CommitWriter.StoreVariable] = File;
        start.Environment[CommitWriter.FirstVariable] = first.ToString(CultureInfo.InvariantCulture);
        using Process writer = Process.Start(start)!;
        int reported = first;
        while (await writer.StandardOutput.ReadLineAsync() is { } line)
        {
            reported = int.Parse(line, CultureInfo.InvariantCulture);
            if (reported != killAt)
                continue;
            Assert.Contains("in use", Assert.Throws<StoreOpenException>(() => SqliteStore.Open(File)).Message, StringComparison.Ordinal);
            writer.Kill();
        }

        await writer.WaitForExitAsync();
        Assert.True(reported >= killAt, $"The writer ended by itself after {reported} commits with status {writer.ExitCode}.");
        return reported;
    }
}
