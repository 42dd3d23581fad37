using Microsoft.Data.Sqlite;
using TankChem.Monitoring.Bodies;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;
using TankChem.Storage.Model;

namespace TankChem.Storage;

/// <summary>The series' prepared statements on the writer's connection.</summary>
internal sealed class SeriesWriter : IDisposable
{
    private const string InsertReading = """
        INSERT INTO reading (series_id, time_ms, received_ms, raw_value, raw_unit, value, flag, reason, origin)
        VALUES ($series, $time, $received, $raw, $unit, $value, $flag, $reason, $origin) ON CONFLICT DO NOTHING
        """;

    private const string KeepOldValue = """
        INSERT INTO correction (series_id, time_ms, received_ms, raw_value, raw_unit, value, flag, reason, origin, superseded_ms)
        SELECT series_id, time_ms, received_ms, raw_value, raw_unit, value, flag, reason, origin, $received FROM reading
        WHERE series_id = $series AND time_ms = $time AND (raw_value <> $raw OR raw_unit IS NOT $unit)
        """;

    private const string TakeNewValue = """
        UPDATE reading SET received_ms = $received, raw_value = $raw, raw_unit = $unit, value = $value, flag = $flag, reason = $reason, origin = $origin
        WHERE series_id = $series AND time_ms = $time
        """;

    private const string Rederive = "UPDATE reading SET value = $value, flag = $flag, reason = $reason WHERE series_id = $series AND time_ms = $time";

    private const string InsertState = "INSERT INTO state_value (state_series_id, time_ms, value, u) VALUES ($series, $time, $value, $u) ON CONFLICT DO NOTHING";

    private const string ReplaceState = """
        UPDATE state_value SET value = $value, u = $u WHERE state_series_id = $series AND time_ms = $time AND (value <> $value OR u IS NOT $u)
        """;

    private readonly Dictionary<SeriesKey, long> seriesIds = [];
    private readonly Dictionary<(PlaceKey Place, string Quantity), long> stateSeriesIds = [];
    private readonly SqliteConnection connection;
    private readonly SqliteCommand insertReading;
    private readonly SqliteCommand keepOldValue;
    private readonly SqliteCommand takeNewValue;
    private readonly SqliteCommand rederive;
    private readonly SqliteCommand insertState;
    private readonly SqliteCommand replaceState;
    private readonly RollupWriter readingRollups;
    private readonly RollupWriter stateRollups;

    public SeriesWriter(SqliteConnection connection)
    {
        this.connection = connection;
        string[] reading = ["$series", "$time", "$received", "$raw", "$unit", "$value", "$flag", "$reason", "$origin"];
        insertReading = Prepare(InsertReading, reading);
        keepOldValue = Prepare(KeepOldValue, "$series", "$time", "$received", "$raw", "$unit");
        takeNewValue = Prepare(TakeNewValue, reading);
        rederive = Prepare(Rederive, "$series", "$time", "$value", "$flag", "$reason");
        insertState = Prepare(InsertState, "$series", "$time", "$value", "$u");
        replaceState = Prepare(ReplaceState, "$series", "$time", "$value", "$u");
        readingRollups = new RollupWriter(connection, SeriesTable.Readings);
        stateRollups = new RollupWriter(connection, SeriesTable.States);
    }

    public void Write(JournalBatch batch, SqliteTransaction transaction)
    {
        foreach (SqliteCommand command in new[] { insertReading, keepOldValue, takeNewValue, rederive, insertState, replaceState })
            command.Transaction = transaction;
        for (int i = 0; i < batch.Readings.Count; i++)
            Write(batch.Readings[i], transaction);
        for (int i = 0; i < batch.States.Count; i++)
            Write(batch.States[i], transaction);
        for (int i = 0; i < batch.Rederived.Count; i++)
            WriteRederived(batch.Rederived[i], transaction);
        readingRollups.Flush(transaction);
        stateRollups.Flush(transaction);
    }

    public void Dispose()
    {
        insertReading.Dispose();
        keepOldValue.Dispose();
        takeNewValue.Dispose();
        rederive.Dispose();
        insertState.Dispose();
        replaceState.Dispose();
        readingRollups.Dispose();
        stateRollups.Dispose();
    }

    private void Write(Reading reading, SqliteTransaction transaction)
    {
        CheckStorable(reading);
        long id = SeriesId(reading.Series, transaction);
        long ms = RowMapping.Ms(reading.Time);
        Fill(insertReading, id, reading);
        if (insertReading.ExecuteNonQuery() > 0)
        {
            if (reading.IsUsable)
                readingRollups.Add(id, ms, reading.Value!.Value);
            return;
        }

        // The identity is there already: the same value again changes nothing, another one is a correction and the old one is kept.
        SqliteParameterCollection p = keepOldValue.Parameters;
        p[0].Value = id;
        p[1].Value = ms;
        p[2].Value = RowMapping.Ms(reading.ReceivedAt);
        p[3].Value = reading.RawValue;
        p[4].Value = reading.RawUnit ?? (object)DBNull.Value;
        if (keepOldValue.ExecuteNonQuery() == 0)
            return;
        Fill(takeNewValue, id, reading);
        takeNewValue.ExecuteNonQuery();
        readingRollups.Change(id, ms);
    }

