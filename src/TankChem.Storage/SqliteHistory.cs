using Microsoft.Data.Sqlite;
using Microsoft.EntityFrameworkCore;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Storage.Model;

namespace TankChem.Storage;

/// <summary>Reads what is on disk; each question has a short read of its own.</summary>
internal sealed class SqliteHistory(SqliteConnections connections) : IHistory
{
    private const string MeasuredPco2 = "pco2-measured";
    private const string Pco2 = "pco2";

    public Task<IReadOnlyList<TrendBucket>> TrendAsync(PlaceKey place, string quantity, DateTimeOffset from, DateTimeOffset to, int points, CancellationToken cancellationToken)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(points);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(from, to);
        return ReadAsync<TrendBucket>(
            connection =>
            {
                // Several statements that must see the same moment.
                using SqliteTransaction moment = connection.BeginTransaction(deferred: true);
                List<TrendBucket> buckets = [];
                if (ReadAs(quantity) is { } taken)
                    buckets = new TrendReader(connection, SeriesTable.Readings, from, to, points).Read([.. SeriesList.Readings(connection, place, taken).Select(s => s.Id)]);
                if (buckets.Count == 0)
                    buckets = new TrendReader(connection, SeriesTable.States, from, to, points).Read(SeriesList.States(connection, place, quantity));
                return buckets;
            },
            cancellationToken);
    }

    public Task<IReadOnlyList<Reading>> ReadingsAsync(PlaceKey place, string quantity, DateTimeOffset from, DateTimeOffset to, ReadingCursor? after, int limit, CancellationToken cancellationToken)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(limit);
        return ReadAsync(connection => Page(connection, place, SeriesList.Readings(connection, place, quantity == MeasuredPco2 ? Pco2 : quantity), RowMapping.EdgeMs(from), RowMapping.EdgeMs(to), after, limit, cancellationToken), cancellationToken);
    }

    public Task<IReadOnlyList<Reading>> AllReadingsAsync(PlaceKey place, DateTimeOffset from, DateTimeOffset to, int limit, CancellationToken cancellationToken)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(limit);
        return ReadAsync(connection => Page(connection, place, SeriesList.Readings(connection, place, null), RowMapping.EdgeMs(from), RowMapping.EdgeMs(to), null, limit, cancellationToken), cancellationToken);
    }

    public Task<IReadOnlyList<StateValue>> StateValuesAsync(PlaceKey place, DateTimeOffset from, DateTimeOffset to, CancellationToken cancellationToken) => ReadAsync<StateValue>(
        connection =>
        {
            using SqliteCommand command = PlaceCommand(
                connection,
                """
                SELECT v.time_ms, s.quantity, v.value, v.u FROM state_series s CROSS JOIN state_value v ON v.state_series_id = s.id
                WHERE s.site = $site AND s.place = $place AND v.time_ms >= $from AND v.time_ms < $to
                ORDER BY v.time_ms, s.quantity
                """,
                place,
                from,
                to);
            var values = new List<StateValue>();
            using SqliteDataReader reader = command.ExecuteReader();
            while (reader.Read())
                values.Add(new StateValue(RowMapping.Time(reader.GetInt64(0)), reader.GetString(1), reader.GetDouble(2), reader.IsDBNull(3) ? null : reader.GetDouble(3)));
            return values;
        },
        cancellationToken);

    public Task<IReadOnlyList<AlarmJournalEntry>> AlarmJournalAsync(PlaceKey? place, DateTimeOffset from, DateTimeOffset to, CancellationToken cancellationToken) => QueryAsync(
        context =>
        {
            long fromMs = RowMapping.EdgeMs(from), toMs = RowMapping.EdgeMs(to);
            IQueryable<AlarmEntryRow> rows = context.AlarmEntries.AsNoTracking().Where(r => r.AtMs >= fromMs && r.AtMs < toMs);
            if (place is { } key)
                rows = rows.Where(r => r.Site == key.Site && r.Place == key.Place);
            return rows.OrderBy(r => r.AtMs).ThenBy(r => r.Id).AsEnumerable().Select(RowMapping.FromRow);
        },
        cancellationToken);

    public Task<IReadOnlyList<LogEntry>> LogAsync(PlaceKey? place, DateTimeOffset from, DateTimeOffset to, int limit, CancellationToken cancellationToken) => QueryAsync(
        context =>
        {
            long fromMs = RowMapping.EdgeMs(from), toMs = RowMapping.EdgeMs(to);
            IQueryable<LogRow> rows = context.Log.AsNoTracking().Where(r => r.AtMs >= fromMs && r.AtMs < toMs);
            if (place is { } key)
                rows = rows.Where(r => r.Site == key.Site && r.Place == key.Place);
            return rows.OrderByDescending(r => r.AtMs).ThenByDescending(r => r.Id).Take(limit).AsEnumerable().Select(RowMapping.FromRow);
        },
        cancellationToken);

    public Task<IReadOnlyList<LossRecord>> LossesAsync(CancellationToken cancellationToken) => QueryAsync(
        context => context.Losses.AsNoTracking().OrderByDescending(r => r.FoundMs).ThenByDescending(r => r.Id).AsEnumerable().Select(RowMapping.FromRow),
        cancellationToken);

    public async Task<LossRecord?> LossAsync(long id, CancellationToken cancellationToken)
    {
        IReadOnlyList<LossRecord> found = await QueryAsync(context => context.Losses.AsNoTracking().Where(r => r.Id == id).AsEnumerable().Select(RowMapping.FromRow), cancellationToken);
        return found.Count == 0 ? null : found[0];
    }

    public Task<IReadOnlyList<UnreadablePayload>> UnreadableAsync(int limit, CancellationToken cancellationToken) => QueryAsync(
        context => context.Unreadable.AsNoTracking().OrderByDescending(r => r.Id).Take(limit).AsEnumerable().Select(RowMapping.FromRow),
        cancellationToken);

    private Task<IReadOnlyList<T>> QueryAsync<T>(Func<StoreContext, IEnumerable<T>> query, CancellationToken cancellationToken) => ReadAsync<T>(
        connection =>
        {
            using StoreContext context = SqliteConnections.Context(connection);
            return [.. query(context)];
        },
        cancellationToken);

    private Task<IReadOnlyList<T>> ReadAsync<T>(Func<SqliteConnection, IReadOnlyList<T>> read, CancellationToken cancellationToken) => Task.Run(
        () =>
        {
            using SqliteConnection connection = connections.OpenReader();
            return read(connection);
        },
        cancellationToken);

    /// <summary>Which readings a name stands for in trends: a CO2 probe's are "pco2-measured", because "pco2" is the computed one; null for none.</summary>
    private static string? ReadAs(string quantity) => quantity switch
    {
        MeasuredPco2 => Pco2,
        Pco2 => null,
        _ => quantity,
    };

    /// <summary>The first rows by time, quantity and probe: as many of each series as the page takes, put in order, so that a page costs the same wherever it begins.</summary>
    private static IReadOnlyList<Reading> Page(SqliteConnection connection, PlaceKey place, IReadOnlyList<SeriesList.Entry> series, long fromMs, long toMs, ReadingCursor? after, int limit, CancellationToken cancellationToken)
    {
        using SqliteTransaction moment = connection.BeginTransaction(deferred: true);
        var readings = new List<Reading>();
        foreach (SeriesList.Entry one in series)
        {
            cancellationToken.ThrowIfCancellationRequested();
            long start = fromMs;
            if (after is { } cursor)
                start = Math.Max(start, RowMapping.Ms(cursor.Time) + (string.CompareOrdinal(one.Key.Probe, cursor.Probe) <= 0 ? 1 : 0));
            ReadingReader.AddTo(readings, connection, one, start, toMs, limit);
        }

        return [.. readings.OrderBy(r => r.Time).ThenBy(r => r.Series.Quantity, StringComparer.Ordinal).ThenBy(r => r.Series.Probe, StringComparer.Ordinal).Take(limit)];
    }

    private static SqliteCommand PlaceCommand(SqliteConnection connection, string sql, PlaceKey place, DateTimeOffset from, DateTimeOffset to)
    {
        SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        command.Parameters.AddWithValue("$site", place.Site);
        command.Parameters.AddWithValue("$place", place.Place);
        command.Parameters.AddWithValue("$from", RowMapping.EdgeMs(from));
        command.Parameters.AddWithValue("$to", RowMapping.EdgeMs(to));
        return command;
    }
}
