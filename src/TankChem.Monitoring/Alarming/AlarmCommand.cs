using TankChem.Alarms;

namespace TankChem.Monitoring.Alarming;

/// <summary>What a person asks of an alarm.</summary>
/// <param name="Key">Which alarm.</param>
/// <param name="Action">What to do.</param>
/// <param name="Who">Who asks; required, recorded as not verified until sign-in exists.</param>
/// <param name="Reason">Why; required to shelve and to take out of service.</param>
/// <param name="Until">End of a shelf; required to shelve.</param>
public sealed record AlarmCommand(AlarmKey Key, AlarmAction Action, string Who, string? Reason, DateTimeOffset? Until);
