using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Monitors;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Service.Pipeline;

/// <summary>All monitors of all places and the way of a reading through them. One thread at a time; no clock and no waiting: time is an argument.</summary>
/// <remarks>The order is always <see cref="Take(Arrival)"/> …, <see cref="Advance"/>, <see cref="Seal"/>, commit, <see cref="Tell"/>.</remarks>
internal sealed class FarmEngine
{
    private readonly Dictionary<string, SiteDefinition> sites = new(StringComparer.Ordinal);
    private readonly Dictionary<PlaceKey, PlaceRuntime> places = [];
    private readonly Dictionary<PlaceKey, PlaceDefinition> configured = [];
    private readonly HashSet<PlaceRuntime> touched = [];
    private readonly HashSet<PlaceRuntime> toTell = [];
    private readonly List<AlarmView> alarmsToTell = [];
    private readonly SeriesClock seriesClock = new();
    private readonly OpenBatch batch = new();
    private readonly IRecovery recovery;
    private readonly Farm farm;
    private readonly IAnnouncer announcer;
    private readonly ILogger logger;

    public FarmEngine(IReadOnlyList<SiteDefinition> configuredSites, IRecovery recovery, Farm farm, IAnnouncer announcer, ILogger logger)
    {
        this.recovery = recovery;
        this.farm = farm;
        this.announcer = announcer;
        this.logger = logger;
        foreach (SiteDefinition site in configuredSites)
        {
            sites[site.Id] = site;
            foreach (PlaceDefinition place in site.Places)
                configured[place.Key] = place;
        }

        Restore();
    }

    /// <summary>The batch that the next commit takes.</summary>
    public OpenBatch Batch => batch;

    /// <summary>Readings taken since the start.</summary>
    public long ReadingsTaken { get; private set; }

    /// <summary>Readings taken since the start that are not of quality "pass".</summary>
    public long ReadingsFlagged { get; private set; }

    /// <summary>Takes a message's readings, or keeps the reason why there are none.</summary>
    public void Take(Arrival arrival)
    {
        if (arrival.Unreadable is { } unreadable)
            batch.Unreadable.Add(unreadable);
        IReadOnlyList<ParsedReading> parsed = arrival.Readings;
        for (int i = 0; i < parsed.Count; i++)
        {
            ParsedReading one = parsed[i];
            Take(one, arrival.ReceivedAt, arrival.Origin);
        }
    }

    /// <summary>Takes one number.</summary>
    public Reading Take(in ParsedReading parsed, DateTimeOffset receivedAt, ReadingOrigin origin)
    {
        PlaceRuntime place = FindOrAdd(parsed.Series.Place);
        DateTimeOffset time = seriesClock.Stamp(parsed, receivedAt);
        Reading reading = ReadingResolver.Resolve(parsed, receivedAt, origin, time, ConfirmedUnit(place.Definition, parsed.Series));
        batch.Readings.Add(reading);
        ReadingsTaken++;
        if (reading.Flag != QualityFlag.Pass)
            ReadingsFlagged++;
        Deliver(place, reading);
        return reading;
    }

    /// <summary>Puts a reading before every monitor that looks at it: its place's, its loop's tanks', its site's places'.</summary>
    public void Deliver(PlaceRuntime place, Reading reading)
    {
        AddPending(place, reading);
        if (place.Definition.Kind == PlaceKind.Tank)
            return;
        foreach (PlaceRuntime other in places.Values)
        {
            bool looks = place.Definition.Kind == PlaceKind.Site
                ? other != place && other.Definition.Key.Site == place.Definition.Key.Site
                : other.Definition.Loop == place.Definition.Key.Place && other.Definition.Key.Site == place.Definition.Key.Site;
            if (looks)
                AddPending(other, reading);
        }
    }

    /// <summary>Lets the monitors step: those with new readings, or all when time is to pass.</summary>
    public void Advance(DateTimeOffset now, bool all)
    {
        if (all)
        {
            foreach (PlaceRuntime place in places.Values)
                Step(place, now);
        }
        else
        {
            foreach (PlaceRuntime place in touched)
                Step(place, now);
        }

        touched.Clear();
    }

