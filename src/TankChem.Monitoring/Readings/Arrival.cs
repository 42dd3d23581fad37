namespace TankChem.Monitoring.Readings;

/// <summary>One message as it came in: readings, or the reason why there are none.</summary>
public sealed record Arrival
{
    /// <summary>When it was received, UTC.</summary>
    public required DateTimeOffset ReceivedAt { get; init; }

    /// <summary>How it came.</summary>
    public required ReadingOrigin Origin { get; init; }

    /// <summary>Its readings; empty when unreadable.</summary>
    public IReadOnlyList<ParsedReading> Readings { get; init; } = [];

    /// <summary>What could not be read, or null.</summary>
    public UnreadablePayload? Unreadable { get; init; }
}
