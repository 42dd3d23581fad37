using TankChem.Monitoring.Places;

namespace TankChem.Monitoring.Water;

/// <summary>What the water of a place is at one instant.</summary>
public sealed record WaterState
{
    /// <summary>Which place.</summary>
    public required PlaceKey Place { get; init; }

    /// <summary>What kind of place.</summary>
    public required PlaceKind Kind { get; init; }

    /// <summary>Whether somebody set it up.</summary>
    public required bool Assigned { get; init; }

    /// <summary>The instant; null when there was never a reading.</summary>
    public required DateTimeOffset? Time { get; init; }

    /// <summary>How complete it is.</summary>
    public required WaterStatus Status { get; init; }

    /// <summary>What cannot be computed and why; null when nothing is missing.</summary>
    public required string? Reason { get; init; }

    /// <summary>Values by quantity id (names of docs/api.md).</summary>
    public required IReadOnlyDictionary<string, WaterValue> Values { get; init; }
}
