using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Ports;

/// <summary>All that one commit holds: either all of it is on disk or none.</summary>
public sealed record JournalBatch
{
    /// <summary>Readings; one that is already there with the same value is skipped, with another value it is a correction.</summary>
    public IReadOnlyList<Reading> Readings { get; init; } = [];

    /// <summary>Water states to keep.</summary>
    public IReadOnlyList<WaterState> States { get; init; } = [];

    /// <summary>Lines of the alarm journal.</summary>
    public IReadOnlyList<AlarmJournalEntry> AlarmEntries { get; init; } = [];

    /// <summary>Alarm states that changed.</summary>
    public IReadOnlyList<KeyValuePair<AlarmKey, AlarmState>> AlarmStates { get; init; } = [];

    /// <summary>Payloads that could not be read.</summary>
    public IReadOnlyList<UnreadablePayload> Unreadable { get; init; } = [];

    /// <summary>Logbook entries.</summary>
    public IReadOnlyList<LogEntry> Log { get; init; } = [];

    /// <summary>Losses.</summary>
    public IReadOnlyList<LossRecord> Losses { get; init; } = [];

    /// <summary>Places set up or changed by a person (or that showed up by publishing).</summary>
    public IReadOnlyList<PlaceDefinition> Places { get; init; } = [];

    /// <summary>Readings kept earlier whose canonical value, flag and reason are derived anew (a unit was confirmed); raw value and unit stay.</summary>
    public IReadOnlyList<Reading> Rederived { get; init; } = [];
}
