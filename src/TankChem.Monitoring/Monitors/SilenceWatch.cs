using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Monitors;

/// <summary>Watches whether a probe still speaks; about our knowledge, not about the water.</summary>
internal sealed class SilenceWatch : WatchedRule
{
    private readonly string _name;
    private readonly TimeSpan _longest;
    private DateTimeOffset? _heardAt;

    public SilenceWatch(AlarmKey key, AlarmState state, QuantityDefinition definition, TimeSpan longest)
        : base(key, state)
    {
        Quantity = definition.Id;
        _name = definition.Id switch
        {
            "ph" => "pH",
            "pco2" => "CO2",
            "air-co2" => "room air CO2",
            _ => definition.Name.ToLowerInvariant(),
        };
        _longest = longest;
        Priority = definition.Id is "ph" or "oxygen" or "oxygen-saturation" or "air-co2" ? AlarmPriority.Medium : AlarmPriority.Low;
    }

    /// <summary>The quantities that a probe measures by itself, and how long one may be silent. A value taken by hand is never called silent.</summary>
    public static TimeSpan? LongestSilence(QuantityDefinition definition) => definition.Id switch
    {
        "ph" or "oxygen" or "oxygen-saturation" or "pco2" or "temperature" or "gas-pressure" or "air-co2" or "salinity" or "conductivity" =>
            definition.OldestUsed < TimeSpan.FromDays(1) ? definition.OldestUsed : TimeSpan.FromDays(1),
        _ => null,
    };

    /// <summary>Silence is told when it has lasted; at the start, and for a probe never heard, probes get the time they may be silent.</summary>
    public override AlarmSettings Settings => _heardAt is null ? new AlarmSettings { OnDelay = _longest } : HeardSettings;

    private static AlarmSettings HeardSettings { get; } = new() { OnDelay = TimeSpan.FromMinutes(2) };

    public override AlarmPriority Priority { get; }

    public override string Title => $"No {_name} reading";

    public override string Quantity { get; }

    public override bool AboutKnowledge => true;

    public override string FirstAction => "Look at the probe, its cable and its gateway; measure by hand meanwhile.";

    public override string Consequence => "What goes wrong in the water now, nobody sees.";

    public override AlarmEventKind Assess(PlaceWatch watch)
    {
        _heardAt = null;
        bool onlyByHand = false;
        if (watch.Book.Of(Key.Place).Find(Quantity) is { } quantity)
        {
            onlyByHand = true;
            foreach (SeriesBook series in quantity.Probes)
            {
                onlyByHand &= series.Latest.Origin == ReadingOrigin.Manual;
                if (series.Latest.Origin != ReadingOrigin.Manual && (_heardAt is null || series.Latest.Time > _heardAt))
                    _heardAt = series.Latest.Time;
            }
        }

        return onlyByHand || (_heardAt is { } heard && watch.Now - heard <= _longest) ? AlarmEventKind.ConditionAbsent : AlarmEventKind.ConditionPresent;
    }

    public override string Sentence(DateTimeOffset now) =>
        _heardAt is not { } heard ? $"Nothing heard from the {_name} probe yet."
        : now - heard <= _longest ? $"The {_name} probe speaks again."
        : $"Nothing heard from the {_name} probe for {Moment.Age(now - heard)}.";
}
