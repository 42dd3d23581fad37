using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Monitors;

/// <summary>The rules of one place: those that follow from its set-up, and those that follow from what it publishes.</summary>
internal sealed class RuleSet
{
    private readonly Dictionary<string, WatchedRule> _byId = new(StringComparer.Ordinal);
    private readonly Dictionary<string, AlarmState> _remembered;
    private readonly PlaceDefinition _place;
    private readonly int? _fixedCount;

    /// <param name="setup">The place as it is set up.</param>
    /// <param name="book">What was heard of it.</param>
    /// <param name="remembered">Alarm states by rule id; taken out as rules pick them up.</param>
    public RuleSet(WaterSetup setup, ReadingBook book, Dictionary<string, AlarmState> remembered)
    {
        _remembered = remembered;
        _place = setup.Place;
        Limits = setup.Place.Assigned ? LimitsOf(setup) : [];
        if (!setup.Place.Assigned)
            return;

        Add(PeopleWatch.Rule, state => new PeopleWatch(KeyOf(PeopleWatch.Rule), state));
        foreach (EffectiveLimit limit in Limits)
            Add(limit.Limit.Rule, state => new LimitWatch(KeyOf(limit.Limit.Rule), state, limit));
        if (setup.Place.Kind != PlaceKind.Site)
            Add(VouchWatch.Rule, state => new VouchWatch(KeyOf(VouchWatch.Rule), state));
        _fixedCount = All.Count;
        foreach (ProbeDefinition probe in setup.Place.Probes)
            EnsureSilence(QuantityCatalog.Get(probe.Quantity));
        foreach (QuantityBook quantity in book.Of(setup.Place.Key).Quantities)
        {
            foreach (SeriesBook series in quantity.Probes)
                Heard(series.Latest, quantity.Definition);
        }
    }

    /// <summary>All rules: those of the set-up in its order, then those of what is published, by id, so that the order does not depend on who spoke first.</summary>
    public List<WatchedRule> All { get; } = [];

    /// <summary>The limits that hold here.</summary>
    public IReadOnlyList<EffectiveLimit> Limits { get; }

    /// <summary>A rule by its id; null when there is none here.</summary>
    public WatchedRule? Find(string id) => _byId.GetValueOrDefault(id);

    /// <summary>Takes note of a reading: a probe that spoke once may fall silent, a device that reported once may stop.</summary>
    public void Heard(Reading reading, QuantityDefinition definition)
    {
        if (!_place.Assigned || reading.Series.Place != _place.Key)
            return;
        if (reading.Series.Quantity == SeriesKey.DeviceState)
        {
            string device = reading.Series.Probe;
            if (DeviceKind.Of(device) is { } kind)
                Add(kind.Rule(device), state => new DeviceWatch(KeyOf(kind.Rule(device)), state, device, kind));
        }
        else if (reading.Origin != ReadingOrigin.Manual)
        {
            EnsureSilence(definition);
        }
    }

    /// <summary>States that no rule picked up: of rules that no longer hold here, or not yet.</summary>
    public Dictionary<string, AlarmState> Remembered => _remembered;

    private void EnsureSilence(QuantityDefinition definition)
    {
        if (SilenceWatch.LongestSilence(definition) is not { } longest)
            return;
        foreach (ProbeDefinition probe in _place.Probes)
        {
            if (probe.Quantity == definition.Id && probe.OldestUsed is { } own)
                longest = own;
        }

        string rule = definition.Id + "-silent";
        Add(rule, state => new SilenceWatch(KeyOf(rule), state, definition, longest));
    }

    private void Add(string id, Func<AlarmState, WatchedRule> make)
    {
        if (_byId.ContainsKey(id))
            return;
        WatchedRule rule = make(_remembered.Remove(id, out AlarmState? state) ? state : AlarmState.Normal);
        _byId.Add(id, rule);
        int at = _fixedCount ?? All.Count;
        while (at < All.Count && string.CompareOrdinal(All[at].Key.Rule, id) < 0)
            at++;
        All.Insert(at, rule);
    }

    private AlarmKey KeyOf(string rule) => new(_place.Key, rule);

    /// <summary>A loop without stock of its own keeps the water of its tanks: their limits hold in it, but for oxygen, which is low behind a biofilter by nature.</summary>
    private static List<EffectiveLimit> LimitsOf(WaterSetup setup)
    {
        PlaceDefinition place = setup.Place;
        if (place.Kind != PlaceKind.Loop || place.Stock.Count > 0)
            return [.. StockLimits.Strictest(place.Stock)];
        var stock = new List<string>();
        foreach (PlaceDefinition tank in setup.Site.Places)
        {
            if (tank.Loop != place.Key.Place || !tank.Assigned)
                continue;
            foreach (string id in tank.Stock)
            {
                if (!stock.Contains(id))
                    stock.Add(id);
            }
        }

        return [.. StockLimits.Strictest(stock).Where(limit => limit.Limit.Quantity is not ("oxygen" or "oxygen-saturation"))];
    }
}
