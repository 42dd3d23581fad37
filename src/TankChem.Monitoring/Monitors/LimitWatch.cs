using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Monitors;

/// <summary>Watches one limit of the stock.</summary>
internal sealed class LimitWatch : WatchedRule
{
    private readonly LimitRule _rule;
    private readonly EffectiveLimit _limit;
    private readonly LimitCondition _condition;
    private double? _u;
    private DateTimeOffset? _knownAt;
    private AlarmEventKind _last = AlarmEventKind.ConditionUnknown;

    public LimitWatch(AlarmKey key, AlarmState state, EffectiveLimit limit)
        : base(key, state)
    {
        _limit = limit;
        _rule = LimitRules.For(limit.Limit);
        _condition = _rule.ConditionFor(limit.Limit);
        Settings = _rule.SettingsFor(limit.Limit.Level);
        Priority = LimitRule.PriorityOf(limit.Limit.Level);
        Title = limit.Limit.Level switch
        {
            LimitLevel.Warn => _rule.Title,
            LimitLevel.Urgent => _rule.Title + ", urgent",
            LimitLevel.Danger => _rule.Title + ", danger",
        };
    }

    public override AlarmSettings Settings { get; }

    public override AlarmPriority Priority { get; }

    public override string Title { get; }

    public override string Quantity => _rule.Quantity;

    public override string FirstAction => _rule.FirstAction;

    public override string Consequence => _rule.Consequence;

    public override string Unit => _rule.Unit;

    public override double? SetPoint => _limit.Limit.Value;

    public override string SetBy => _limit.SetBy;

    public override AlarmEventKind Assess(PlaceWatch watch)
    {
        if (!watch.Water.State.Values.TryGetValue(_rule.Quantity, out WaterValue? value) || value.Stale)
            return _last = AlarmEventKind.ConditionUnknown;
        Value = value.Value;
        _u = value.U;
        _knownAt = value.Time;
        if (_condition.IsInDoubt(value.Value, value.U) && !_condition.IsPast(value.Value) && AgedInput(value) is { } aged)
            watch.Doubts.Add(new KnowledgeGap(_rule.Name, aged, KnowledgeGapKind.TooOld, DoubtText(value)));
        return _last = _condition.Holds(value.Value, value.U, HeldBefore) ? AlarmEventKind.ConditionPresent : AlarmEventKind.ConditionAbsent;
    }

    public override string? SuppressedBecause(PlaceWatch watch)
    {
        if (!watch.LoopIsWatched || _last == AlarmEventKind.ConditionUnknown
            || !watch.Water.State.Values.TryGetValue(_rule.Quantity, out WaterValue? value)
            || value.Inputs.Count != 1 || value.Inputs[0].Place != watch.Setup.LoopKey)
            return null;
        return $"It is the water of {watch.Setup.LoopName}, and told there.";
    }

    public override string Sentence(DateTimeOffset now)
    {
        string limit = $"{LimitWord} {Limit(_limit.Limit.Value)}{Unit} for {_limit.SetBy}";
        if (Value is not { } value)
            return IsActive ? $"{_rule.Name} was {_rule.Word} when last known, {limit}." : $"{_rule.Name} is not known, {limit}.";
        string amount = $"{Number(value, _rule.Digits)}{Unit}";
        if (_last == AlarmEventKind.ConditionUnknown)
            return $"{_rule.Name} was {amount} when last known ({Moment.Words(_knownAt!.Value, now)}), {limit}.";
        if (_condition.IsPast(value))
            return $"{_rule.Name} is {_rule.Word}: {amount}, {limit}.";
        if (_last == AlarmEventKind.ConditionPresent)
        {
            return _condition.Guard(_u) > 0
                ? $"{_rule.Name} may be past its {LimitWord}: {Number(value, _rule.Digits)} ± {Number(_u!.Value, _rule.Digits)}{Unit}, {limit}."
                : $"{_rule.Name} is at its {LimitWord}: {amount}, {limit}.";
        }

        return $"{_rule.Name} is inside its {LimitWord}: {amount}, {limit}.";
    }

    private string LimitWord => _limit.Limit.Level switch
    {
        LimitLevel.Warn => "limit",
        LimitLevel.Urgent => "urgent limit",
        LimitLevel.Danger => "danger limit",
    };

    private string DoubtText(WaterValue value) =>
        $"{Number(value.Value, _rule.Digits)} ± {Number(value.U!.Value, _rule.Digits)}{Unit} may be past the {LimitWord} {Limit(_limit.Limit.Value)}";

    /// <summary>The input whose age makes the doubt; null when all are of today, for then a new test would not lessen it.</summary>
    private static string? AgedInput(WaterValue value)
    {
        WaterInput? oldest = null;
        foreach (WaterInput input in value.Inputs)
        {
            if (oldest is null || input.AgeS > oldest.AgeS)
                oldest = input;
        }

        return oldest?.AgeS > TimeSpan.SecondsPerDay ? oldest.Quantity : null;
    }
}
