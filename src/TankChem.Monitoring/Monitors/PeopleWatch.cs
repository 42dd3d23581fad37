using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Monitors;

/// <summary>Watches CO2 in the room air, for the people in it.</summary>
/// <remarks>Figures of the NIOSH pocket guide, from memory: 5,000 ppm over 8 h, 30,000 ppm over 15 min, 40,000 ppm immediately dangerous to life or health.</remarks>
internal sealed class PeopleWatch(AlarmKey key, AlarmState state) : WatchedRule(key, state)
{
    /// <summary>Rule id.</summary>
    public const string Rule = "air-co2-people";

    private const double EightHourPpm = 5_000;
    private const double QuarterHourPpm = 30_000;
    private const double AtOncePpm = 40_000;

    private static readonly LimitCondition Condition = new() { IsUpper = true, SetPoint = EightHourPpm, Deadband = 500 };

    private AlarmEventKind _last = AlarmEventKind.ConditionUnknown;

    public override AlarmSettings Settings { get; } = new()
    {
        OnDelay = TimeSpan.Zero,
        OffDelay = TimeSpan.FromMinutes(5),
        LongestShelf = AlarmSettings.CriticalLongestShelf,
    };

    public override AlarmPriority Priority => AlarmPriority.Critical;

    public override string Title => "Room air CO2: danger to people";

    public override string Quantity => "air-co2";

    public override string Unit => " ppm";

    public override double? SetPoint => EightHourPpm;

    public override string SetBy => "people";

    public override bool DangerToPeople => true;

    public override string FirstAction => "Do not enter, ventilate; gas off from outside. Local rules and a competent person decide when it is safe.";

    public override string Consequence => "CO2 takes people's breath and consciousness without warning.";

    public override AlarmEventKind Assess(PlaceWatch watch)
    {
        if (!watch.Water.State.Values.TryGetValue("air-co2", out WaterValue? value) || value.Stale)
            return _last = AlarmEventKind.ConditionUnknown;
        Value = value.Value;
        return _last = Condition.Holds(value.Value, null, HeldBefore) ? AlarmEventKind.ConditionPresent : AlarmEventKind.ConditionAbsent;
    }

    public override string Sentence(DateTimeOffset now)
    {
        if (Value is not { } ppm)
            return IsActive ? "Room air CO2 was dangerous to people when last known: do not enter, ventilate." : "Room air CO2 is not known.";
        string amount = $"{Number(ppm, 0)} ppm";
        if (_last == AlarmEventKind.ConditionUnknown)
            return $"Room air CO2 was {amount} when last known, limit 5,000 ppm for people{(IsActive ? ": do not enter, ventilate" : "")}.";
        return ppm switch
        {
            >= AtOncePpm => $"Room air CO2 is {amount}: immediately dangerous to life (40,000 ppm). Do not enter, ventilate.",
            >= QuarterHourPpm => $"Room air CO2 is {amount}, over the 15-minute limit of 30,000 ppm for people: do not enter, ventilate.",
            >= EightHourPpm => $"Room air CO2 is {amount}, limit 5,000 ppm for people: do not enter, ventilate.",
            _ => $"Room air CO2 is {amount}, below the limit of 5,000 ppm for people.",
        };
    }
}
