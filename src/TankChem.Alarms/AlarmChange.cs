namespace TankChem.Alarms;

/// <summary>What happened to an alarm; each is one line of the alarm journal.</summary>
public enum AlarmChange
{
    /// <summary>It was raised.</summary>
    Raised,

    /// <summary>Its condition went away and it is normal again, or waits for a confirmation.</summary>
    ReturnedToNormal,

    /// <summary>Its condition went away and it is held until reset.</summary>
    Latched,

    /// <summary>A person confirmed it.</summary>
    Acknowledged,

    /// <summary>It was shelved.</summary>
    Shelved,

    /// <summary>A person ended its shelf.</summary>
    Unshelved,

    /// <summary>Its shelf ran out.</summary>
    ShelfExpired,

    /// <summary>Logic suppressed it.</summary>
    SuppressedByDesign,

    /// <summary>Logic shows it again.</summary>
    SuppressionEnded,

    /// <summary>It was taken out of service.</summary>
    TakenOutOfService,

    /// <summary>It was returned to service.</summary>
    ReturnedToService,

    /// <summary>A latched alarm was reset.</summary>
    Reset,
}
