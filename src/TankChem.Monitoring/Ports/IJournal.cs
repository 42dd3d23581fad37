namespace TankChem.Monitoring.Ports;

/// <summary>The one way to the disk. Called by one writer at a time.</summary>
public interface IJournal
{
    /// <summary>Commits a batch; when this returns the batch is on disk (power may go).</summary>
    /// <exception cref="JournalUnavailableException">Nothing of the batch is stored and the same batch may be tried again (disk full, busy, I/O).</exception>
    /// <exception cref="JournalRowException">Nothing of the batch is stored because one row cannot be.</exception>
    void Commit(JournalBatch batch);
}
