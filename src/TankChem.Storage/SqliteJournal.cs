using System.Text.Json;
using Microsoft.Data.Sqlite;
using Microsoft.EntityFrameworkCore;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Storage.Model;

namespace TankChem.Storage;

/// <summary>Writes batches: the two series through prepared statements, everything else through the model, in one transaction.</summary>
internal sealed class SqliteJournal(SqliteConnections connections) : IJournal, IDisposable
{
    private SqliteConnection? connection;
    private SeriesWriter? series;

    public void Commit(JournalBatch batch)
    {
        ArgumentNullException.ThrowIfNull(batch);
        try
        {
            connection ??= connections.OpenWriter();
            series ??= new SeriesWriter(connection);
            using SqliteTransaction transaction = connection.BeginTransaction(deferred: false);
            series.Write(batch, transaction);
            if (HasRecords(batch))
                WriteRecords(batch, transaction);
            transaction.Commit();
        }
        catch (DbUpdateException e)
        {
            // The model refuses a value before SQLite sees it, or SQLite refuses the row.
            Reset();
            throw e.InnerException is SqliteException inner ? Translate(inner) : new JournalRowException(e.InnerException?.Message ?? e.Message, e);
        }
        catch (SqliteException e)
        {
            Reset();
            throw Translate(e);
        }
        catch
        {
            Reset();
            throw;
        }
    }

    public void Dispose() => Reset();

    /// <summary>Runs a statement on the writer's own connection, for tests that limit it.</summary>
    internal void ExecuteOnWriter(string sql) => SqliteConnections.Execute(connection ??= connections.OpenWriter(), sql);

    /// <summary>After a failure nothing is assumed of the connection or of what the caches say is on disk.</summary>
    private void Reset()
    {
        series?.Dispose();
        series = null;
        connection?.Dispose();
        connection = null;
    }

    private static bool HasRecords(JournalBatch batch) =>
        batch.AlarmEntries.Count + batch.AlarmStates.Count + batch.Unreadable.Count + batch.Log.Count + batch.Losses.Count + batch.Places.Count > 0;

    private void WriteRecords(JournalBatch batch, SqliteTransaction transaction)
    {
        using StoreContext context = SqliteConnections.Context(connection!);
        context.Database.UseTransaction(transaction);
        context.AlarmEntries.AddRange(batch.AlarmEntries.Select(RowMapping.ToRow));
        context.Unreadable.AddRange(batch.Unreadable.Select(RowMapping.ToRow));
        context.Log.AddRange(batch.Log.Select(RowMapping.ToRow));
        context.Losses.AddRange(batch.Losses.Select(RowMapping.ToRow));
        foreach ((AlarmKey key, var state) in batch.AlarmStates)
        {
            AlarmStateRow? row = context.AlarmStates.Find(key.Place.Site, key.Place.Place, key.Rule);
            if (row is null)
                context.AlarmStates.Add(row = new AlarmStateRow { Site = key.Place.Site, Place = key.Place.Place, Rule = key.Rule });
            RowMapping.Fill(row, state);
        }

        foreach (PlaceDefinition place in batch.Places)
        {
            PlaceRow? row = context.Places.Find(place.Key.Site, place.Key.Place);
            if (row is null)
                context.Places.Add(row = new PlaceRow { Site = place.Key.Site, Place = place.Key.Place });
            row.Definition = JsonSerializer.Serialize(place, PlaceJson.Options);
        }

        context.SaveChanges();
    }

    private static Exception Translate(SqliteException e) => e.SqliteErrorCode switch
    {
        // CONSTRAINT, MISMATCH, TOOBIG, RANGE: the row is at fault, whatever the disk does.
        19 or 20 or 18 or 25 => new JournalRowException(e.Message, e),
        13 => new JournalUnavailableException("the disk is full", e),
        10 => new JournalUnavailableException($"the disk reports an error ({e.Message})", e),
        5 or 6 => new JournalUnavailableException("another program holds the store", e),
        8 or 14 => new JournalUnavailableException($"the store cannot be written to ({e.Message})", e),
        11 or 26 => new JournalUnavailableException($"the store is damaged, restore a backup ({e.Message})", e),
        _ => new JournalUnavailableException(e.Message, e),
    };
}
