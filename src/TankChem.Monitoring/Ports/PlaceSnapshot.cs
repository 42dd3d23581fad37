using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Ports;

/// <summary>A place as it stands now; immutable.</summary>
public sealed record PlaceSnapshot
{
    /// <summary>How it is set up.</summary>
    public required PlaceDefinition Definition { get; init; }

    /// <summary>Its site.</summary>
    public required SiteDefinition Site { get; init; }

    /// <summary>Its water.</summary>
    public required WaterState Water { get; init; }

    /// <summary>Its alarms that are not normal, worst first.</summary>
    public required IReadOnlyList<AlarmView> Alarms { get; init; }

    /// <summary>The limits that hold here, for trends and the corner chart.</summary>
    public required IReadOnlyList<PlaceLimit> Limits { get; init; }

    /// <summary>The newest reading of each of its series, usable or not.</summary>
    public required IReadOnlyList<Reading> Latest { get; init; }

    /// <summary>One plain sentence for Rounds.</summary>
    public required string Sentence { get; init; }

    /// <summary>How urgently it needs a person.</summary>
    public required PlaceUrgency Urgency { get; init; }
}

/// <summary>How urgently a place needs a person; Rounds is sorted by it.</summary>
public enum PlaceUrgency
{
    /// <summary>All is well.</summary>
    Calm,

    /// <summary>Not set up, or nothing known yet.</summary>
    Unknown,

    /// <summary>We cannot vouch for a value: test or look at a probe.</summary>
    Doubt,

    /// <summary>A warning.</summary>
    Warning,

    /// <summary>Stock is in danger.</summary>
    Urgent,

    /// <summary>People are in danger, or stock is being lost.</summary>
    Critical,
}

/// <summary>A limit that holds at a place.</summary>
/// <param name="Quantity">The quantity.</param>
/// <param name="IsUpper">True for a highest value.</param>
/// <param name="Value">Canonical unit.</param>
/// <param name="IsUrgent">True for the urgent limit, false for the warning.</param>
/// <param name="Text">In words: value, stock group.</param>
/// <param name="IsDanger">True for the danger limit: beyond it stock dies. A danger limit is urgent too.</param>
public sealed record PlaceLimit(string Quantity, bool IsUpper, double Value, bool IsUrgent, string Text, bool IsDanger = false);
