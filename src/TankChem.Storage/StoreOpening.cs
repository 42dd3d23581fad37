using Microsoft.Data.Sqlite;
using Microsoft.EntityFrameworkCore;
using TankChem.Storage.Model;

namespace TankChem.Storage;

/// <summary>What happens before a store is used: take it for this process alone, look at it without touching it, bring it up to date.</summary>
internal static class StoreOpening
{
    private const int SqliteReadOnly = 8;
    private const int SqliteCorrupt = 11;
    private const int SqliteFull = 13;
    private const int SqliteCannotOpen = 14;
    private const int SqliteNotADatabase = 26;

    /// <summary>What an open of a file that another process has open for itself says on Windows, Linux and macOS.</summary>
    private static readonly int[] InUse = [unchecked((int)0x80070020), 11, 35];

    private static ReadOnlySpan<byte> Header => "SQLite format 3\0"u8;

    /// <summary>Takes the store for this process; the lock goes with the process, however that ends.</summary>
    public static FileStream Own(string full)
    {
        if (Directory.Exists(full))
            throw new StoreOpenException($"{full} is a folder; the store needs the name of a file.");
        string folder = Path.GetDirectoryName(full)!;
        try
        {
            Directory.CreateDirectory(folder);
            return new FileStream(full + ".lock", FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.None);
        }
        catch (IOException e) when (InUse.Contains(e.HResult))
        {
            throw new StoreOpenException($"The store {full} is in use by another TankChem. Stop that one, or give this one a data folder of its own.", e);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new StoreOpenException($"The folder {folder} cannot be written to ({e.Message}). Let the service's user write there, or take another data folder.", e);
        }
    }

    /// <summary>Brings an old store up to date and makes a new one; one that is not ours, newer or damaged is refused before anything is written.</summary>
    public static void Prepare(string full, SqliteConnections connections)
    {
        try
        {
            if (File.Exists(full) && new FileInfo(full).Length > 0)
                Inspect(full, connections);
            using SqliteConnection connection = connections.OpenWriter();
            using StoreContext context = SqliteConnections.Context(connection);
            if (!context.Database.GetPendingMigrations().Any())
                return;

            // The tool's own lock is a row that outlives a process that was killed while it migrated, and the next one would wait
            // for it without end. The store is ours alone by now, so nobody holds it.
            SqliteConnections.Execute(connection, "DROP TABLE IF EXISTS \"__EFMigrationsLock\"");
            context.Database.Migrate();
        }
        catch (SqliteException e)
        {
            throw new StoreOpenException(SentenceOf(full, e), e);
        }
    }

    private static void Inspect(string full, SqliteConnections connections)
    {
        Span<byte> start = stackalloc byte[Header.Length];
        using (FileStream file = new(full, FileMode.Open, FileAccess.Read, FileShare.ReadWrite | FileShare.Delete))
        {
            if (file.ReadAtLeast(start, start.Length, throwOnEndOfStream: false) < start.Length || !start.SequenceEqual(Header))
                throw new StoreOpenException($"{full} is not a TankChem store: it is no database. It was not changed: move it away, or name another file.");
        }

        using SqliteConnection connection = connections.OpenReader(pooled: false);
        using StoreContext context = SqliteConnections.Context(connection);
        List<string> tables = Strings(connection, "SELECT name FROM sqlite_schema WHERE type = 'table' AND name NOT LIKE 'sqlite\\_%' ESCAPE '\\' AND name NOT LIKE '\\_\\_EF%' ESCAPE '\\'");
        string[] applied = [.. context.Database.GetAppliedMigrations()];
        HashSet<string> known = [.. context.Database.GetMigrations()];
        if (applied.Length == 0 && tables.Count == 0)
            return;
        if (!applied.Any(known.Contains))
            throw new StoreOpenException($"{full} is not a TankChem store: it is a database of another program (it has the table {(tables.Count == 0 ? applied[0] : tables[0])}). It was not changed: name another file.");
        if (applied.LastOrDefault(m => !known.Contains(m)) is { } newer)
            throw new StoreOpenException($"The store {full} was written by a newer version of TankChem (it has {newer}, this version ends with {known.Max(StringComparer.Ordinal)}). Use that version, or another data folder. The file was not changed.");
    }

    private static string SentenceOf(string full, SqliteException e) => e.SqliteErrorCode switch
    {
        SqliteNotADatabase or SqliteCorrupt => $"{full} is damaged, or not a TankChem store ({e.Message}). Nothing was overwritten: move it away with its -wal file, or restore a backup.",
        SqliteReadOnly or SqliteCannotOpen => $"The store {full} cannot be written to ({e.Message}). Let the service's user write the file and its folder.",
        SqliteFull => $"The disk of {full} is full. Make room and start again; nothing was lost.",
        _ => $"The store {full} cannot be opened: {e.Message}",
    };

    private static List<string> Strings(SqliteConnection connection, string sql)
    {
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        using SqliteDataReader reader = command.ExecuteReader();
        var found = new List<string>();
        while (reader.Read())
            found.Add(reader.GetString(0));
        return found;
    }
}
