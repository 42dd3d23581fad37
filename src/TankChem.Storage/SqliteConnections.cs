using Microsoft.Data.Sqlite;
using Microsoft.EntityFrameworkCore;
using TankChem.Storage.Model;

namespace TankChem.Storage;

/// <summary>Opens connections with every pragma set at each opening: pooled ones keep old settings.</summary>
internal sealed class SqliteConnections(string path)
{
    private const string MigrationsAssembly = "TankChem.Migrations.Sqlite";

    /// <summary>The one that writes. WAL and FULL: a commit that returned survives a power cut.</summary>
    public SqliteConnection OpenWriter() => Open(
        new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = path, Pooling = false, DefaultTimeout = 5 }.ToString()),
        "PRAGMA busy_timeout=5000; PRAGMA journal_mode=WAL; PRAGMA synchronous=FULL; PRAGMA foreign_keys=OFF; PRAGMA cache_size=-32000; PRAGMA wal_autocheckpoint=10000; PRAGMA journal_size_limit=67108864; PRAGMA temp_store=MEMORY;");

    /// <summary>One that only reads.</summary>
    public SqliteConnection OpenReader(bool pooled = true) => Open(Reader(pooled), "PRAGMA busy_timeout=5000; PRAGMA cache_size=-8000; PRAGMA temp_store=MEMORY;");

    /// <summary>Closes the readers that wait for their next use.</summary>
    public void CloseReaders()
    {
        using SqliteConnection reader = Reader(pooled: true);
        SqliteConnection.ClearPool(reader);
    }

    /// <summary>A context on a connection that stays the caller's.</summary>
    public static StoreContext Context(SqliteConnection connection) =>
        new(new DbContextOptionsBuilder<StoreContext>().UseSqlite(connection, o => o.MigrationsAssembly(MigrationsAssembly)).Options);

    /// <summary>Runs a statement.</summary>
    public static void Execute(SqliteConnection connection, string sql)
    {
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        command.ExecuteNonQuery();
    }

    private SqliteConnection Reader(bool pooled) =>
        new(new SqliteConnectionStringBuilder { DataSource = path, Mode = SqliteOpenMode.ReadOnly, Pooling = pooled, DefaultTimeout = 30 }.ToString());

    private static SqliteConnection Open(SqliteConnection connection, string pragmas)
    {
        try
        {
            connection.Open();
            Execute(connection, pragmas);
            return connection;
        }
        catch
        {
            connection.Dispose();
            throw;
        }
    }
}
