using TankChem.Alarms;

namespace TankChem.Dashboard.Text;

/// <summary>States and changes of alarms in words.</summary>
internal static class AlarmText
{
    public static string State(AlarmState state) => state.Suppression switch
    {
        AlarmSuppression.Shelved => "shelved",
        AlarmSuppression.ByDesign => "suppressed by design",
        AlarmSuppression.OutOfService => "out of service",
        AlarmSuppression.None => state.Phase switch
        {
            AlarmPhase.Normal => "normal",
            AlarmPhase.Unacknowledged => "unacknowledged",
            AlarmPhase.Acknowledged => "acknowledged",
            AlarmPhase.ReturnedUnacknowledged => "returned to normal, unacknowledged",
            AlarmPhase.LatchedUnacknowledged => "latched, unacknowledged",
            AlarmPhase.LatchedAcknowledged => "latched, acknowledged",
        },
    };

    public static string Change(AlarmChange change) => change switch
    {
        AlarmChange.Raised => "raised",
        AlarmChange.ReturnedToNormal => "returned to normal",
        AlarmChange.Latched => "latched",
        AlarmChange.Acknowledged => "acknowledged",
        AlarmChange.Shelved => "shelved",
        AlarmChange.Unshelved => "shown again",
        AlarmChange.ShelfExpired => "shelf ended",
        AlarmChange.SuppressedByDesign => "suppressed by design",
        AlarmChange.SuppressionEnded => "suppression ended",
        AlarmChange.TakenOutOfService => "taken out of service",
        AlarmChange.ReturnedToService => "returned to service",
        AlarmChange.Reset => "reset",
    };
}
