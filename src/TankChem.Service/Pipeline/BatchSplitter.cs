using System.Text;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Service.Pipeline;

/// <summary>Stores a batch of which one row cannot be stored: by halves, until the row is found, which is then kept as unreadable with its reason.</summary>
internal sealed class BatchSplitter(IJournal journal, TimeProvider clock, ILogger logger)
{
    /// <summary>Commits all that can be.</summary>
    /// <exception cref="JournalUnavailableException">The store takes nothing; what was committed already is deduplicated when the batch is tried again.</exception>
    public void CommitInParts(JournalBatch batch)
    {
        CommitReadings(batch.Readings);
        CommitRest(batch with { Readings = [] });
    }

    private void CommitReadings(IReadOnlyList<Reading> readings)
    {
        if (readings.Count == 0)
            return;
        try
        {
            journal.Commit(new JournalBatch { Readings = readings });
        }
        catch (JournalRowException e) when (readings.Count == 1)
        {
            Reading bad = readings[0];
            logger.LogError(e, "The reading {Series} at {Time} cannot be stored; it is kept as unreadable", bad.Series, bad.Time);
            byte[] head = Encoding.UTF8.GetBytes($"{bad.RawValue:R} {bad.RawUnit}");
            journal.Commit(new JournalBatch
            {
                Unreadable = [new UnreadablePayload($"{bad.Series.Place}/{bad.Series.Quantity}/{bad.Series.Probe}", clock.GetUtcNow(), head.Length, head, $"The store refused this reading: {e.Message}", null)],
            });
        }
        catch (JournalRowException)
        {
            int half = readings.Count / 2;
            CommitReadings([.. readings.Take(half)]);
            CommitReadings([.. readings.Skip(half)]);
        }
    }

    private void CommitRest(JournalBatch rest)
    {
        if (OpenBatch.IsEmpty(rest))
            return;
        try
        {
            journal.Commit(rest);
        }
        catch (JournalRowException)
        {
            // The alarm journal and the alarm states matter most: they get a commit of their own before the derived rest, which replay can make again.
            journal.Commit(new JournalBatch { AlarmEntries = rest.AlarmEntries, AlarmStates = rest.AlarmStates, Log = rest.Log, Losses = rest.Losses, Places = rest.Places, Unreadable = rest.Unreadable });
            try
            {
                journal.Commit(new JournalBatch { States = rest.States, Rederived = rest.Rederived });
            }
            catch (JournalRowException e)
            {
                logger.LogError(e, "A derived state cannot be stored and is left out of the history; its readings are there");
            }
        }
    }
}
