using TankChem.Monitoring.Advising;
using TankChem.Monitoring.Alarming;

namespace TankChem.Dashboard.Text;

/// <summary>From an alarm to its advice in one tap.</summary>
internal static class AdviceLink
{
    /// <summary>Address of the advice.</summary>
    public static string Of(AlarmView alarm) => $"/place/{alarm.Key.Place.Site}/{alarm.Key.Place.Place}?view=act#{Anchor(AlarmAdvice.Of(alarm))}";

    /// <summary>The part of the page that a section stands in.</summary>
    public static string Anchor(AdviceSection section) => section switch
    {
        AdviceSection.People or AdviceSection.FirstAction or AdviceSection.Measure => "first",
        AdviceSection.HighCo2 => "co2",
        AdviceSection.RaiseAlkalinity => "dose",
    };
}
