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
    private const string TrendOfReadings = """
        SELECT (r.time_ms - $from) * $points / ($to - $from) AS bucket, min(r.value), avg(r.value), max(r.value), count(*)
        FROM reading r JOIN series s ON s.id = r.series_id
        WHERE s.site = $site AND s.place = $place AND s.quantity = $quantity AND r.time_ms >= $from AND r.time_ms < $to AND r.flag = 1 AND r.value IS NOT NULL
        GROUP BY bucket ORDER BY bucket
        """;

    private const string TrendOfStates = """
        SELECT (v.time_ms - $from) * $points / ($to - $from) AS bucket, min(v.value), avg(v.value), max(v.value), count(*)
        FROM state_value v JOIN state_series s ON s.id = v.state_series_id
        WHERE s.site = $site AND s.place = $place AND s.quantity = $quantity AND v.time_ms >= $from AND v.time_ms < $to
        GROUP BY bucket ORDER BY bucket
        """;

    private const string ReadingColumns = "s.quantity, s.probe, r.time_ms, r.received_ms, r.raw_value, r.raw_unit, r.value, r.flag, r.reason, r.origin";

    public Task<IReadOnlyList<TrendBucket>> TrendAsync(PlaceKey place, string quantity, DateTimeOffset from, DateTimeOffset to, int points, CancellationToken cancellationToken)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(points);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(from, to);
        return Task.Run<IReadOnlyList<TrendBucket>>(
            () =>
            {
                using SqliteConnection connection = connections.OpenReader();
                List<TrendBucket> readings = Buckets(connection, TrendOfReadings, place, quantity, from, to, points);
                return readings.Count > 0 ? readings : Buckets(connection, TrendOfStates, place, quantity, from, to, points);
            },
            cancellationToken);
    }

    public Task<IReadOnlyList<Reading>> ReadingsAsync(PlaceKey place, string quantity, DateTimeOffset from, DateTimeOffset to, ReadingCursor? after, int limit, CancellationToken cancellationToken) => Task.Run<IReadOnlyList<Reading>>(
        () =>
        {
            using SqliteConnection connection = connections.OpenReader();
            using SqliteCommand command = PlaceCommand(
                connection,
                $"""
                SELECT {ReadingColumns} FROM reading r JOIN series s ON s.id = r.series_id
                WHERE s.site = $site AND s.place = $place AND s.quantity = $quantity AND r.time_ms >= $from AND r.time_ms < $to
                  AND ($afterMs IS NULL OR r.time_ms > $afterMs OR (r.time_ms = $afterMs AND s.probe > $afterProbe))
                ORDER BY r.time_ms, s.probe LIMIT $limit
                """,
                place,
                from,
                to);
            command.Parameters.AddWithValue("$quantity", quantity);
            command.Parameters.AddWithValue("$limit", limit);
            command.Parameters.AddWithValue("$afterMs", after is { } cursor ? RowMapping.Ms(cursor.Time) : DBNull.Value);
            command.Parameters.AddWithValue("$afterProbe", after?.Probe ?? (object)DBNull.Value);
            return ReadingReader.All(command, place);
        },
        cancellationToken);

    public Task<IReadOnlyList<Reading>> AllReadingsAsync(PlaceKey place, DateTimeOffset from, DateTimeOffset to, int limit, CancellationToken cancellationToken) => Task.Run<IReadOnlyList<Reading>>(
        () =>
        {
            using SqliteConnection connection = connections.OpenReader();
            using SqliteCommand command = PlaceCommand(
                connection,
                $"""
                SELECT {ReadingColumns} FROM reading r JOIN series s ON s.id = r.series_id
                WHERE s.site = $site AND s.place = $place AND r.time_ms >= $from AND r.time_ms < $to
                ORDER BY r.time_ms, s.quantity, s.probe LIMIT $limit
                """,
                place,
                from,
                to);
            command.Parameters.AddWithValue("$limit", limit);
            return ReadingReader.All(command, place);
        },
        cancellationToken);

    public Task<IReadOnlyList<StateValue>> StateValuesAsync(PlaceKey place, DateTimeOffset from, DateTimeOffset to, CancellationToken cancellationToken) => Task.Run<IReadOnlyList<StateValue>>(
        () =>
        {
            using SqliteConnection connection = connections.OpenReader();
            using SqliteCommand command = PlaceCommand(
                connection,
                """
                SELECT v.time_ms, s.quantity, v.value, v.u FROM state_value v JOIN state_series s ON s.id = v.state_series_id
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
            long fromMs = RowMapping.Ms(from), toMs = RowMapping.Ms(to);
            IQueryable<AlarmEntryRow> rows = context.AlarmEntries.AsNoTracking().Where(r => r.AtMs >= fromMs && r.AtMs < toMs);
            if (place is { } key)
                rows = rows.Where(r => r.Site == key.Site && r.Place == key.Place);
            return rows.OrderBy(r => r.AtMs).ThenBy(r => r.Id).AsEnumerable().Select(RowMapping.FromRow);
        },
        cancellationToken);

    public Task<IReadOnlyList<LogEntry>> LogAsync(PlaceKey? place, DateTimeOffset from, DateTimeOffset to, int limit, CancellationToken cancellationToken) => QueryAsync(
        context =>
        {
            long fromMs = RowMapping.Ms(from), toMs = RowMapping.Ms(to);
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

    private Task<IReadOnlyList<T>> QueryAsync<T>(Func<StoreContext, IEnumerable<T>> query, CancellationToken cancellationToken) => Task.Run<IReadOnlyList<T>>(
        () =>
        {
            using SqliteConnection connection = connections.OpenReader();
            using StoreContext context = SqliteConnections.Context(connection);
            return [.. query(context)];
        },
        cancellationToken);

    private static List<TrendBucket> Buckets(SqliteConnection connection, string sql, PlaceKey place, string quantity, DateTimeOffset from, DateTimeOffset to, int points)
    {
        using SqliteCommand command = PlaceCommand(connection, sql, place, from, to);
        command.Parameters.AddWithValue("$quantity", quantity);
        command.Parameters.AddWithValue("$points", points);
        long fromMs = RowMapping.Ms(from), span = RowMapping.Ms(to) - fromMs;
        var buckets = new List<TrendBucket>();
        using SqliteDataReader reader = command.ExecuteReader();
        while (reader.Read())
        {
            long at = reader.GetInt64(0);
            buckets.Add(new TrendBucket(
                RowMapping.Time(fromMs + CeilingDivide(at * span, points)),
                RowMapping.Time(fromMs + CeilingDivide((at + 1) * span, points)),
                reader.GetDouble(1),
                reader.GetDouble(2),
                reader.GetDouble(3),
                reader.GetInt64(4)));
        }

        return buckets;
    }

    /// <summary>The first whole millisecond of a bucket, so that the printed edges say exactly which readings are in it.</summary>
    private static long CeilingDivide(long a, long b) => (a + b - 1) / b;

    private static SqliteCommand PlaceCommand(SqliteConnection connection, string sql, PlaceKey place, DateTimeOffset from, DateTimeOffset to)
    {
        SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        command.Parameters.AddWithValue("$site", place.Site);
        command.Parameters.AddWithValue("$place", place.Place);
        command.Parameters.AddWithValue("$from", RowMapping.Ms(from));
        command.Parameters.AddWithValue("$to", RowMapping.Ms(to));
        return command;
    }
}
