using Microsoft.Data.Sqlite;
using TankChem.Monitoring.Ports;

namespace TankChem.Storage;

/// <summary>The store on one SQLite file: one writer, many readers.</summary>
public sealed class SqliteStore : IDisposable
{
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
        FileStream owned = StoreOpening.Own(full);
        try
        {
            var opened = new SqliteConnections(full);
            StoreOpening.Prepare(full, opened);
            return new SqliteStore(full, owned, opened);
        }
        catch
        {
            owned.Dispose();
            throw;
        }
    }

    /// <summary>What it holds and the room it has; counted from the days' figures, so the cost does not grow with the readings.</summary>
    public StoreInfo Info()
    {
        using SqliteConnection connection = connections.OpenReader();
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = $"""
            SELECT (SELECT count(*) FROM series),
                   (SELECT coalesce(sum(counted), 0) FROM series s CROSS JOIN reading_rollup r ON r.series_id = s.id WHERE r.step_h = {Hours.InADay}),
                   (SELECT coalesce(sum(counted), 0) FROM state_series s CROSS JOIN state_rollup r ON r.state_series_id = s.id WHERE r.step_h = {Hours.InADay}),
                   (SELECT count(*) FROM correction)
            """;
        using SqliteDataReader row = command.ExecuteReader();
        row.Read();
        long free = new DriveInfo(Path.GetDirectoryName(FullPath)!).AvailableFreeSpace;
        return new StoreInfo(SizeBytes, free, row.GetInt64(0), row.GetInt64(1), row.GetInt64(2), row.GetInt64(3));
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        // The writer last: the last one to close folds the log into the file.
        connections.CloseReaders();
        journal.Dispose();
        ownership.Dispose();
    }

    private static long Length(string path) => File.Exists(path) ? new FileInfo(path).Length : 0;
}
