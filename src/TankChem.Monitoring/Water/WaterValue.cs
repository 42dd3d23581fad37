namespace TankChem.Monitoring.Water;

/// <summary>One value of a water state.</summary>
public sealed record WaterValue
{
    /// <summary>The number, canonical unit.</summary>
    public required double Value { get; init; }

    /// <summary>Its unit.</summary>
    public required string Unit { get; init; }

    /// <summary>Standard uncertainty, same unit; null where none exists (a set-point, a device state).</summary>
    public required double? U { get; init; }

    /// <summary>The time it holds for: that of its newest input.</summary>
    public required DateTimeOffset Time { get; init; }

    /// <summary>Older than is used for anything: shown as last known, never computed with.</summary>
    public bool Stale { get; init; }

    /// <summary>What it came from.</summary>
    public IReadOnlyList<WaterInput> Inputs { get; init; } = [];

    /// <summary>What to know beside it.</summary>
    public IReadOnlyList<string> Caveats { get; init; } = [];
}
