using TankChem.Monitoring.Places;

namespace TankChem.Monitoring.Logbook;

/// <summary>What somebody did or saw. Entries are added, never changed.</summary>
public sealed record LogEntry
{
    /// <summary>Row id in the store; 0 before it is there.</summary>
    public long Id { get; init; }

    /// <summary>Where.</summary>
    public required PlaceKey Place { get; init; }

    /// <summary>When it happened (a sample: when it was drawn).</summary>
    public required DateTimeOffset At { get; init; }

    /// <summary>When it was written down.</summary>
    public required DateTimeOffset RecordedAt { get; init; }

    /// <summary>What it is about.</summary>
    public required LogKind Kind { get; init; }

    /// <summary>Who wrote it; not verified until sign-in exists.</summary>
    public required string Who { get; init; }

    /// <summary>In words.</summary>
    public required string Text { get; init; }

    /// <summary>Its number (kg of feed, animals lost, m³ exchanged, g dosed, the titration as typed); null when it has none.</summary>
    public double? Amount { get; init; }

    /// <summary>Unit of <see cref="Amount"/>.</summary>
    public string? Unit { get; init; }

    /// <summary>Reagent, stock group or quantity that it is about; null when none.</summary>
    public string? Subject { get; init; }
}
