namespace TankChem.Storage;

/// <summary>The store cannot be opened; the message says why and what to do. The file was not changed.</summary>
public sealed class StoreOpenException : Exception
{
    /// <summary>With a sentence and its cause.</summary>
    public StoreOpenException(string message, Exception innerException)
        : base(message, innerException)
    {
    }

    /// <summary>With a sentence.</summary>
    public StoreOpenException(string message)
        : base(message)
    {
    }

    /// <summary>Without details.</summary>
    public StoreOpenException()
    {
    }
}