    /// <summary>Applies a command; the refusal, or null when it was taken.</summary>
    public string? Apply(AlarmCommand command, DateTimeOffset now)
    {
        if (!places.TryGetValue(command.Key.Place, out PlaceRuntime? place))
            return $"There is no place {command.Key.Place}.";
        MonitorOutcome outcome = place.Monitor.Apply(command, now);
        if (outcome.Refusal is not null)
            return outcome.Refusal;
        Keep(place, outcome);
        return null;
    }

    /// <summary>What the next commit takes.</summary>
    public JournalBatch Seal() => batch.Seal();

    /// <summary>After the commit: the live farm and the outside get to know.</summary>
    public void Tell(JournalBatch committed)
    {
        farm.CountUnreadable(committed.Unreadable.Count);
        foreach (PlaceRuntime place in toTell)
        {
            PlaceSnapshot snapshot = place.Monitor.Snapshot;
            farm.Put(snapshot);
            announcer.Announce(snapshot.Water);
        }

        foreach (AlarmView alarm in alarmsToTell)
            announcer.Announce(alarm);
        toTell.Clear();
        alarmsToTell.Clear();
    }

    /// <summary>A place by its key, or null.</summary>
    public PlaceRuntime? Find(PlaceKey key) => places.GetValueOrDefault(key);

    /// <summary>A site by its id, or null.</summary>
    public SiteDefinition? FindSite(string id) => sites.GetValueOrDefault(id);

    /// <summary>Every place of a site.</summary>
    public IEnumerable<PlaceRuntime> PlacesOf(string site) => places.Values.Where(p => p.Definition.Key.Site == site);

    /// <summary>Takes a changed set-up; it is kept on disk with the next commit.</summary>
    public void SetUp(PlaceDefinition definition)
    {
        batch.Places.Add(definition);
        PlaceRuntime? place = Find(definition.Key);
        bool sameSources = place is not null && place.Definition.Loop == definition.Loop && place.Definition.Kind == definition.Kind;
        SiteDefinition site = Include(definition);
        if (place is null)
        {
            AddRuntime(site, definition, recovery.LoadLatestReadings(), []);
        }
        else
        {
            place.Definition = definition;
            if (!sameSources)
                place.Monitor = NewMonitor(site, definition, recovery.LoadLatestReadings(), recovery.LoadAlarmStates());
        }

        // A loop's tanks look at its name, ions and probes, and a loop at its tanks' limits: the whole site learns of the change.
        foreach (PlaceRuntime other in places.Values)
        {
            if (other.Definition.Key.Site != site.Id)
                continue;
            other.Site = site;
            other.Monitor.Reconfigure(site, other.Definition);
            touched.Add(other);
            toTell.Add(other);
        }
    }

    /// <summary>The site with a place as it is set up now.</summary>
    private SiteDefinition Include(PlaceDefinition definition)
    {
        SiteDefinition site = FindOrAddSite(definition.Key.Site);
        if (definition.Kind == PlaceKind.Site || !definition.Assigned)
            return site;
        site = site with { Places = [.. site.Places.Where(p => p.Key != definition.Key), definition] };
        sites[site.Id] = site;
        return site;
    }

    private void Restore()
    {
        IReadOnlyList<Reading> remembered = recovery.LoadLatestReadings();
        IReadOnlyList<KeyValuePair<AlarmKey, AlarmState>> alarms = recovery.LoadAlarmStates();
        Dictionary<PlaceKey, PlaceDefinition> known = new(configured);
        foreach (PlaceDefinition stored in recovery.LoadPlaces())
            known[stored.Key] = configured.TryGetValue(stored.Key, out PlaceDefinition? fixedByFile) ? WithConfirmedUnits(fixedByFile, stored) : stored;
        foreach (Reading reading in remembered)
            known.TryAdd(reading.Series.Place, NotAssigned(reading.Series.Place));
        foreach (SiteDefinition site in sites.Values.ToArray())
            known.TryAdd(new PlaceKey(site.Id, PlaceKey.WholeSite), WholeSite(site));
        foreach (PlaceDefinition definition in known.Values)
            Include(definition);
        foreach (PlaceDefinition definition in known.Values)
            AddRuntime(FindOrAddSite(definition.Key.Site), definition, remembered, alarms);
    }

    private void AddRuntime(SiteDefinition site, PlaceDefinition definition, IReadOnlyList<Reading> remembered, IReadOnlyList<KeyValuePair<AlarmKey, AlarmState>> alarms)
    {
        var place = new PlaceRuntime(site, definition, NewMonitor(site, definition, remembered, alarms));
        places[definition.Key] = place;
        toTell.Add(place);
        touched.Add(place);
        farm.Put(place.Monitor.Snapshot);
    }

