namespace TankChem.Alarms;

/// <summary>What can happen to an alarm.</summary>
public enum AlarmEventKind
{
    /// <summary>Its condition holds now. Repeated at every step as long as it does: the on-delay runs by it.</summary>
    ConditionPresent,

    /// <summary>Its condition does not hold now. Repeated likewise: the off-delay runs by it.</summary>
    ConditionAbsent,

    /// <summary>Nobody can tell whether its condition holds (an input is too old). What is, is held.</summary>
    ConditionUnknown,

    /// <summary>A person confirms having seen it.</summary>
    Acknowledge,

    /// <summary>A person clears what is latched.</summary>
    Reset,

    /// <summary>A person hides it until a time.</summary>
    Shelve,

    /// <summary>A person ends a shelf.</summary>
    Unshelve,

    /// <summary>A person takes it out for maintenance.</summary>
    TakeOutOfService,

    /// <summary>A person brings it back.</summary>
    ReturnToService,

    /// <summary>Logic finds it pointless in the plant's state.</summary>
    SuppressByDesign,

    /// <summary>Logic finds it meaningful again.</summary>
    EndSuppression,
}

/// <summary>One event of an alarm.</summary>
/// <param name="Kind">What happens.</param>
/// <param name="Who">Who does it; required for what a person does, null otherwise.</param>
/// <param name="Reason">Why; required to shelve, to take out of service and to suppress by design.</param>
/// <param name="Until">The end of a shelf; required to shelve.</param>
public readonly record struct AlarmEvent(AlarmEventKind Kind, string? Who = null, string? Reason = null, DateTimeOffset? Until = null)
{
    /// <summary>The event of a person's action.</summary>
    public static AlarmEvent Of(AlarmAction action, string? who, string? reason, DateTimeOffset? until) => new(
        action switch
        {
            AlarmAction.Acknowledge => AlarmEventKind.Acknowledge,
            AlarmAction.Shelve => AlarmEventKind.Shelve,
            AlarmAction.Unshelve => AlarmEventKind.Unshelve,
            AlarmAction.OutOfService => AlarmEventKind.TakeOutOfService,
            AlarmAction.ReturnToService => AlarmEventKind.ReturnToService,
            AlarmAction.Reset => AlarmEventKind.Reset,
        },
        who,
        reason,
        until);
}
