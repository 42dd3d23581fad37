using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Monitors;

/// <summary>What a step of a monitor asks to be journalled and told.</summary>
public sealed record MonitorOutcome
{
    /// <summary>Nothing happened.</summary>
    public static MonitorOutcome Nothing { get; } = new();

    /// <summary>The water state to keep on disk, or null when the last kept one still serves (at most one in 10 s, and one at each change that matters).</summary>
    public WaterState? StateToKeep { get; init; }

    /// <summary>Whether the water state or an alarm changed, so that it is worth telling.</summary>
    public bool Changed { get; init; }

    /// <summary>New lines of the alarm journal, in order.</summary>
    public IReadOnlyList<AlarmJournalEntry> AlarmEntries { get; init; } = [];

    /// <summary>Alarm states to write.</summary>
    public IReadOnlyList<KeyValuePair<AlarmKey, AlarmState>> AlarmStates { get; init; } = [];

    /// <summary>The alarms behind <see cref="AlarmStates"/>, as people see them now.</summary>
    public IReadOnlyList<AlarmView> ChangedAlarms { get; init; } = [];

    /// <summary>Why a command was refused: what is wrong and what would be right; null when it was taken.</summary>
    public string? Refusal { get; init; }
}
