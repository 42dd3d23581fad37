namespace TankChem.Monitoring.Ports;

/// <summary>The store cannot take anything now; the same batch may be tried again.</summary>
public sealed class JournalUnavailableException : Exception
{
    /// <summary>With the store's own words.</summary>
    public JournalUnavailableException(string message, Exception innerException)
        : base(message, innerException)
    {
    }

    /// <summary>With a message.</summary>
    public JournalUnavailableException(string message)
        : base(message)
    {
    }

    /// <summary>Without details.</summary>
    public JournalUnavailableException()
    {
    }
}

/// <summary>One row of a batch cannot be stored, whatever the disk does: split the batch.</summary>
public sealed class JournalRowException : Exception
{
    /// <summary>With the store's own words.</summary>
    public JournalRowException(string message, Exception innerException)
        : base(message, innerException)
    {
    }

    /// <summary>With a message.</summary>
    public JournalRowException(string message)
        : base(message)
    {
    }

    /// <summary>Without details.</summary>
    public JournalRowException()
    {
    }
}
