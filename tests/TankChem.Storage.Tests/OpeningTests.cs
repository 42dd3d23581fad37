using Microsoft.Data.Sqlite;
using Microsoft.EntityFrameworkCore;
using TankChem.Storage.Model;
using TankChem.TestKit;

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

        StoreOpenException e = Assert.Throws<StoreOpenException>(() => SqliteStore.Open(File));

        Assert.Contains("29990101000000_Later", e.Message, StringComparison.Ordinal);
        Assert.Contains("_Initial", e.Message, StringComparison.Ordinal);
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

    private void Execute(string sql)
    {
        using var connection = new SqliteConnection($"Data Source={File};Pooling=false");
        connection.Open();
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        command.ExecuteNonQuery();
    }
}
