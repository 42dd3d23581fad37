using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Monitors;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Tests.Monitors;

/// <summary>A monitor with what it would have written to disk, driven by simulated time in minutes from <see cref="Farm.Start"/>.</summary>
internal sealed class Watch
{
    private readonly Dictionary<AlarmKey, AlarmState> _states = [];
    private readonly List<Reading> _readings = [];
    private readonly SiteDefinition _site;
    private readonly PlaceDefinition _place;
    private TankMonitor _monitor;

    public Watch(PlaceDefinition place, params PlaceDefinition[] others)
    {
        _place = place;
        _site = Farm.Site([place, .. others]);
        _monitor = new TankMonitor(_site, place, [], []);
    }

    public List<AlarmJournalEntry> Journal { get; } = [];

    public List<WaterState> Kept { get; } = [];

    public MonitorOutcome Last { get; private set; } = MonitorOutcome.Nothing;

    public PlaceSnapshot Snapshot => _monitor.Snapshot;

    public WaterState Water => _monitor.Snapshot.Water;

    public static DateTimeOffset Minute(double minute) => Farm.Start.AddMinutes(minute);

    /// <summary>Readings of the place at a minute.</summary>
    public Watch At(double minute, params (string Quantity, double Value)[] readings) =>
        Take(minute, [.. readings.Select(reading => Farm.Read(reading.Quantity, reading.Value, Minute(minute), _place.Key))]);

    public Watch Take(double minute, params Reading[] readings)
    {
        _readings.AddRange(readings);
        return Keep(_monitor.Advance(readings, Minute(minute)));
    }

    /// <summary>The same readings at every minute of a range.</summary>
    public Watch Every(int from, int to, params (string Quantity, double Value)[] readings)
    {
        for (int minute = from; minute <= to; minute++)
            At(minute, readings);
        return this;
    }

    public MonitorOutcome Do(double minute, string rule, AlarmAction action, string who = "Ada", string? reason = "seen", double? untilMinute = null)
    {
        Keep(_monitor.Apply(new AlarmCommand(new AlarmKey(_place.Key, rule), action, who, reason, untilMinute is { } until ? Minute(until) : null), Minute(minute)));
        return Last;
    }

    /// <summary>Throws the monitor away and makes a new one from what is on disk.</summary>
    public Watch Restart()
    {
        IEnumerable<Reading> newest = _readings.GroupBy(reading => reading.Series).SelectMany(series =>
        {
            Reading latest = series.OrderBy(reading => reading.Time).ThenBy(reading => reading.ReceivedAt).Last();
            Reading? usable = series.Where(reading => reading.IsUsable).OrderBy(reading => reading.Time).ThenBy(reading => reading.ReceivedAt).LastOrDefault();
            return usable is null || usable == latest ? [latest] : new[] { latest, usable };
        });
        _monitor = new TankMonitor(_site, _place, newest, _states.Where(state => state.Value != AlarmState.Normal));
        return this;
    }

    public Watch Reconfigure(PlaceDefinition place)
    {
        _monitor.Reconfigure(_site with { Places = [place] }, place);
        return this;
    }

    public AlarmView? Alarm(string rule) => Snapshot.Alarms.FirstOrDefault(alarm => alarm.Key.Rule == rule);

    public AlarmView Active(string rule)
    {
        AlarmView? alarm = Alarm(rule);
        Assert.True(alarm?.IsActive == true, $"{rule} should be active. Active are: {string.Join(", ", ActiveRules())}. Water: {Water.Reason}");
        return alarm!;
    }

    public IReadOnlyList<string> ActiveRules() => [.. Snapshot.Alarms.Where(alarm => alarm.IsActive).Select(alarm => alarm.Key.Rule)];

    public IReadOnlyList<string> Raised() => [.. Journal.Where(entry => entry.Change == AlarmChange.Raised).Select(entry => entry.Key.Rule)];

    private Watch Keep(MonitorOutcome outcome)
    {
        Last = outcome;
        Journal.AddRange(outcome.AlarmEntries);
        foreach ((AlarmKey key, AlarmState state) in outcome.AlarmStates)
            _states[key] = state;
        if (outcome.StateToKeep is { } kept)
            Kept.Add(kept);
        return this;
    }
}