    /// <summary>A number that is none would pass into every mean; it is refused here, whatever let it through.</summary>
    private static void CheckStorable(Reading reading)
    {
        if (!double.IsFinite(reading.RawValue) || reading.Value is { } value && !double.IsFinite(value))
            throw new JournalRowException($"The reading of {reading.Series} at {Rfc3339.Text(reading.Time)} has a value that is not a finite number.");
    }

    private static void Fill(SqliteCommand command, long id, Reading reading)
    {
        SqliteParameterCollection p = command.Parameters;
        p[0].Value = id;
        p[1].Value = RowMapping.Ms(reading.Time);
        p[2].Value = RowMapping.Ms(reading.ReceivedAt);
        p[3].Value = reading.RawValue;
        p[4].Value = reading.RawUnit ?? (object)DBNull.Value;
        p[5].Value = reading.Value ?? (object)DBNull.Value;
        p[6].Value = (int)reading.Flag;
        p[7].Value = reading.Reason ?? (object)DBNull.Value;
        p[8].Value = (int)reading.Origin;
    }

    private void WriteRederived(Reading reading, SqliteTransaction transaction)
    {
        CheckStorable(reading);
        SqliteParameterCollection p = rederive.Parameters;
        long id = SeriesId(reading.Series, transaction);
        long ms = RowMapping.Ms(reading.Time);
        p[0].Value = id;
        p[1].Value = ms;
        p[2].Value = reading.Value ?? (object)DBNull.Value;
        p[3].Value = (int)reading.Flag;
        p[4].Value = reading.Reason ?? (object)DBNull.Value;
        if (rederive.ExecuteNonQuery() > 0)
            readingRollups.Change(id, ms);
    }

    private void Write(WaterState state, SqliteTransaction transaction)
    {
        if (state.Time is not { } time)
            return;
        long ms = RowMapping.Ms(time);
        foreach ((string quantity, WaterValue value) in state.Values)
        {
            // A value that is only the last known one says nothing of this instant.
            if (value.Stale)
                continue;
            if (!double.IsFinite(value.Value) || value.U is { } u && !double.IsFinite(u))
                throw new JournalRowException($"The {quantity} of {state.Place} at {Rfc3339.Text(time)} is not a finite number.");
            long id = StateSeriesId(state.Place, quantity, transaction);
            Fill(insertState, id, ms, value);
            if (insertState.ExecuteNonQuery() > 0)
            {
                stateRollups.Add(id, ms, value.Value);
                continue;
            }

            Fill(replaceState, id, ms, value);
            if (replaceState.ExecuteNonQuery() > 0)
                stateRollups.Change(id, ms);
        }
    }

    private static void Fill(SqliteCommand command, long id, long ms, WaterValue value)
    {
        SqliteParameterCollection p = command.Parameters;
        p[0].Value = id;
        p[1].Value = ms;
        p[2].Value = value.Value;
        p[3].Value = value.U ?? (object)DBNull.Value;
    }

    private long SeriesId(in SeriesKey key, SqliteTransaction transaction)
    {
        if (seriesIds.TryGetValue(key, out long id))
            return id;
        using SqliteCommand command = connection.CreateCommand();
        command.Transaction = transaction;
        command.CommandText = "INSERT INTO series (site, place, quantity, probe) VALUES ($site, $place, $quantity, $probe) ON CONFLICT DO UPDATE SET site = excluded.site RETURNING id";
        command.Parameters.AddWithValue("$site", key.Place.Site ?? (object)DBNull.Value);
        command.Parameters.AddWithValue("$place", key.Place.Place ?? (object)DBNull.Value);
        command.Parameters.AddWithValue("$quantity", key.Quantity ?? (object)DBNull.Value);
        command.Parameters.AddWithValue("$probe", key.Probe ?? (object)DBNull.Value);
        id = (long)command.ExecuteScalar()!;
        seriesIds[key] = id;
        return id;
    }

    private long StateSeriesId(in PlaceKey place, string quantity, SqliteTransaction transaction)
    {
        if (stateSeriesIds.TryGetValue((place, quantity), out long id))
            return id;
        using SqliteCommand command = connection.CreateCommand();
        command.Transaction = transaction;
        command.CommandText = "INSERT INTO state_series (site, place, quantity) VALUES ($site, $place, $quantity) ON CONFLICT DO UPDATE SET site = excluded.site RETURNING id";
        command.Parameters.AddWithValue("$site", place.Site);
        command.Parameters.AddWithValue("$place", place.Place);
        command.Parameters.AddWithValue("$quantity", quantity);
        id = (long)command.ExecuteScalar()!;
        stateSeriesIds[(place, quantity)] = id;
        return id;
    }

    private SqliteCommand Prepare(string sql, params string[] parameters)
    {
        SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        foreach (string name in parameters)
            command.Parameters.Add(new SqliteParameter { ParameterName = name });
        return command;
    }
}
