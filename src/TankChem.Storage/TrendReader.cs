using Microsoft.Data.Sqlite;
using TankChem.Monitoring.Ports;
using TankChem.Storage.Model;

namespace TankChem.Storage;

/// <summary>Minimum, mean and maximum per bucket over some series of one table.</summary>
/// <remarks>
/// A bucket narrower than an hour is read from the values. A wider one is made of whole hours, a very wide one of whole days, so that
/// a year costs a few thousand figures; what the range cuts off an hour at its ends is read from the values. Either way
/// each value between the two ends counts exactly once.
/// </remarks>
internal sealed class TrendReader
{
    /// <summary>Up to here the values are read even where hours would do: it is fast, and the buckets are equal to the millisecond.</summary>
    private const long ValuesUpToMs = 2 * Hours.InADay * Hours.Ms;

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
        bool wholeHours = fromMs % Hours.Ms == 0 && Span % (points * Hours.Ms) == 0;
        if (wholeHours)
            return ReadSteps(series, Hours.Ms, fromMs, Span / points);
        if (Span < points * Hours.Ms || Span <= ValuesUpToMs)
            return ReadValues(series);
        long step = Span >= points * Hours.InADay * Hours.Ms ? Hours.InADay * Hours.Ms : Hours.Ms;
        return ReadSteps(series, step, Hours.Floor(fromMs, step), Hours.Ceiling(CeilingDivide(Span, points), step));
    }

    private List<TrendBucket> ReadValues(IReadOnlyList<long> series)
    {
        foreach (long id in series)
            AddValues(id, fromMs, toMs, $"(time_ms - {fromMs}) * {points} / {Span}");
        return Buckets(i => fromMs + CeilingDivide(i * Span, points));
    }

    private List<TrendBucket> ReadSteps(IReadOnlyList<long> series, long step, long anchor, long width)
    {
        // When the first bucket is cut short, the last one takes the rest, which is less than a step.
        string index = $"min(({{0}} - {anchor}) / {width}, {points - 1})";
        foreach (long id in series)
            AddRange(id, fromMs, toMs, step, index);
        return Buckets(i => i == 0 ? fromMs : i == points ? toMs : Math.Min(toMs, anchor + (i * width)));
    }

    /// <summary>Whole steps from the figures of that step, the two ends from the next finer ones, in the end from the values.</summary>
    private void AddRange(long series, long start, long end, long step, string index)
    {
        if (start >= end)
            return;
        long first = Hours.Ceiling(start, step), last = Hours.Floor(end, step);
        if (first >= last)
        {
            AddFiner(series, start, end, step, index);
            return;
        }

        AddFiner(series, start, first, step, index);
        AddFigures(series, first, last, step, index);
        AddFiner(series, last, end, step, index);
    }

    private void AddFiner(long series, long start, long end, long step, string index)
    {
        if (step > Hours.Ms)
            AddRange(series, start, end, Hours.Ms, index);
        else if (start < end)
            AddValues(series, start, end, Format(index, "time_ms"));
    }

    private void AddFigures(long series, long start, long end, long step, string index) => Add(
        $"""
        SELECT {Format(index, $"start_h * {Hours.Ms}")} AS bucket, min(lowest), sum(total), max(highest), sum(counted) FROM {table.Rollup}
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

    private List<TrendBucket> Buckets(Func<long, long> edge) =>
        [.. sums.Select(b => new TrendBucket(RowMapping.Time(edge(b.Key)), RowMapping.Time(edge(b.Key + 1)), b.Value.Lowest, b.Value.Total / b.Value.Counted, b.Value.Highest, b.Value.Counted))];

    /// <summary>The first whole millisecond of a bucket, so that the printed edges say exactly which values are in it.</summary>
    private static long CeilingDivide(long a, long b) => (a + b - 1) / b;

    private static string Format(string index, string time) => index.Replace("{0}", time, StringComparison.Ordinal);

    private readonly record struct Sum(double Lowest, double Total, double Highest, long Counted)
    {
        public Sum With(in Sum other) => new(Math.Min(Lowest, other.Lowest), Total + other.Total, Math.Max(Highest, other.Highest), Counted + other.Counted);
    }
}
