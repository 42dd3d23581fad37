using System.Globalization;
using System.Runtime.CompilerServices;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Ports;
using static TankChem.Storage.Tests.StoreFixture;

namespace TankChem.Storage.Tests;

/// <summary>What this program does when a test starts it again to be killed: commit batch after batch and say so after each.</summary>
internal static class CommitWriter
{
    public const string StoreVariable = "TANKCHEM_TEST_WRITES_TO";
    public const string FirstVariable = "TANKCHEM_TEST_FIRST_BATCH";
    public const int ReadingsPerBatch = 25;

    /// <summary>Before the test runner begins; without the variable this is a test run like any other.</summary>
    [ModuleInitializer]
    public static void RunWhenAsked()
    {
        if (Environment.GetEnvironmentVariable(StoreVariable) is not { Length: > 0 } path)
            return;
        using SqliteStore store = SqliteStore.Open(path);
        for (int batch = int.Parse(Environment.GetEnvironmentVariable(FirstVariable)!, CultureInfo.InvariantCulture); ; batch++)
        {
            store.Journal.Commit(Batch(batch));
            Console.Out.WriteLine((batch + 1).ToString(CultureInfo.InvariantCulture));
            Console.Out.Flush();
        }
    }

    private static JournalBatch Batch(int batch) => new()
    {
        Readings = [.. Enumerable.Range(batch * ReadingsPerBatch, ReadingsPerBatch).Select(i => Reading(Noon.AddSeconds(i), i))],
        States = [State(Noon.AddSeconds(batch * ReadingsPerBatch), batch)],
        AlarmEntries =
        [
            new AlarmJournalEntry { Key = new AlarmKey(Tank, "co2-high"), At = Noon.AddSeconds(batch), Change = AlarmChange.Raised, Priority = AlarmPriority.High, Title = "CO2 high", Sentence = "CO2 is high" },
        ],
    };
}
