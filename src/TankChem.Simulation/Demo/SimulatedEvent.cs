namespace TankChem.Simulation.Demo;

/// <summary>Something that the demo site tells the service, or that a person there does.</summary>
/// <param name="Place">Id of the place, or <c>site</c>.</param>
/// <param name="At">When it is told; events come in the order of this time.</param>
public abstract record SimulatedEvent(string Place, DateTimeOffset At);

/// <summary>A probe's reading, as the probe sends it.</summary>
/// <param name="Place">Id of the place, or <c>site</c>.</param>
/// <param name="Quantity">Quantity id.</param>
/// <param name="Probe">Probe id.</param>
/// <param name="At">When it was measured and sent.</param>
/// <param name="Value">The number, in <paramref name="Unit"/>.</param>
/// <param name="Unit">Canonical unit of the quantity.</param>
public sealed record SimulatedReading(string Place, string Quantity, string Probe, DateTimeOffset At, double Value, string Unit) : SimulatedEvent(Place, At);

/// <summary>A device that went on or off, or says again what it is.</summary>
/// <param name="Place">Id of the place.</param>
/// <param name="Device">The device: <c>degasser</c>, <c>mains</c> …</param>
/// <param name="IsOn">Whether it runs.</param>
/// <param name="At">When.</param>
public sealed record SimulatedDeviceState(string Place, string Device, bool IsOn, DateTimeOffset At) : SimulatedEvent(Place, At);

/// <summary>What a logbook entry of the demo is about; the names of the service's own kinds.</summary>
public enum SimulatedLogKind
{
    /// <summary>Anything seen or done.</summary>
    Note,

    /// <summary>Feed given, kg.</summary>
    Feed,

    /// <summary>Water exchanged, m³.</summary>
    WaterExchange,

    /// <summary>A titration or test kit; it is a reading taken by hand as well.</summary>
    Titration,

    /// <summary>What went in, g.</summary>
    Dose,

    /// <summary>A probe or a tank cleaned.</summary>
    Cleaning,

    /// <summary>A probe calibrated.</summary>
    Calibration,
}

/// <summary>A logbook entry that a person wrote.</summary>
/// <param name="Place">Id of the place.</param>
/// <param name="Kind">What it is about.</param>
/// <param name="HappenedAt">When it happened; of a titration, when the sample was drawn. A correction has the time of the entry it corrects.</param>
/// <param name="At">When it was written down.</param>
/// <param name="Text">In words.</param>
/// <param name="Who">Who wrote it.</param>
/// <param name="Amount">Its number as typed; null when it has none.</param>
/// <param name="Unit">Unit as typed.</param>
/// <param name="Subject">Quantity (titration: also the quantity of the reading), reagent or device; null when none.</param>
public sealed record SimulatedLogEntry(
    string Place,
    SimulatedLogKind Kind,
    DateTimeOffset HappenedAt,
    DateTimeOffset At,
    string Text,
    string Who,
    double? Amount = null,
    string? Unit = null,
    string? Subject = null) : SimulatedEvent(Place, At);

/// <summary>Stock found dead.</summary>
/// <param name="Place">Id of the place.</param>
/// <param name="FoundAt">When it was found.</param>
/// <param name="At">When it was written down.</param>
/// <param name="Count">How many.</param>
/// <param name="Stock">Which.</param>
/// <param name="Notes">What was seen.</param>
/// <param name="Who">Who recorded it.</param>
public sealed record SimulatedLoss(string Place, DateTimeOffset FoundAt, DateTimeOffset At, int Count, string Stock, string Notes, string Who) : SimulatedEvent(Place, At);

/// <summary>A person acknowledges the alarms of a place.</summary>
/// <param name="Place">Id of the place.</param>
/// <param name="RulePrefix">How the ids of the acknowledged alarm rules start: <c>co2-high</c> also means <c>co2-high-urgent</c> and <c>co2-high-danger</c>.</param>
/// <param name="At">When.</param>
/// <param name="Who">Who.</param>
/// <param name="Reason">Why, in that person's words.</param>
public sealed record SimulatedAcknowledgement(string Place, string RulePrefix, DateTimeOffset At, string Who, string Reason) : SimulatedEvent(Place, At);
