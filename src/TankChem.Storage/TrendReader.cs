using Microsoft.Data.Sqlite;
using TankChem.Monitoring.Ports;
using TankChem.Storage.Model;

namespace TankChem.Storage;

/// <summary>Minimum, mean and maximum per bucket over some series of one table.</summary>
/// <remarks>
/// The range is cut into equal buckets. Where they are wide, each edge is moved to the nearest whole hour (very wide: UTC day), so that the
/// buckets are made of roll-ups and a year costs a few thousand figures; what the range cuts off an hour at its two ends is read from the
/// values. Either way each value counts exactly once, in the bucket whose printed edges it lies between.
/// </remarks>
internal sealed class TrendReader
{
    /// <summary>Moving an edge by half an hour is a quarter of two hours at most, and half a day an eighth of four days.</summary>
    private const long WideMs = 2 * Hours.Ms;
    private const long VeryWideMs = 4 * DayMs;
    private const long DayMs = Hours.InADay * Hours.Ms;

    /// <summary>Up to here the values are read even where hours would do: it is fast, and the buckets are equal to the millisecond.</summary>
    private const long ValuesUpToMs = 2 * DayMs;

    private readonly SqliteConnection connection;
    private readonly SeriesTable table;
    private readonly long fromMs;
    private readonly long toMs;
    private readonly int points;
    private readonly SortedDictionary<long, Sum> sums = [];

    public TrendReader(SqliteConnection connection, SeriesTable table, DateTimeOffset from, DateTimeOffset to, int points)
    {
        this.connection = connection;
        this.table = table;
        fromMs = RowMapping.EdgeMs(from);
        toMs = RowMapping.EdgeMs(to);
        this.points = points;
    }

    private long Span => toMs - fromMs;

    /// <summary>The buckets over some series, empty ones left out.</summary>
    public List<TrendBucket> Read(IReadOnlyList<long> series)
    {
        // Both ends can be within one millisecond, in which nothing is.
        if (Span == 0)
            return [];
        long step = Step();
        foreach (long id in series)
        {
            if (step == 0)
                AddValues(id, fromMs, toMs, $"(time_ms - {fromMs}) * {points} / {Span}");
            else
                AddSteps(id, step);
        }

        return [.. sums.Select(b => new TrendBucket(
            RowMapping.Time(Edge(b.Key, step)), RowMapping.Time(Edge(b.Key + 1, step)), b.Value.Lowest, b.Value.Total / b.Value.Counted, b.Value.Highest, b.Value.Counted))];
    }

    /// <summary>What the buckets are made of: whole days, whole hours, or (0) the values themselves.</summary>
    private long Step()
    {
        if (IsExact(DayMs))
            return DayMs;
        if (IsExact(Hours.Ms))
            return Hours.Ms;
        if (Span <= ValuesUpToMs || Span < points * WideMs)
            return 0;
        return Span < points * VeryWideMs ? Hours.Ms : DayMs;
    }

    /// <summary>Whether every edge of the equal buckets is a whole step already.</summary>
    private bool IsExact(long step) => fromMs % step == 0 && Span % (points * step) == 0;

    private long Edge(long bucket, long step)
    {
        if (bucket == 0)
            return fromMs;
        if (bucket == points)
            return toMs;

        // The first whole millisecond of the bucket, so that the printed edges say exactly which values are in it.
        long equal = fromMs + (((bucket * Span) + points - 1) / points);
        return step == 0 ? equal : Hours.Floor(equal + (step / 2), step);
    }

    /// <summary>Whole steps by the bucket that the middle of each is in; both ends, shorter than a step, belong to the first and the last bucket.</summary>
    private void AddSteps(long series, long step)
    {
        long first = Hours.Ceiling(fromMs, step), last = Hours.Floor(toMs, step);
        AddEnd(series, fromMs, first, step, "0");
        AddFigures(series, first, last, step, $"(start_h * {Hours.Ms} + {(step / 2) - 1 - fromMs}) * {points} / {Span}");
        AddEnd(series, last, toMs, step, $"{points - 1}");
    }

    private void AddEnd(long series, long start, long end, long step, string bucket)
    {
        if (start >= end)
            return;
        if (step == Hours.Ms)
        {
            AddValues(series, start, end, bucket);
            return;
        }

        // One side of a day's end is a whole hour; the other is where the range was cut.
        long first = Math.Min(end, Hours.Ceiling(start, Hours.Ms)), last = Math.Max(first, Hours.Floor(end, Hours.Ms));
        AddValues(series, start, first, bucket);
        AddFigures(series, first, last, Hours.Ms, bucket);
        AddValues(series, last, end, bucket);
    }

    private void AddFigures(long series, long start, long end, long step, string index) => Add(
        $"""
        SELECT {index} AS bucket, min(lowest), sum(total), max(highest), sum(counted) FROM {table.Rollup}
        WHERE {table.Id} = $series AND step_h = {step / Hours.Ms} AND start_h >= $start AND start_h < $end GROUP BY bucket
        """,
        series,
        start / Hours.Ms,
        end / Hours.Ms);

    private void AddValues(long series, long start, long end, string index) => Add(
        $"""
        SELECT {index} AS bucket, min(value), sum(value), max(value), count(*) FROM {table.Name}
        WHERE {table.Id} = $series AND time_ms >= $start AND time_ms < $end AND {table.Counts} GROUP BY bucket
        """,
        series,
        start,
        end);

    private void Add(string sql, long series, long start, long end)
    {
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        command.Parameters.AddWithValue("$series", series);
        command.Parameters.AddWithValue("$start", start);
        command.Parameters.AddWithValue("$end", end);
        using SqliteDataReader reader = command.ExecuteReader();
        while (reader.Read())
        {
            long bucket = reader.GetInt64(0);
            var sum = new Sum(reader.GetDouble(1), reader.GetDouble(2), reader.GetDouble(3), reader.GetInt64(4));
            sums[bucket] = sums.TryGetValue(bucket, out Sum known) ? known.With(sum) : sum;
        }
    }

    private readonly record struct Sum(double Lowest, double Total, double Highest, long Counted)
    {
        public Sum With(in Sum other) => new(Math.Min(Lowest, other.Lowest), Total + other.Total, Math.Max(Highest, other.Highest), Counted + other.Counted);
    }
}
