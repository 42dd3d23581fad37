using Microsoft.Data.Sqlite;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Storage;
using TankChem.TestKit;

namespace TankChem.Benchmarks;

/// <summary>Journal and trend against the bare SQL on a table of the same layout.</summary>
internal static class StoreComparison
{
    private const int Batch = 1_000;
    private const int Minutes = 30 * 24 * 60;
    private const int Points = 300;
    private static readonly DateTimeOffset Start = new(2026, 5, 1, 0, 0, 0, TimeSpan.Zero);
    private static readonly PlaceKey Tank = new("north-quay", "tank-1");

    public static void Print()
    {
        using var folder = new TemporaryFolder();
        PrintIntake(folder);
        PrintTrend(folder);
    }

    private static void PrintIntake(TemporaryFolder folder)
    {
        using SqliteStore ours = SqliteStore.Open(folder.File("ours.db"));
        string barePath = folder.File("bare.db");
        SqliteStore.Open(barePath).Dispose();
        using SqliteConnection bare = Open(barePath);
        Run(bare, "PRAGMA journal_mode=WAL; PRAGMA synchronous=FULL; PRAGMA cache_size=-32000; PRAGMA wal_autocheckpoint=10000;");
        Run(bare, "INSERT INTO series (id, site, place, quantity, probe) VALUES (1, 'north-quay', 'tank-1', 'ph', 'main')");
        using SqliteCommand insert = bare.CreateCommand();
        insert.CommandText = "INSERT INTO reading (series_id, time_ms, received_ms, raw_value, raw_unit, value, flag, reason, origin) VALUES (1, $time, $time, $value, NULL, $value, 1, NULL, 0)";
        SqliteParameter time = insert.Parameters.Add("$time", SqliteType.Integer), value = insert.Parameters.Add("$value", SqliteType.Real);
        int oursNext = 0, bareNext = 0;
        Comparison.Print(
            "journal, a commit of 1,000 readings (per reading)",
            Batch,
            () => ours.Journal.Commit(new JournalBatch { Readings = Readings(ref oursNext, Batch, 1) }),
            () =>
            {
                using SqliteTransaction transaction = bare.BeginTransaction();
                insert.Transaction = transaction;
                for (int i = 0; i < Batch; i++)
                {
                    time.Value = Start.AddSeconds(bareNext++).ToUnixTimeMilliseconds();
                    value.Value = 7 + i * 1e-4;
                    insert.ExecuteNonQuery();
                }

                transaction.Commit();
            });
    }

    private static void PrintTrend(TemporaryFolder folder)
    {
        string path = folder.File("trend.db");
        using SqliteStore store = SqliteStore.Open(path);
        int next = 0;
        store.Journal.Commit(new JournalBatch { Readings = Readings(ref next, Minutes, 60) });
        using SqliteConnection bare = Open(path);
        using SqliteCommand query = bare.CreateCommand();
        long from = Start.ToUnixTimeMilliseconds(), to = Start.AddDays(30).ToUnixTimeMilliseconds();
        query.CommandText = $"SELECT (time_ms - {from}) * {Points} / ({to} - {from}) AS bucket, min(value), avg(value), max(value), count(*) FROM reading WHERE series_id = 1 AND time_ms >= {from} AND time_ms < {to} AND flag = 1 GROUP BY bucket ORDER BY bucket";
        Comparison.Print(
            "trend, 30 days of minutes in 300 buckets (per query)",
            1,
            () => Expect(store.History.TrendAsync(Tank, "ph", Start, Start.AddDays(30), Points, CancellationToken.None).GetAwaiter().GetResult().Count),
            () =>
            {
                using SqliteDataReader reader = query.ExecuteReader();
                int count = 0;
                while (reader.Read())
                    count++;
                Expect(count);
            });
    }

    private static Reading[] Readings(ref int next, int count, int secondsApart)
    {
        var readings = new Reading[count];
        for (int i = 0; i < count; i++)
        {
            DateTimeOffset time = Start.AddSeconds((double)secondsApart * next++);
            readings[i] = new Reading { Series = new SeriesKey(Tank, "ph", "main"), Time = time, ReceivedAt = time, RawValue = 7 + i * 1e-4, Value = 7 + i * 1e-4, Flag = QualityFlag.Pass, Origin = ReadingOrigin.Live };
        }

        return readings;
    }

    private static void Expect(int buckets)
    {
        if (buckets != Points)
            throw new InvalidOperationException($"The trend has {buckets} buckets, not {Points}: the two sides do not do the same job.");
    }

    private static SqliteConnection Open(string path)
    {
        var connection = new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = path, Pooling = false }.ToString());
        connection.Open();
        return connection;
    }

    private static void Run(SqliteConnection connection, string sql)
    {
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        command.ExecuteNonQuery();
    }
}
