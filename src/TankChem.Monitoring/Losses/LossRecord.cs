using TankChem.Monitoring.Places;

namespace TankChem.Monitoring.Losses;

/// <summary>Stock that was lost, as a person recorded it.</summary>
public sealed record LossRecord
{
    /// <summary>Row id in the store; 0 before it is there.</summary>
    public long Id { get; init; }

    /// <summary>Where.</summary>
    public required PlaceKey Place { get; init; }

    /// <summary>When it was found.</summary>
    public required DateTimeOffset FoundAt { get; init; }

    /// <summary>How many animals; null when not counted.</summary>
    public int? Count { get; init; }

    /// <summary>Which stock, in words or by group id.</summary>
    public required string Stock { get; init; }

    /// <summary>Who recorded it.</summary>
    public required string Who { get; init; }

    /// <summary>What was seen.</summary>
    public string Notes { get; init; } = "";

    /// <summary>When it was written down.</summary>
    public required DateTimeOffset RecordedAt { get; init; }
}
