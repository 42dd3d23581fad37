using Microsoft.Data.Sqlite;
using Microsoft.EntityFrameworkCore;
using TankChem.Monitoring.Ports;
using TankChem.Storage.Model;

namespace TankChem.Storage;

/// <summary>The store on one SQLite file: one writer, many readers.</summary>
public sealed class SqliteStore : IDisposable
{
    private const int SqliteNotADatabase = 26;
    private const int SqliteCorrupt = 11;

    private readonly FileStream ownership;
    private readonly SqliteConnections connections;
    private readonly SqliteJournal journal;

    private SqliteStore(string path, FileStream ownership, SqliteConnections connections)
    {
        FullPath = path;
        this.ownership = ownership;
        this.connections = connections;
        journal = new SqliteJournal(connections);
        History = new SqliteHistory(connections);
        Recovery = new SqliteRecovery(connections);
    }

    /// <summary>The file.</summary>
    public string FullPath { get; }

    /// <summary>The way in.</summary>
    public IJournal Journal => journal;

    /// <summary>The way out.</summary>
    public IHistory History { get; }

    /// <summary>What a start reads back.</summary>
    public IRecovery Recovery { get; }

    /// <summary>Bytes of the file and its log.</summary>
    public long SizeBytes => Length(FullPath) + Length(FullPath + "-wal");

    /// <summary>Opens a store, makes it when it is not there, and brings an old one up to date.</summary>
    /// <param name="path">The file.</param>
    /// <exception cref="StoreOpenException">It cannot be opened; the file is left as it is.</exception>
    public static SqliteStore Open(string path)
    {
        string full = Path.GetFullPath(path);
        FileStream owned = Own(full);
        try
        {
            var opened = new SqliteConnections(full);
            Migrate(full, opened);
            return new SqliteStore(full, owned, opened);
        }
        catch
        {
            owned.Dispose();
            throw;
        }
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        journal.Dispose();
        using (var reader = new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = FullPath, Pooling = true, DefaultTimeout = 30 }.ToString()))
            SqliteConnection.ClearPool(reader);
        ownership.Dispose();
    }

    private static FileStream Own(string full)
    {
        if (Directory.Exists(full))
            throw new StoreOpenException($"{full} is a folder; the store needs a file name.");
        try
        {
            Directory.CreateDirectory(Path.GetDirectoryName(full)!);
            return new FileStream(full + ".lock", FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.None);
        }
        catch (UnauthorizedAccessException e)
        {
            throw new StoreOpenException($"The store {full} cannot be written to: {e.Message}", e);
        }
        catch (IOException e)
        {
            throw new StoreOpenException($"The store {full} is in use by another TankChem, or its folder cannot be written to ({e.Message}). Stop the other one, or take another data folder.", e);
        }
    }

    private static void Migrate(string full, SqliteConnections connections)
    {
        try
        {
            using SqliteConnection connection = connections.OpenWriter();
            using StoreContext context = SqliteConnections.Context(connection);
            HashSet<string> known = [.. context.Database.GetMigrations()];
            string[] newer = [.. context.Database.GetAppliedMigrations().Where(m => !known.Contains(m))];
            if (newer.Length > 0)
                throw new StoreOpenException($"The store {full} was written by a newer version of TankChem (it has {newer[^1]}, this version ends with {known.Max(StringComparer.Ordinal)}). Use that version, or another data folder. The file was not changed.");
            context.Database.Migrate();
        }
        catch (SqliteException e) when (e.SqliteErrorCode is SqliteNotADatabase or SqliteCorrupt)
        {
            throw new StoreOpenException($"{full} is not a TankChem store, or it is damaged ({e.Message}). It was not changed: move it away, or restore a backup.", e);
        }
        catch (SqliteException e)
        {
            throw new StoreOpenException($"The store {full} cannot be opened: {e.Message}", e);
        }
    }

    private static long Length(string path) => File.Exists(path) ? new FileInfo(path).Length : 0;
}
