using System.Text.Json;
using Microsoft.Data.Sqlite;
using Microsoft.EntityFrameworkCore;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Storage.Model;

namespace TankChem.Storage;

/// <summary>Reads back what a start needs.</summary>
internal sealed class SqliteRecovery(SqliteConnections connections) : IRecovery
{
    private const string Columns = $"s.site, s.place, s.quantity, s.probe, {ReadingReader.Columns}";

    // Each series is one seek from its end, however long its history is.
    private const string Latest = $"""
        SELECT {Columns} FROM series s JOIN reading r ON r.series_id = s.id
        WHERE r.time_ms = (SELECT max(n.time_ms) FROM reading n WHERE n.series_id = s.id)
        """;

    private const string LatestUsable = $"""
        SELECT {Columns} FROM series s JOIN reading r ON r.series_id = s.id
        WHERE r.time_ms = (SELECT n.time_ms FROM reading n WHERE n.series_id = s.id AND n.flag = 1 AND n.value IS NOT NULL ORDER BY n.time_ms DESC LIMIT 1)
        """;

    public IReadOnlyList<KeyValuePair<AlarmKey, AlarmState>> LoadAlarmStates()
    {
        using SqliteConnection connection = connections.OpenReader();
        using StoreContext context = SqliteConnections.Context(connection);
        return [.. context.AlarmStates.AsNoTracking().AsEnumerable().Select(RowMapping.FromRow).Where(a => a.Value != AlarmState.Normal)];
    }

    public IReadOnlyList<Reading> LoadLatestReadings()
    {
        using SqliteConnection connection = connections.OpenReader();
        var readings = new Dictionary<(SeriesKey, DateTimeOffset), Reading>();
        foreach (string sql in new[] { LatestUsable, Latest })
        {
            using SqliteCommand command = connection.CreateCommand();
            command.CommandText = sql;
            using SqliteDataReader reader = command.ExecuteReader();
            while (reader.Read())
            {
                Reading reading = ReadingReader.One(reader, new SeriesKey(new PlaceKey(reader.GetString(0), reader.GetString(1)), reader.GetString(2), reader.GetString(3)), 4);
                readings[(reading.Series, reading.Time)] = reading;
            }
        }

        return [.. readings.Values];
    }

    public IReadOnlyList<PlaceDefinition> LoadPlaces()
    {
        using SqliteConnection connection = connections.OpenReader();
        using StoreContext context = SqliteConnections.Context(connection);
        return [.. context.Places.AsNoTracking().AsEnumerable().Select(r => JsonSerializer.Deserialize<PlaceDefinition>(r.Definition, PlaceJson.Options) ?? throw new InvalidDataException($"The set-up of {r.Site}/{r.Place} in the store is empty."))];
    }

    public IReadOnlyList<Reading> LoadUnconfirmed(SeriesKey series, DateTimeOffset from, int limit)
    {
        using SqliteConnection connection = connections.OpenReader();
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = $"""
            SELECT {ReadingReader.Columns}
            FROM reading r JOIN series s ON s.id = r.series_id
            WHERE s.site = $site AND s.place = $place AND s.quantity = $quantity AND s.probe = $probe AND r.time_ms >= $from AND r.raw_unit IS NULL
            ORDER BY r.time_ms LIMIT $limit
            """;
        command.Parameters.AddWithValue("$site", series.Place.Site);
        command.Parameters.AddWithValue("$place", series.Place.Place);
        command.Parameters.AddWithValue("$quantity", series.Quantity);
        command.Parameters.AddWithValue("$probe", series.Probe);
        command.Parameters.AddWithValue("$from", RowMapping.EdgeMs(from));
        command.Parameters.AddWithValue("$limit", limit);
        var kept = new List<Reading>();
        using SqliteDataReader reader = command.ExecuteReader();
        while (reader.Read())
            kept.Add(ReadingReader.One(reader, series, 0));
        return kept;
    }
}
