using System.Text.Json;
using Microsoft.Data.Sqlite;
using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Infrastructure;
using Microsoft.EntityFrameworkCore.Migrations;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Storage.Model;
using TankChem.TestKit;
using static TankChem.Storage.Tests.StoreFixture;

namespace TankChem.Storage.Tests;

public sealed class OpeningTests : IDisposable
{
    private readonly TemporaryFolder folder = new();

    private string File => folder.File("tankchem.db");

    public void Dispose() => folder.Dispose();

    [Fact]
    public void Open_FileThatIsNoStore_SaysSoAndLeavesItAsItIs()
    {
        byte[] letter = [.. Enumerable.Repeat("Dear keeper of the fish, "u8.ToArray(), 200).SelectMany(b => b)];
        System.IO.File.WriteAllBytes(File, letter);

        StoreOpenException e = Assert.Throws<StoreOpenException>(() => SqliteStore.Open(File));

        Assert.Contains("not a TankChem store", e.Message, StringComparison.Ordinal);
        Assert.Equal(letter, System.IO.File.ReadAllBytes(File));
    }

    [Fact]
    public void Open_StoreOfANewerVersion_NamesBothAndChangesNothing()
    {
        SqliteStore.Open(File).Dispose();
        Execute("INSERT INTO __EFMigrationsHistory (MigrationId, ProductVersion) VALUES ('29990101000000_Later', '99')");
        byte[] before = System.IO.File.ReadAllBytes(File);

        StoreOpenException e = Assert.Throws<StoreOpenException>(() => SqliteStore.Open(File));

        Assert.Contains("29990101000000_Later", e.Message, StringComparison.Ordinal);
        Assert.Contains($"this version ends with {Migrations()[^1]}", e.Message, StringComparison.Ordinal);
        Assert.Equal(before, System.IO.File.ReadAllBytes(File));
    }

    [Fact]
    public void Open_DatabaseOfAnotherProgram_IsRefusedAndUnchanged()
    {
        Execute("CREATE TABLE customers (id INTEGER PRIMARY KEY, name TEXT); INSERT INTO customers VALUES (1, 'Ada')");
        byte[] before = System.IO.File.ReadAllBytes(File);

        StoreOpenException e = Assert.Throws<StoreOpenException>(() => SqliteStore.Open(File));

        Assert.Contains("another program", e.Message, StringComparison.Ordinal);
        Assert.Contains("customers", e.Message, StringComparison.Ordinal);
        Assert.Equal(before, System.IO.File.ReadAllBytes(File));
    }

    [Fact]
    public void Open_DamagedStore_SaysSoAndOverwritesNothing()
    {
        SqliteStore.Open(File).Dispose();
        byte[] damaged = System.IO.File.ReadAllBytes(File);
        damaged.AsSpan(100, 4_000).Fill(0xA5);
        System.IO.File.WriteAllBytes(File, damaged);

        StoreOpenException e = Assert.Throws<StoreOpenException>(() => SqliteStore.Open(File));

        Assert.Contains("damaged", e.Message, StringComparison.Ordinal);
        Assert.Equal(damaged, System.IO.File.ReadAllBytes(File));
    }

    [Fact]
    public void Open_EmptyFile_BecomesAStore()
    {
        System.IO.File.WriteAllBytes(File, []);

        using SqliteStore store = SqliteStore.Open(File);

        Assert.Equal(0, store.Info().Series);
    }

