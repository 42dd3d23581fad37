using Microsoft.Data.Sqlite;

namespace TankChem.Storage;

/// <summary>Keeps the hour and day figures of one table in step with it, in the transaction that changes the table.</summary>
/// <remarks>
/// New values are added to the figures. Where a value was replaced, the hour is computed anew from the table:
/// a lowest or highest value cannot be taken out of a figure again.
/// </remarks>
internal sealed class RollupWriter : IDisposable
{
    private readonly Dictionary<(long Series, long Hour), Figure> added = [];
    private readonly Dictionary<(long Series, long Day), Figure> addedDays = [];
    private readonly HashSet<(long Series, long Hour)> changed = [];
    private readonly HashSet<(long Series, long Day)> changedDays = [];
    private readonly SqliteCommand add;
    private readonly SqliteCommand remove;
    private readonly SqliteCommand hourFromTable;
    private readonly SqliteCommand dayFromHours;

    public RollupWriter(SqliteConnection connection, SeriesTable table)
    {
        add = Prepare(connection, $"""
            INSERT INTO {table.Rollup} ({table.Id}, step_h, start_h, lowest, highest, total, counted) VALUES ($series, $step, $start, $lowest, $highest, $total, $counted)
            ON CONFLICT DO UPDATE SET lowest = min(lowest, excluded.lowest), highest = max(highest, excluded.highest), total = total + excluded.total, counted = counted + excluded.counted
            """);
        remove = Prepare(connection, $"DELETE FROM {table.Rollup} WHERE {table.Id} = $series AND step_h = $step AND start_h = $start");
        hourFromTable = Prepare(connection, $"""
            INSERT INTO {table.Rollup} ({table.Id}, step_h, start_h, lowest, highest, total, counted)
            SELECT $series, $step, $start, min(value), max(value), sum(value), count(*) FROM {table.Name}
            WHERE {table.Id} = $series AND time_ms >= $start * {Hours.Ms} AND time_ms < ($start + 1) * {Hours.Ms} AND {table.Counts} HAVING count(*) > 0
            """);
        dayFromHours = Prepare(connection, $"""
            INSERT INTO {table.Rollup} ({table.Id}, step_h, start_h, lowest, highest, total, counted)
            SELECT $series, $step, $start, min(lowest), max(highest), sum(total), sum(counted) FROM {table.Rollup}
            WHERE {table.Id} = $series AND step_h = 1 AND start_h >= $start AND start_h < $start + {Hours.InADay} HAVING count(*) > 0
            """);
    }

    /// <summary>A value that was not there before.</summary>
    public void Add(long series, long timeMs, double value)
    {
        (long, long) key = (series, Hours.Of(timeMs));
        added[key] = added.TryGetValue(key, out Figure figure) ? figure.With(value) : new Figure(value, value, value, 1);
    }

    /// <summary>A value that replaced another, or that counts now or no longer.</summary>
    public void Change(long series, long timeMs) => changed.Add((series, Hours.Of(timeMs)));

    /// <summary>Writes what was told since the last time.</summary>
    public void Flush(SqliteTransaction transaction)
    {
        if (added.Count + changed.Count == 0)
            return;
        foreach (SqliteCommand command in new[] { add, remove, hourFromTable, dayFromHours })
            command.Transaction = transaction;
        foreach ((long series, long hour) in changed)
        {
            Recompute(hourFromTable, series, 1, hour);
            changedDays.Add((series, Hours.DayOf(hour)));
        }

        foreach (((long series, long hour) key, Figure figure) in added)
        {
            if (changed.Contains(key))
                continue;
            Add(key.series, 1, key.hour, figure);
            (long, long) day = (key.series, Hours.DayOf(key.hour));
            addedDays[day] = addedDays.TryGetValue(day, out Figure sum) ? sum.With(figure) : figure;
        }

        foreach (((long series, long day) key, Figure figure) in addedDays)
        {
            if (!changedDays.Contains(key))
                Add(key.series, Hours.InADay, key.day, figure);
        }

        foreach ((long series, long day) in changedDays)
            Recompute(dayFromHours, series, Hours.InADay, day);
        added.Clear();
        addedDays.Clear();
        changed.Clear();
        changedDays.Clear();
    }

    public void Dispose()
    {
        add.Dispose();
        remove.Dispose();
        hourFromTable.Dispose();
        dayFromHours.Dispose();
    }

    private void Add(long series, long step, long start, in Figure figure)
    {
        Key(add, series, step, start);
        add.Parameters[3].Value = figure.Lowest;
        add.Parameters[4].Value = figure.Highest;
        add.Parameters[5].Value = figure.Total;
        add.Parameters[6].Value = figure.Counted;
        add.ExecuteNonQuery();
    }

    private void Recompute(SqliteCommand source, long series, long step, long start)
    {
        Key(remove, series, step, start);
        remove.ExecuteNonQuery();
        Key(source, series, step, start);
        source.ExecuteNonQuery();
    }

    private static void Key(SqliteCommand command, long series, long step, long start)
    {
        command.Parameters[0].Value = series;
        command.Parameters[1].Value = step;
        command.Parameters[2].Value = start;
    }

    private static SqliteCommand Prepare(SqliteConnection connection, string sql)
    {
        SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        foreach (string name in new[] { "$series", "$step", "$start", "$lowest", "$highest", "$total", "$counted" })
        {
            if (sql.Contains(name, StringComparison.Ordinal))
                command.Parameters.Add(new SqliteParameter { ParameterName = name });
        }

        return command;
    }

    private readonly record struct Figure(double Lowest, double Highest, double Total, long Counted)
    {
        public Figure With(double value) => new(Math.Min(Lowest, value), Math.Max(Highest, value), Total + value, Counted + 1);

        public Figure With(in Figure other) => new(Math.Min(Lowest, other.Lowest), Math.Max(Highest, other.Highest), Total + other.Total, Counted + other.Counted);
    }
}
