using System.Globalization;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Monitors;

/// <summary>The one plain sentence of a place for Rounds, and how urgently it needs a person.</summary>
internal static class PlaceSentence
{
    /// <summary>Makes both.</summary>
    /// <param name="setup">The place.</param>
    /// <param name="water">Its water.</param>
    /// <param name="alarms">Its alarms that are not normal, worst first.</param>
    /// <param name="limits">The limits that hold here.</param>
    /// <param name="seriesCount">How many series it publishes.</param>
    public static (string Sentence, PlaceUrgency Urgency) Of(WaterSetup setup, WaterAssessment water, IReadOnlyList<AlarmView> alarms, IReadOnlyList<EffectiveLimit> limits, int seriesCount)
    {
        if (!setup.Place.Assigned)
            return (seriesCount == 0 ? "Not set up yet, nothing heard." : $"Not set up yet; {Count(seriesCount, "series")} recorded, no alarms.", PlaceUrgency.Unknown);

        int active = 0;
        PlaceUrgency worst = PlaceUrgency.Calm;
        foreach (AlarmView alarm in alarms)
        {
            if (!alarm.IsActive)
                continue;
            active++;
            PlaceUrgency urgency = UrgencyOf(alarm);
            worst = urgency > worst ? urgency : worst;
        }

        if (active > 0)
            return (OfAlarms(alarms, active), worst);
        if (water.State.Status == WaterStatus.None)
            return (setup.Place.Kind == PlaceKind.Site ? "No readings for the whole site." : "Nothing known yet: no usable reading.", setup.Place.Kind == PlaceKind.Site ? PlaceUrgency.Calm : PlaceUrgency.Unknown);
        return (OfCalm(setup, water, alarms, limits), PlaceUrgency.Calm);
    }

    /// <summary>How urgent an active alarm is.</summary>
    public static PlaceUrgency UrgencyOf(AlarmView alarm) => alarm.AboutKnowledge ? PlaceUrgency.Doubt : alarm.Priority switch
    {
        AlarmPriority.Low => PlaceUrgency.Warning,
        AlarmPriority.Medium => PlaceUrgency.Warning,
        AlarmPriority.High => PlaceUrgency.Urgent,
        AlarmPriority.Critical => PlaceUrgency.Critical,
    };

    private static string OfAlarms(IReadOnlyList<AlarmView> alarms, int active)
    {
        AlarmView first = alarms[0];
        string sentence = first.AboutKnowledge || first.DangerToPeople ? first.Sentence : $"{first.Sentence} {first.FirstAction}";
        return active == 1 ? sentence : $"{sentence} {Count(active - 1, "more alarm")}.";
    }

    private static string OfCalm(WaterSetup setup, WaterAssessment water, IReadOnlyList<AlarmView> alarms, IReadOnlyList<EffectiveLimit> limits)
    {
        var parts = new List<string>();
        Add(parts, water, "co2", "CO2 ", "0.0", " mg/L");
        Add(parts, water, "ph", "pH ", "0.00", "");
        if (parts.Count < 2)
        {
            Add(parts, water, "oxygen-saturation", "oxygen ", "0", " %");
            Add(parts, water, "temperature", "", "0.0", " °C");
            Add(parts, water, "alkalinity", "alkalinity ", "0.00", " mmol/L");
            Add(parts, water, "air-co2", "room air CO2 ", "#,0", " ppm");
        }

        if (limits.Count > 0)
            parts.Add($"all {(water.Gaps.Count > 0 ? "that is known " : "")}within limits for {Groups(setup.Place.Stock)}");
        string sentence = parts.Count == 0 ? "No alarm" : char.ToUpperInvariant(parts[0][0]) + string.Join(", ", parts)[1..];
        if (parts.Count > 0 && parts[0].StartsWith("pH", StringComparison.Ordinal))
            sentence = string.Join(", ", parts);
        if (water.Gaps.Count > 0 && setup.Place.Kind != PlaceKind.Site)
            sentence += $"; {water.Gaps[0].Value} cannot be computed: {water.Gaps[0].Text}";
        int waiting = 0;
        int kept = 0;
        foreach (AlarmView alarm in alarms)
        {
            waiting += alarm.NeedsAcknowledgement ? 1 : 0;
            kept += alarm.State.Suppression is AlarmSuppression.Shelved or AlarmSuppression.OutOfService ? 1 : 0;
        }

        if (waiting > 0)
            sentence += $"; {Count(waiting, "past alarm")} to confirm";
        if (kept > 0)
            sentence += $"; {Count(kept, "alarm")} shelved or out of service";
        return sentence;
    }

    private static void Add(List<string> parts, WaterAssessment water, string name, string label, string format, string unit)
    {
        if (water.State.Values.TryGetValue(name, out WaterValue? value) && !value.Stale)
            parts.Add(label + value.Value.ToString(format, CultureInfo.InvariantCulture) + unit);
    }

    private static string Groups(IReadOnlyList<string> stock)
    {
        var names = new List<string>();
        foreach (string id in stock)
        {
            if (StockLimits.Find(id) is { } group && !names.Contains(group.InSentence))
                names.Add(group.InSentence);
        }

        return names.Count == 0 ? "the stock of its tanks" : string.Join(" and ", names);
    }

    private static string Count(int count, string what) => count == 1 || what == "series" ? $"{count} {what}" : $"{count} {what}s";
}
