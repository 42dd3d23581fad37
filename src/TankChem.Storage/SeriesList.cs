using Microsoft.Data.Sqlite;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Storage;

/// <summary>Which series a place has.</summary>
internal static class SeriesList
{
    /// <summary>Series of readings of a quantity, or of all.</summary>
    public static IReadOnlyList<Entry> Readings(SqliteConnection connection, PlaceKey place, string? quantity)
    {
        using SqliteCommand command = Command(connection, "SELECT id, quantity, probe FROM series WHERE site = $site AND place = $place AND ($quantity IS NULL OR quantity = $quantity)", place, quantity);
        var found = new List<Entry>();
        using SqliteDataReader reader = command.ExecuteReader();
        while (reader.Read())
            found.Add(new Entry(reader.GetInt64(0), new SeriesKey(place, reader.GetString(1), reader.GetString(2))));
        return found;
    }

    /// <summary>Ids of the series of a water-state value; none or one.</summary>
    public static IReadOnlyList<long> States(SqliteConnection connection, PlaceKey place, string quantity)
    {
        using SqliteCommand command = Command(connection, "SELECT id FROM state_series WHERE site = $site AND place = $place AND quantity = $quantity", place, quantity);
        return command.ExecuteScalar() is long id ? [id] : [];
    }

    private static SqliteCommand Command(SqliteConnection connection, string sql, PlaceKey place, string? quantity)
    {
        SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        command.Parameters.AddWithValue("$site", place.Site);
        command.Parameters.AddWithValue("$place", place.Place);
        command.Parameters.AddWithValue("$quantity", quantity ?? (object)DBNull.Value);
        return command;
    }

    /// <summary>A series and its id in the store.</summary>
    internal readonly record struct Entry(long Id, SeriesKey Key);
}
