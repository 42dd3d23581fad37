using TankChem.Alarms;

namespace TankChem.Storage.Model;

/// <summary>Words under which enumerations stand in the store; they never change, whatever the code's names and numbers become.</summary>
internal static class Codes
{
    private static readonly Dictionary<AlarmPhase, string> Phases = new()
    {
        [AlarmPhase.Normal] = "normal",
        [AlarmPhase.Unacknowledged] = "unacknowledged",
        [AlarmPhase.Acknowledged] = "acknowledged",
        [AlarmPhase.ReturnedUnacknowledged] = "returned-unacknowledged",
        [AlarmPhase.LatchedUnacknowledged] = "latched-unacknowledged",
        [AlarmPhase.LatchedAcknowledged] = "latched-acknowledged",
    };

    private static readonly Dictionary<AlarmSuppression, string> Suppressions = new()
    {
        [AlarmSuppression.None] = "none",
        [AlarmSuppression.Shelved] = "shelved",
        [AlarmSuppression.ByDesign] = "by-design",
        [AlarmSuppression.OutOfService] = "out-of-service",
    };

    private static readonly Dictionary<AlarmPriority, string> Priorities = new()
    {
        [AlarmPriority.Low] = "low",
        [AlarmPriority.Medium] = "medium",
        [AlarmPriority.High] = "high",
        [AlarmPriority.Critical] = "critical",
    };

    private static readonly Dictionary<AlarmChange, string> Changes = new()
    {
        [AlarmChange.Raised] = "raised",
        [AlarmChange.ReturnedToNormal] = "returned-to-normal",
        [AlarmChange.Latched] = "latched",
        [AlarmChange.Acknowledged] = "acknowledged",
        [AlarmChange.Shelved] = "shelved",
        [AlarmChange.Unshelved] = "unshelved",
        [AlarmChange.ShelfExpired] = "shelf-expired",
        [AlarmChange.SuppressedByDesign] = "suppressed-by-design",
        [AlarmChange.SuppressionEnded] = "suppression-ended",
        [AlarmChange.TakenOutOfService] = "taken-out-of-service",
        [AlarmChange.ReturnedToService] = "returned-to-service",
        [AlarmChange.Reset] = "reset",
    };

    public static string Of(AlarmPhase phase) => Phases[phase];

    public static string Of(AlarmSuppression suppression) => Suppressions[suppression];

    public static string Of(AlarmPriority priority) => Priorities[priority];

    public static string Of(AlarmChange change) => Changes[change];

    public static AlarmPhase Phase(string code) => Back(Phases, code);

    public static AlarmSuppression Suppression(string code) => Back(Suppressions, code);

    public static AlarmPriority Priority(string code) => Back(Priorities, code);

    public static AlarmChange Change(string code) => Back(Changes, code);

    private static T Back<T>(Dictionary<T, string> codes, string code)
        where T : notnull
    {
        foreach ((T value, string known) in codes)
        {
            if (known == code)
                return value;
        }

        throw new InvalidDataException($"The store holds the code \"{code}\", which is not one of {string.Join(", ", codes.Values)}.");
    }
}
