namespace TankChem.Alarms;

/// <summary>Whether, and how, an alarm is kept from people while it goes on being evaluated and recorded.</summary>
public enum AlarmSuppression
{
    /// <summary>Not kept back.</summary>
    None,

    /// <summary>Hidden by a person for a limited time, with a reason.</summary>
    Shelved,

    /// <summary>Hidden by logic, because the plant's state makes it pointless.</summary>
    ByDesign,

    /// <summary>Taken out for maintenance.</summary>
    OutOfService,
}
