using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Service.Pipeline;
using TankChem.Simulation.Demo;

namespace TankChem.Service.Demo;

/// <summary>Makes the demo's past at the first start: the simulated month goes through the same engine as live readings do, with the time it had then.</summary>
internal sealed class DemoHistory(DemoScenario scenario, FarmEngine engine, IJournal journal, IRecovery recovery, ILogger<DemoHistory> logger)
{
    private const int ReadingsPerCommit = 5_000;

    /// <summary>Writes the past when the store has none.</summary>
    public void WriteOnce()
    {
        if (recovery.LoadLatestReadings().Count > 0)
            return;
        long start = TimeProvider.System.GetTimestamp();
        DateTimeOffset time = DateTimeOffset.MinValue;
        foreach (SimulatedEvent happened in scenario.History(DemoSite.HistoryLength))
        {
            if (happened.At != time)
            {
                Pass(time);
                time = happened.At;
            }

            Take(happened);
        }

        Pass(time);
        Commit();
        TimeSpan took = TimeProvider.System.GetElapsedTime(start);
        logger.LogInformation("Made {Readings} readings of demo history in {Took}", engine.ReadingsTaken, took);
    }

    private void Pass(DateTimeOffset time)
    {
        if (time == DateTimeOffset.MinValue)
            return;
        engine.Advance(time, all: true);
        if (engine.Batch.Readings.Count >= ReadingsPerCommit)
            Commit();
    }

    private void Commit()
    {
        JournalBatch batch = engine.Seal();
        journal.Commit(batch);
        engine.Tell(batch);
    }

    private void Take(SimulatedEvent happened)
    {
        switch (happened)
        {
            case SimulatedReading reading:
                engine.Take(new ParsedReading(new SeriesKey(DemoRecords.Key(reading.Place), reading.Quantity, reading.Probe), reading.Value, DemoUnits.Sent(reading), reading.At), reading.At, ReadingOrigin.Imported);
                break;
            case SimulatedDeviceState device:
                engine.Take(new ParsedReading(new SeriesKey(DemoRecords.Key(device.Place), SeriesKey.DeviceState, device.Device), device.IsOn ? 1 : 0, null, device.At), device.At, ReadingOrigin.Imported);
                break;
            case SimulatedLogEntry entry:
                engine.Batch.Log.Add(DemoRecords.Log(entry));
                if (DemoRecords.Titration(entry) is { } titration)
                    engine.Take(titration, entry.At, ReadingOrigin.Manual);
                break;
            case SimulatedLoss loss:
                engine.Batch.Losses.Add(DemoRecords.Loss(loss));
                break;
            case SimulatedAcknowledgement acknowledgement:
                Acknowledge(acknowledgement);
                break;
        }
    }

    private void Acknowledge(SimulatedAcknowledgement acknowledgement)
    {
        PlaceKey place = DemoRecords.Key(acknowledgement.Place);
        foreach (AlarmView alarm in engine.Find(place)?.Monitor.Snapshot.Alarms ?? [])
        {
            if (alarm.NeedsAcknowledgement && alarm.Key.Rule.StartsWith(acknowledgement.RulePrefix, StringComparison.Ordinal))
                engine.Apply(new AlarmCommand(alarm.Key, AlarmAction.Acknowledge, acknowledgement.Who, acknowledgement.Reason, null), acknowledgement.At);
        }
    }
}
