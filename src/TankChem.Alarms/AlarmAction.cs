namespace TankChem.Alarms;

/// <summary>What a person can do to an alarm.</summary>
public enum AlarmAction
{
    /// <summary>Confirm having seen it.</summary>
    Acknowledge,

    /// <summary>Hide it until a time, with a reason.</summary>
    Shelve,

    /// <summary>Show it again.</summary>
    Unshelve,

    /// <summary>Take it out for maintenance.</summary>
    OutOfService,

    /// <summary>Bring it back.</summary>
    ReturnToService,

    /// <summary>Clear a latched alarm whose condition is gone.</summary>
    Reset,
}
