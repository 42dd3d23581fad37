using Microsoft.Data.Sqlite;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;
using TankChem.Storage.Model;

namespace TankChem.Storage;

/// <summary>Rows of readings to readings; columns: quantity, probe, time, received, raw value, raw unit, value, flag, reason, origin.</summary>
internal static class ReadingReader
{
    public static List<Reading> All(SqliteCommand command, PlaceKey place)
    {
        var readings = new List<Reading>();
        using SqliteDataReader reader = command.ExecuteReader();
        while (reader.Read())
            readings.Add(One(reader, place, 0));
        return readings;
    }

    public static Reading One(SqliteDataReader reader, PlaceKey place, int first) => new()
    {
        Series = new SeriesKey(place, reader.GetString(first), reader.GetString(first + 1)),
        Time = RowMapping.Time(reader.GetInt64(first + 2)),
        ReceivedAt = RowMapping.Time(reader.GetInt64(first + 3)),
        RawValue = reader.GetDouble(first + 4),
        RawUnit = reader.IsDBNull(first + 5) ? null : reader.GetString(first + 5),
        Value = reader.IsDBNull(first + 6) ? null : reader.GetDouble(first + 6),
        Flag = (QualityFlag)reader.GetInt32(first + 7),
        Reason = reader.IsDBNull(first + 8) ? null : reader.GetString(first + 8),
        Origin = (ReadingOrigin)reader.GetInt32(first + 9),
    };
}
