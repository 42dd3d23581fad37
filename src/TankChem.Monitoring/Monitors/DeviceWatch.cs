using System.Globalization;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Monitors;

/// <summary>Watches a device whose stop (or, for a generator, start) matters.</summary>
internal sealed class DeviceWatch : WatchedRule
{
    private readonly string _device;
    private readonly DeviceKind _kind;
    private readonly string _name;

    public DeviceWatch(AlarmKey key, AlarmState state, string device, DeviceKind kind)
        : base(key, state)
    {
        _device = device;
        _kind = kind;
        string words = device.Replace('-', ' ').Replace('_', ' ');
        _name = string.Create(words.Length, words, static (span, text) =>
        {
            text.CopyTo(span);
            span[0] = char.ToUpper(span[0], CultureInfo.InvariantCulture);
        });
        Settings = new AlarmSettings { OnDelay = kind.OnDelay, OffDelay = TimeSpan.FromMinutes(1) };
    }

    public override AlarmSettings Settings { get; }

    public override AlarmPriority Priority => _kind.Priority;

    public override string Title => $"{_name} {Word}";

    public override string Quantity => SeriesKey.DeviceState;

    public override string FirstAction => _kind.FirstAction;

    public override string Consequence => _kind.Consequence;

    private string Word => _kind.AlarmsWhenOn ? "on" : "off";

    public override AlarmEventKind Assess(PlaceWatch watch)
    {
        if (Reported(watch.Book.Of(Key.Place), _device) is not { } isOn)
            return AlarmEventKind.ConditionUnknown;
        Value = isOn ? 1 : 0;
        return isOn == _kind.AlarmsWhenOn ? AlarmEventKind.ConditionPresent : AlarmEventKind.ConditionAbsent;
    }

    public override string? SuppressedBecause(PlaceWatch watch) =>
        _kind.FollowsMains && watch.MainsIsOff ? "The mains is off, and told so." : null;

    public override string Sentence(DateTimeOffset now) => Value switch
    {
        null => $"{_name} was {Word} when last heard.",
        1 => $"{_name} is on.",
        _ => $"{_name} is off.",
    };

    /// <summary>What a device last reported at a place; null when it never did. A switch tells its state when it changes, so it does not grow old.</summary>
    public static bool? Reported(PlaceBook place, string device)
    {
        if (place.Find(SeriesKey.DeviceState) is not { } states)
            return null;
        foreach (SeriesBook series in states.Probes)
        {
            if (series.Probe == device && series.Usable?.Value is { } value)
                return value >= 0.5;
        }

        return null;
    }
}

/// <summary>How a kind of device is watched.</summary>
internal sealed record DeviceKind(string Name, AlarmPriority Priority, TimeSpan OnDelay, bool FollowsMains, string Consequence, string FirstAction)
{
    public bool AlarmsWhenOn { get; init; }

    private static DeviceKind[] All { get; } =
    [
        new("mains", AlarmPriority.High, TimeSpan.FromSeconds(30), false, "Pumps, air and degassing stop: dense tanks are lost within 10 to 60 minutes.", "Start the generator and emergency oxygen; stop feeding."),
        new("pump", AlarmPriority.High, TimeSpan.FromMinutes(1), true, "Water stands still: oxygen falls and CO2 climbs.", "Start the spare pump; oxygen and air on; stop feeding."),
        new("blower", AlarmPriority.High, TimeSpan.FromMinutes(1), true, "CO2 climbs and oxygen falls.", "Start the spare blower; oxygen on; stop feeding."),
        new("oxygen-supply", AlarmPriority.High, TimeSpan.FromSeconds(30), false, "Dense tanks are lost within minutes.", "Open the reserve; air on; stop feeding."),
        new("degasser", AlarmPriority.High, TimeSpan.FromMinutes(2), true, "CO2 climbs for hours although oxygen looks good.", "Start it again; more air; less feed."),
        new("generator", AlarmPriority.Low, TimeSpan.Zero, false, "The site runs on its reserve.", "Check fuel, and why the mains is gone.") { AlarmsWhenOn = true },
    ];

    /// <summary>The kind of a device by its name, also numbered (<c>pump-2</c>); null for one whose state is only recorded.</summary>
    public static DeviceKind? Of(string device)
    {
        foreach (DeviceKind kind in All)
        {
            if (device == kind.Name || (device.StartsWith(kind.Name, StringComparison.Ordinal) && device[kind.Name.Length] is '-' or '_'))
                return kind;
        }

        return null;
    }

    /// <summary>Rule id: <c>state-pump-off</c>, <c>state-generator-on</c>.</summary>
    public string Rule(string device) => AlarmsWhenOn ? $"state-{device}-on" : $"state-{device}-off";
}
