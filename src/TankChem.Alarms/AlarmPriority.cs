namespace TankChem.Alarms;

/// <summary>How much an alarm matters: from the consequence and the time there is to respond.</summary>
public enum AlarmPriority
{
    /// <summary>To be seen on the next round.</summary>
    Low = 1,

    /// <summary>A warning: act today.</summary>
    Medium = 2,

    /// <summary>Urgent: stock is in danger within hours.</summary>
    High = 3,

    /// <summary>People in danger, or stock lost within minutes.</summary>
    Critical = 4,
}
