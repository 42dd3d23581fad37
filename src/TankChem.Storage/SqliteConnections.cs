using Microsoft.Data.Sqlite;
using Microsoft.EntityFrameworkCore;
using TankChem.Storage.Model;

namespace TankChem.Storage;

/// <summary>Opens connections with every pragma set at each opening: pooled ones keep old settings.</summary>
internal sealed class SqliteConnections(string path)
{
    private const string MigrationsAssembly = "TankChem.Migrations.Sqlite";

    /// <summary>The one that writes. WAL and FULL: a commit that returned survives a power cut.</summary>
    public SqliteConnection OpenWriter()
    {
        var connection = new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = path, Pooling = false, DefaultTimeout = 5 }.ToString());
        try
        {
            connection.Open();
            Execute(connection, "PRAGMA journal_mode=WAL; PRAGMA synchronous=FULL; PRAGMA busy_timeout=5000; PRAGMA foreign_keys=OFF; PRAGMA cache_size=-32000; PRAGMA wal_autocheckpoint=10000; PRAGMA temp_store=MEMORY;");
            return connection;
        }
        catch
        {
            connection.Dispose();
            throw;
        }
    }

    /// <summary>One that only reads.</summary>
    public SqliteConnection OpenReader()
    {
        var connection = new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = path, Pooling = true, DefaultTimeout = 30 }.ToString());
        connection.Open();
        Execute(connection, "PRAGMA query_only=ON; PRAGMA busy_timeout=5000; PRAGMA cache_size=-8000;");
        return connection;
    }

    /// <summary>A context on a connection that stays the caller's.</summary>
    public static StoreContext Context(SqliteConnection connection) =>
        new(new DbContextOptionsBuilder<StoreContext>().UseSqlite(connection, o => o.MigrationsAssembly(MigrationsAssembly)).Options);

    public static void Execute(SqliteConnection connection, string sql)
    {
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        command.ExecuteNonQuery();
    }
}
