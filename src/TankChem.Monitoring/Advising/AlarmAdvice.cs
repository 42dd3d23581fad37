using TankChem.Monitoring.Alarming;

namespace TankChem.Monitoring.Advising;

/// <summary>The part of the advice that an alarm leads to.</summary>
public enum AdviceSection
{
    /// <summary>The alarm's own first action; nothing is computed for it.</summary>
    FirstAction,

    /// <summary>People first: leave, ventilate.</summary>
    People,

    /// <summary>CO2 too high: gas off, air, and how far.</summary>
    HighCo2,

    /// <summary>A dose plan that raises alkalinity.</summary>
    RaiseAlkalinity,

    /// <summary>Our knowledge is at fault: measure, titrate, look at a probe.</summary>
    Measure,
}

/// <summary>Leads from an alarm to its advice.</summary>
public static class AlarmAdvice
{
    /// <summary>The section for an alarm.</summary>
    /// <param name="alarm">The alarm.</param>
    public static AdviceSection Of(AlarmView alarm)
    {
        ArgumentNullException.ThrowIfNull(alarm);
        if (alarm.DangerToPeople)
            return AdviceSection.People;
        if (alarm.AboutKnowledge)
            return AdviceSection.Measure;
        bool low = alarm.Key.Rule.StartsWith($"{alarm.Quantity}-low", StringComparison.Ordinal);
        return alarm.Quantity switch
        {
            // A low pH with animals in it is CO2 until it is shown to be something else, and then never base first.
            "co2" => AdviceSection.HighCo2,
            "ph" when low => AdviceSection.HighCo2,
            "alkalinity" when low => AdviceSection.RaiseAlkalinity,
            _ => AdviceSection.FirstAction,
        };
    }
}