    [Fact]
    public void Open_FolderThatIsAFile_SaysThatItCannotBeWrittenTo()
    {
        string file = folder.File("plain.txt");
        System.IO.File.WriteAllText(file, "text");

        StoreOpenException e = Assert.Throws<StoreOpenException>(() => SqliteStore.Open(Path.Combine(file, "tankchem.db")));

        Assert.Contains($"{file} cannot be written to", e.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Open_FolderThatIsNotThere_IsMade()
    {
        using SqliteStore store = SqliteStore.Open(Path.Combine(folder.FullName, "a", "b", "tankchem.db"));

        Assert.True(System.IO.File.Exists(store.FullPath));
    }

    [Fact]
    public async Task Open_AfterAKillWhileMigrating_DoesNotWaitForTheDeadOne()
    {
        using (var connection = new SqliteConnection($"Data Source={File};Pooling=false"))
        using (StoreContext context = SqliteConnections.Context(connection))
            context.GetService<IMigrator>().Migrate(Migrations()[0]);

        // What the migration's lock looks like when its holder was killed.
        Execute("""CREATE TABLE IF NOT EXISTS "__EFMigrationsLock" ("Id" INTEGER NOT NULL PRIMARY KEY, "Timestamp" TEXT NOT NULL); INSERT INTO "__EFMigrationsLock" VALUES (1, '2026-05-01')""");

        using SqliteStore store = await Task.Run(() => SqliteStore.Open(File)).WaitAsync(TimeSpan.FromSeconds(30));

        Assert.Equal(0, store.Info().Series);
    }

    [Fact]
    public async Task Open_StoreFromBeforeRollups_IsBroughtUpToDateWithItsHistory()
    {
        using (var connection = new SqliteConnection($"Data Source={File};Pooling=false"))
        using (StoreContext context = SqliteConnections.Context(connection))
            context.GetService<IMigrator>().Migrate(Migrations()[0]);
        Execute($"""
            INSERT INTO series VALUES (1, 'north-quay', 'tank-1', 'ph', 'main');
            INSERT INTO state_series VALUES (1, 'north-quay', 'tank-1', 'co2');
            WITH RECURSIVE n(i) AS (SELECT 0 UNION ALL SELECT i + 1 FROM n WHERE i < 4319)
            INSERT INTO reading SELECT 1, {RowMapping.Ms(Noon)} + i * 600000, 0, i, NULL, i, CASE WHEN i % 7 = 0 THEN 3 ELSE 1 END, NULL, 1 FROM n;
            INSERT INTO state_value SELECT 1, time_ms, value * 2, NULL FROM reading;
            INSERT INTO place VALUES ('north-quay', 'tank-1', '{JsonSerializer.Serialize(new PlaceDefinition { Key = Tank, Kind = PlaceKind.Tank, Name = "Grow-out 1" })}');
            """);

        using SqliteStore store = SqliteStore.Open(File);

        // 30 days of a value each ten minutes, every seventh of them suspect.
        IReadOnlyList<TrendBucket> days = await store.History.TrendAsync(Tank, "ph", Noon, Noon.AddDays(30), 30, CancellationToken.None);
        Assert.Equal(4320 - 618, days.Sum(d => d.Count));
        Assert.Equal(Enumerable.Range(0, 144).Where(i => i % 7 != 0).Average(), days[0].Mean, 1e-9);
        TrendBucket all = Assert.Single(await store.History.TrendAsync(Tank, "co2", Noon, Noon.AddDays(30), 1, CancellationToken.None));
        Assert.Equal((0.0, 4319.0, 8638.0, 4320L), (all.Min, all.Mean, all.Max, all.Count));
        Assert.Equal("Grow-out 1", Assert.Single(store.Recovery.LoadPlaces()).Name);
    }

    [Fact]
    public void Open_StoreThatAnotherServiceHas_IsRefused()
    {
        using SqliteStore first = SqliteStore.Open(File);

        StoreOpenException e = Assert.Throws<StoreOpenException>(() => SqliteStore.Open(File));

        Assert.Contains("in use", e.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Open_Folder_IsRefused()
    {
        Directory.CreateDirectory(File);

        Assert.Contains("folder", Assert.Throws<StoreOpenException>(() => SqliteStore.Open(File)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Model_HasNoChangesWithoutAMigration()
    {
        using SqliteStore store = SqliteStore.Open(File);
        using var connection = new SqliteConnection($"Data Source={File};Pooling=false");
        using StoreContext context = SqliteConnections.Context(connection);

        Assert.False(context.Database.HasPendingModelChanges());
    }

    private string[] Migrations()
    {
        using var connection = new SqliteConnection($"Data Source={File};Pooling=false");
        using StoreContext context = SqliteConnections.Context(connection);
        return [.. context.Database.GetMigrations()];
    }

    private void Execute(string sql)
    {
        using var connection = new SqliteConnection($"Data Source={File};Pooling=false");
        connection.Open();
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        command.ExecuteNonQuery();
    }
}
