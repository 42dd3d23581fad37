namespace TankChem.Alarms;

/// <summary>Where an alarm stands in its life (states of ISA-18.2 / IEC 62682, from memory).</summary>
public enum AlarmPhase
{
    /// <summary>No condition, nothing to acknowledge.</summary>
    Normal,

    /// <summary>Condition present, nobody has confirmed it.</summary>
    Unacknowledged,

    /// <summary>Condition present and confirmed.</summary>
    Acknowledged,

    /// <summary>Condition gone before anybody confirmed it.</summary>
    ReturnedUnacknowledged,

    /// <summary>Condition gone, held until reset, not confirmed.</summary>
    LatchedUnacknowledged,

    /// <summary>Condition gone, held until reset, confirmed.</summary>
    LatchedAcknowledged,
}
