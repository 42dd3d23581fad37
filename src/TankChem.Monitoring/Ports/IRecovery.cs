using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Ports;

/// <summary>What the service reads back from the disk at its start, and when a unit is confirmed.</summary>
public interface IRecovery
{
    /// <summary>Every alarm whose state is not plain normal.</summary>
    IReadOnlyList<KeyValuePair<AlarmKey, AlarmState>> LoadAlarmStates();

    /// <summary>The newest reading of every series, and the newest usable one where that is another.</summary>
    IReadOnlyList<Reading> LoadLatestReadings();

    /// <summary>Places that people set up in the dashboard or that showed up by publishing.</summary>
    IReadOnlyList<PlaceDefinition> LoadPlaces();

    /// <summary>Readings of a series that are kept without a confirmed unit, oldest first, at most <paramref name="limit"/>.</summary>
    IReadOnlyList<Reading> LoadUnconfirmed(SeriesKey series, DateTimeOffset from, int limit);
}
