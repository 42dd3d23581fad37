using TankChem.Alarms;

namespace TankChem.Monitoring.Alarming;

/// <summary>How limits of one quantity and side are watched and told, whatever the stock.</summary>
internal sealed record LimitRule
{
    /// <summary>The quantity.</summary>
    public required string Quantity { get; init; }

    /// <summary>Highest or lowest value.</summary>
    public required LimitSide Side { get; init; }

    /// <summary>Name of the quantity as the subject of a sentence: "CO2".</summary>
    public required string Name { get; init; }

    /// <summary>What it is when the limit is crossed: "high" or "low".</summary>
    public required string Word { get; init; }

    /// <summary>Title in a list: "CO2 high".</summary>
    public required string Title { get; init; }

    /// <summary>Unit in a sentence, with its leading space; empty for pH.</summary>
    public required string Unit { get; init; }

    /// <summary>Decimals in a sentence.</summary>
    public required int Digits { get; init; }

    /// <summary>What happens if nobody acts.</summary>
    public required string Consequence { get; init; }

    /// <summary>First safe action.</summary>
    public required string FirstAction { get; init; }

    /// <summary>How long a limit must be crossed before the alarm is raised.</summary>
    public TimeSpan OnDelay { get; init; } = TimeSpan.FromMinutes(2);

    /// <summary>How long it must be inside before the alarm returns.</summary>
    public TimeSpan OffDelay { get; init; } = TimeSpan.FromMinutes(5);

    /// <summary>Deadband as a share of the limit.</summary>
    public double DeadbandShare { get; init; }

    /// <summary>Deadband in the quantity's unit, when it is no share.</summary>
    public double DeadbandAbsolute { get; init; }

    /// <summary>Widest guard band as a share of the limit.</summary>
    public double GuardShare { get; init; } = 0.15;

    /// <summary>Widest guard band in the quantity's unit, when it is no share.</summary>
    public double? GuardAbsolute { get; init; }

    /// <summary>The condition for a limit.</summary>
    public LimitCondition ConditionFor(StockLimit limit) => new()
    {
        IsUpper = limit.Side == LimitSide.High,
        SetPoint = limit.Value,
        Deadband = DeadbandAbsolute > 0 ? DeadbandAbsolute : DeadbandShare * limit.Value,
        WidestGuard = GuardAbsolute ?? GuardShare * limit.Value,
        RaiseProbability = limit.RaiseAt,
    };

    /// <summary>The settings at a level: the more is at stake, the shorter the on-delay and the shelf.</summary>
    public AlarmSettings SettingsFor(LimitLevel level) => new()
    {
        OnDelay = level == LimitLevel.Danger ? TimeSpan.FromTicks(OnDelay.Ticks / 2) : OnDelay,
        OffDelay = OffDelay,
        LongestShelf = level == LimitLevel.Danger ? AlarmSettings.CriticalLongestShelf : AlarmSettings.OrdinaryLongestShelf,
    };

    /// <summary>The priority at a level.</summary>
    public static AlarmPriority PriorityOf(LimitLevel level) => level switch
    {
        LimitLevel.Warn => AlarmPriority.Medium,
        LimitLevel.Urgent => AlarmPriority.High,
        LimitLevel.Danger => AlarmPriority.Critical,
    };
}
