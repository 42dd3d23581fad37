using Microsoft.Data.Sqlite;
using TankChem.Monitoring.Readings;
using TankChem.Storage.Model;

namespace TankChem.Storage;

/// <summary>Rows of readings to readings.</summary>
internal static class ReadingReader
{
    /// <summary>The columns that <see cref="One"/> reads, in its order.</summary>
    public const string Columns = "r.time_ms, r.received_ms, r.raw_value, r.raw_unit, r.value, r.flag, r.reason, r.origin";

    /// <summary>Adds the first readings of a series in a range, oldest first.</summary>
    public static void AddTo(List<Reading> readings, SqliteConnection connection, in SeriesList.Entry series, long fromMs, long toMs, int limit)
    {
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = $"SELECT {Columns} FROM reading r WHERE r.series_id = $series AND r.time_ms >= $from AND r.time_ms < $to ORDER BY r.time_ms LIMIT $limit";
        command.Parameters.AddWithValue("$series", series.Id);
        command.Parameters.AddWithValue("$from", fromMs);
        command.Parameters.AddWithValue("$to", toMs);
        command.Parameters.AddWithValue("$limit", limit);
        using SqliteDataReader reader = command.ExecuteReader();
        while (reader.Read())
            readings.Add(One(reader, series.Key, 0));
    }

    /// <summary>The reading of a row.</summary>
    public static Reading One(SqliteDataReader reader, in SeriesKey series, int first) => new()
    {
        Series = series,
        Time = RowMapping.Time(reader.GetInt64(first)),
        ReceivedAt = RowMapping.Time(reader.GetInt64(first + 1)),
        RawValue = reader.GetDouble(first + 2),
        RawUnit = reader.IsDBNull(first + 3) ? null : reader.GetString(first + 3),
        Value = reader.IsDBNull(first + 4) ? null : reader.GetDouble(first + 4),
        Flag = (QualityFlag)reader.GetInt32(first + 5),
        Reason = reader.IsDBNull(first + 6) ? null : reader.GetString(first + 6),
        Origin = (ReadingOrigin)reader.GetInt32(first + 7),
    };
}
