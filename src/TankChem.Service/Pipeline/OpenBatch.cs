using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Monitors;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Service.Pipeline;

/// <summary>What the next commit will hold.</summary>
internal sealed class OpenBatch
{
    private readonly List<WaterState> states = [];
    private readonly List<AlarmJournalEntry> alarmEntries = [];
    private readonly Dictionary<AlarmKey, AlarmState> alarmStates = [];

    /// <summary>Readings.</summary>
    public List<Reading> Readings { get; } = [];

    /// <summary>Payloads that could not be read.</summary>
    public List<UnreadablePayload> Unreadable { get; } = [];

    /// <summary>Logbook entries.</summary>
    public List<LogEntry> Log { get; } = [];

    /// <summary>Losses.</summary>
    public List<LossRecord> Losses { get; } = [];

    /// <summary>Places.</summary>
    public List<PlaceDefinition> Places { get; } = [];

    /// <summary>Readings derived anew.</summary>
    public List<Reading> Rederived { get; } = [];

    /// <summary>Takes what a monitor asks to be kept.</summary>
    public void Take(MonitorOutcome outcome)
    {
        if (outcome.StateToKeep is { } state)
            states.Add(state);
        alarmEntries.AddRange(outcome.AlarmEntries);
        foreach (var (key, alarm) in outcome.AlarmStates)
            alarmStates[key] = alarm;
    }

    /// <summary>Closes the batch and starts an empty one.</summary>
    public JournalBatch Seal()
    {
        var sealedBatch = new JournalBatch
        {
            Readings = [.. Readings],
            States = [.. states],
            AlarmEntries = [.. alarmEntries],
            AlarmStates = [.. alarmStates],
            Unreadable = [.. Unreadable],
            Log = [.. Log],
            Losses = [.. Losses],
            Places = [.. Places],
            Rederived = [.. Rederived],
        };
        Readings.Clear();
        states.Clear();
        alarmEntries.Clear();
        alarmStates.Clear();
        Unreadable.Clear();
        Log.Clear();
        Losses.Clear();
        Places.Clear();
        Rederived.Clear();
        return sealedBatch;
    }

    /// <summary>Whether a batch holds anything.</summary>
    public static bool IsEmpty(JournalBatch batch) =>
        batch.Readings.Count + batch.States.Count + batch.AlarmEntries.Count + batch.AlarmStates.Count + batch.Unreadable.Count
        + batch.Log.Count + batch.Losses.Count + batch.Places.Count + batch.Rederived.Count == 0;
}