    private static TankMonitor NewMonitor(SiteDefinition site, PlaceDefinition definition, IReadOnlyList<Reading> remembered, IReadOnlyList<KeyValuePair<AlarmKey, AlarmState>> alarms) =>
        new(
            site,
            definition,
            remembered.Where(r => r.Series.Place == definition.Key || (r.Series.Place.Site == site.Id && (r.Series.Place.Place == definition.Loop || r.Series.Place.Place == PlaceKey.WholeSite))),
            alarms.Where(a => a.Key.Place == definition.Key));

    private PlaceRuntime FindOrAdd(PlaceKey key)
    {
        if (places.TryGetValue(key, out PlaceRuntime? known))
            return known;
        SiteDefinition site = FindOrAddSite(key.Site);
        PlaceDefinition definition = key.Place == PlaceKey.WholeSite ? WholeSite(site) : NotAssigned(key);
        batch.Places.Add(definition);
        IReadOnlyList<Reading> ofSite = places.TryGetValue(new PlaceKey(key.Site, PlaceKey.WholeSite), out PlaceRuntime? whole) ? whole.Monitor.Snapshot.Latest : [];
        AddRuntime(site, definition, ofSite, []);
        return places[key];
    }

    private SiteDefinition FindOrAddSite(string id)
    {
        if (sites.TryGetValue(id, out SiteDefinition? site))
            return site;
        site = new SiteDefinition { Id = id, Name = id };
        sites[id] = site;
        return site;
    }

    private void AddPending(PlaceRuntime place, Reading reading)
    {
        place.Pending.Add(reading);
        touched.Add(place);
    }

    private void Step(PlaceRuntime place, DateTimeOffset now)
    {
        try
        {
            Keep(place, place.Monitor.Advance(place.Pending, now));
            if (place.Fault is not null)
            {
                place.Fault = null;
                farm.SetTrouble($"place {place.Definition.Key}", null);
            }
        }
#pragma warning disable CA1031 // One tank's trouble never stops another's: whatever it is, it is shown, and the others go on.
        catch (Exception e)
#pragma warning restore CA1031
        {
            if (place.Fault != e.Message)
                logger.LogError(e, "The monitor of {Place} failed; its readings are kept, its water state is not current", place.Definition.Key);
            place.Fault = e.Message;
            farm.SetTrouble($"place {place.Definition.Key}", $"{place.Definition.Name}: its water state cannot be derived ({e.Message}). Its readings are kept.");
        }

        place.Pending.Clear();
    }

    private void Keep(PlaceRuntime place, MonitorOutcome outcome)
    {
        batch.Take(outcome);
        if (outcome.Changed)
            toTell.Add(place);
        alarmsToTell.AddRange(outcome.ChangedAlarms);
    }

    private static string? ConfirmedUnit(PlaceDefinition place, in SeriesKey series)
    {
        IReadOnlyList<ProbeDefinition> probes = place.Probes;
        for (int i = 0; i < probes.Count; i++)
        {
            if (probes[i].Quantity == series.Quantity && probes[i].Probe == series.Probe)
                return probes[i].Unit;
        }

        return null;
    }

    /// <summary>The file says how a place is set up; units that people confirmed in the dashboard stay where the file is silent.</summary>
    private static PlaceDefinition WithConfirmedUnits(PlaceDefinition fixedByFile, PlaceDefinition stored)
    {
        List<ProbeDefinition> probes = [.. fixedByFile.Probes];
        foreach (ProbeDefinition probe in stored.Probes)
        {
            int at = probes.FindIndex(p => p.Quantity == probe.Quantity && p.Probe == probe.Probe);
            if (at < 0)
                probes.Add(probe);
            else if (probes[at].Unit is null)
                probes[at] = probes[at] with { Unit = probe.Unit };
        }

        return fixedByFile with { Probes = probes };
    }

    private static PlaceDefinition NotAssigned(PlaceKey key) => new() { Key = key, Kind = PlaceKind.Tank, Name = key.Place, Assigned = false };

    private static PlaceDefinition WholeSite(SiteDefinition site) => new() { Key = new PlaceKey(site.Id, PlaceKey.WholeSite), Kind = PlaceKind.Site, Name = site.Name };
}
