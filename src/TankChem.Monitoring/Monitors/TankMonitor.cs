using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Monitors;

/// <summary>Watches one place: readings and the passing of time in, water states and alarm events out. No clock, no I/O; not thread-safe.</summary>
/// <remarks>
/// Its state is the newest readings and the alarm states, both on disk: a monitor made anew from them goes on as the one before would have.
/// The water is computed when a value that is used changed, when an input grew too old, and once a minute, since uncertainty grows with age.
/// </remarks>
public sealed class TankMonitor
{
    private static readonly TimeSpan Refresh = TimeSpan.FromMinutes(1);

    private readonly ReadingBook _book = new();
    private readonly CarbonateMemo _memo = new();
    private WaterSetup _setup;
    private RuleSet _rules;
    private StateKeeping _keeping = new();
    private WaterAssessment _water;
    private DateTimeOffset? _computedAt;
    private DateTimeOffset _now;
    private bool _mustCompute = true;
    private PlaceSnapshot? _snapshot;

    /// <summary>A monitor that remembers what was on disk.</summary>
    /// <param name="site">The place's site.</param>
    /// <param name="place">The place.</param>
    /// <param name="remembered">Its newest readings, its loop's and its site's; any order.</param>
    /// <param name="alarmStates">Its alarm states; those of other places are passed over.</param>
    public TankMonitor(SiteDefinition site, PlaceDefinition place, IEnumerable<Reading> remembered, IEnumerable<KeyValuePair<AlarmKey, AlarmState>> alarmStates)
    {
        ArgumentNullException.ThrowIfNull(site);
        ArgumentNullException.ThrowIfNull(place);
        ArgumentNullException.ThrowIfNull(remembered);
        ArgumentNullException.ThrowIfNull(alarmStates);
        _setup = new WaterSetup(site, place);
        foreach (Reading reading in remembered)
        {
            _book.Take(reading);
            _now = reading.Time > _now ? reading.Time : _now;
        }

        var states = new Dictionary<string, AlarmState>(StringComparer.Ordinal);
        foreach ((AlarmKey key, AlarmState state) in alarmStates)
        {
            if (key.Place == place.Key)
                states[key.Rule] = state;
        }

        _rules = new RuleSet(_setup, _book, states);
        _water = WaterStateBuilder.Build(_setup, _book, _now, _memo);
    }

    /// <summary>The place as of the last step.</summary>
    public PlaceSnapshot Snapshot => _snapshot ??= MakeSnapshot();

    /// <summary>Takes new readings (of the place itself, its loop, or its site; any order, late ones too) and the time.</summary>
    public MonitorOutcome Advance(IReadOnlyList<Reading> readings, DateTimeOffset now)
    {
        ArgumentNullException.ThrowIfNull(readings);
        _now = now;
        bool heard = false;
        for (int i = 0; i < readings.Count; i++)
            heard |= Take(readings[i]);

        bool recomputed = ComputeWhenDue(now, out bool waterChanged);
        List<KeyValuePair<AlarmKey, AlarmState>>? states = null;
        List<AlarmJournalEntry>? entries = null;
        EndForgottenRules(now, ref states, ref entries);
        StepRules(now, ref states, ref entries);

        WaterState? keep = recomputed ? _keeping.Consider(_water.State, entries is not null) : null;
        if (!heard && !recomputed && states is null)
            return MonitorOutcome.Nothing;
        _snapshot = null;
        return Outcome(states, entries, keep, heard || waterChanged, now);
    }

    /// <summary>Applies a person's command to one of its alarms.</summary>
    public MonitorOutcome Apply(AlarmCommand command, DateTimeOffset now)
    {
        ArgumentNullException.ThrowIfNull(command);
        if (command.Key.Place != _setup.Place.Key)
            return new MonitorOutcome { Refusal = $"The alarm {command.Key.Place}/{command.Key.Rule} is not one of {_setup.Place.Key}." };
        if (_rules.Find(command.Key.Rule) is not { } rule)
        {
            string known = string.Join(", ", _rules.All.Select(one => one.Key.Rule));
            return new MonitorOutcome
            {
                Refusal = known.Length == 0
                    ? $"{_setup.Place.Key} has no alarms: it is not set up yet. Set it up first."
                    : $"{_setup.Place.Key} has no alarm rule \"{command.Key.Rule}\". Its rules are {known}.",
            };
        }

        AlarmStep step = AlarmMachine.Step(rule.Settings, rule.State, AlarmEvent.Of(command.Action, command.Who, command.Reason, command.Until), now);
        if (step.Refusal is not null)
            return new MonitorOutcome { Refusal = step.Refusal };
        _now = now > _now ? now : _now;
        List<KeyValuePair<AlarmKey, AlarmState>>? states = null;
        List<AlarmJournalEntry>? entries = null;
        Record(rule, step, now, command.Who, command.Reason, ref states, ref entries);
        _snapshot = null;
        return Outcome(states, entries, null, false, now);
    }

    /// <summary>Takes a changed set-up of its site or place; what it remembers stays. The next step tells what follows from it.</summary>
    public void Reconfigure(SiteDefinition site, PlaceDefinition place)
    {
        ArgumentNullException.ThrowIfNull(site);
        ArgumentNullException.ThrowIfNull(place);
        if (place.Key != _setup.Place.Key)
            throw new ArgumentException($"This monitor watches {_setup.Place.Key}; {place.Key} needs one of its own.", nameof(place));
        Dictionary<string, AlarmState> states = _rules.Remembered;
        foreach (WatchedRule rule in _rules.All)
            states[rule.Key.Rule] = rule.State;
        _setup = new WaterSetup(site, place);
        _rules = new RuleSet(_setup, _book, states);
        _keeping = new StateKeeping();
        _water = WaterStateBuilder.Build(_setup, _book, _now, _memo);
        _mustCompute = true;
        _snapshot = null;
    }

    private bool Take(Reading reading)
    {
        BookChange change = _book.Take(reading);
        switch (change)
        {
            case BookChange.None:
                return false;
            case BookChange.NewSeries:
                _rules.Heard(reading, QuantityCatalog.Get(reading.Series.Quantity));
                _mustCompute = true;
                return true;
            case BookChange.Value:
                _mustCompute = true;
                return true;
            case BookChange.Heard:
                // An unusable value may be the newest there is, and the reason why something cannot be computed.
                _mustCompute |= _water.Gaps.Count > 0;
                return true;
            default:
                throw new InvalidOperationException($"The book answered {change}, which is no change it knows.");
        }
    }

    private bool ComputeWhenDue(DateTimeOffset now, out bool changed)
    {
        bool due = _mustCompute || _computedAt is not { } at || now - at >= Refresh || now < at || now > _water.StaysUntil;
        changed = false;
        if (!due)
            return false;
        WaterAssessment before = _water;
        _water = WaterStateBuilder.Build(_setup, _book, now, _memo);
        changed = _mustCompute || before.State.Status != _water.State.Status || before.State.Reason != _water.State.Reason || now > before.StaysUntil;
        _computedAt = now;
        _mustCompute = false;
        return true;
    }

    private void StepRules(DateTimeOffset now, ref List<KeyValuePair<AlarmKey, AlarmState>>? states, ref List<AlarmJournalEntry>? entries)
    {
        var watch = new PlaceWatch
        {
            Setup = _setup,
            Book = _book,
            Water = _water,
            Now = now,
            LoopIsWatched = _setup.Loop is { Assigned: true },
            MainsIsOff = DeviceWatch.Reported(_book.Of(_setup.Place.Key), "mains") == false,
        };
        VouchWatch? vouch = null;
        foreach (WatchedRule rule in _rules.All)
        {
            if (rule is VouchWatch last)
                vouch = last;
            else
                StepRule(rule, watch, ref states, ref entries);
        }

        // Judged last: it tells of the doubts that the limits found.
        if (vouch is not null)
            StepRule(vouch, watch, ref states, ref entries);
    }

    private static void StepRule(WatchedRule rule, PlaceWatch watch, ref List<KeyValuePair<AlarmKey, AlarmState>>? states, ref List<AlarmJournalEntry>? entries)
    {
        AlarmEventKind condition = rule.Assess(watch);
        AlarmState state = rule.State;
        bool isPlain = state.Phase == AlarmPhase.Normal && state.PendingSince is null && state.Suppression == AlarmSuppression.None;
        if (isPlain && condition != AlarmEventKind.ConditionPresent)
            return;

        // Suppression comes first: what is told elsewhere is not raised here for an instant. Only what has something to say is worth suppressing.
        string? because = rule.SuppressedBecause(watch);
        bool quiet = state.Phase == AlarmPhase.Normal && state.PendingSince is null && condition != AlarmEventKind.ConditionPresent;
        if (because is not null && !quiet)
            Record(rule, AlarmMachine.Step(rule.Settings, rule.State, new AlarmEvent(AlarmEventKind.SuppressByDesign, Reason: because), watch.Now), watch.Now, null, because, ref states, ref entries);
        else if (rule.State.Suppression == AlarmSuppression.ByDesign)
            Record(rule, AlarmMachine.Step(rule.Settings, rule.State, new AlarmEvent(AlarmEventKind.EndSuppression), watch.Now), watch.Now, null, null, ref states, ref entries);
        Record(rule, AlarmMachine.Step(rule.Settings, rule.State, new AlarmEvent(condition), watch.Now), watch.Now, null, null, ref states, ref entries);
    }

    /// <summary>An alarm whose rule no longer holds here (the set-up changed) is normal from now on, and the journal says why.</summary>
    private void EndForgottenRules(DateTimeOffset now, ref List<KeyValuePair<AlarmKey, AlarmState>>? states, ref List<AlarmJournalEntry>? entries)
    {
        if (_rules.Remembered.Count == 0)
            return;
        foreach ((string id, AlarmState state) in _rules.Remembered)
        {
            if (state == AlarmState.Normal)
                continue;
            var key = new AlarmKey(_setup.Place.Key, id);
            (states ??= []).Add(new(key, AlarmState.Normal));
            (entries ??= []).Add(new AlarmJournalEntry
            {
                Key = key,
                At = now,
                Change = AlarmChange.ReturnedToNormal,
                Priority = AlarmPriority.Low,
                Title = id,
                Sentence = "This alarm rule no longer holds here: the set-up was changed.",
            });
        }

        _rules.Remembered.Clear();
    }

    private static void Record(
        WatchedRule rule, in AlarmStep step, DateTimeOffset now, string? who, string? why, ref List<KeyValuePair<AlarmKey, AlarmState>>? states, ref List<AlarmJournalEntry>? entries)
    {
        if (ReferenceEquals(step.State, rule.State))
            return;
        rule.State = step.State;
        states ??= [];
        int known = states.FindIndex(one => one.Key == rule.Key);
        if (known >= 0)
            states[known] = new(rule.Key, step.State);
        else
            states.Add(new(rule.Key, step.State));
        foreach (AlarmChange change in step.Changes)
        {
            bool byLogic = change is AlarmChange.ShelfExpired;
            (entries ??= []).Add(new AlarmJournalEntry
            {
                Key = rule.Key,
                At = now,
                Change = change,
                Priority = rule.Priority,
                Title = rule.Title,
                Sentence = rule.Sentence(now),
                Value = rule.Value,
                SetPoint = rule.SetPoint,
                Who = byLogic ? null : who,
                Why = byLogic ? null : why,
            });
        }
    }

    private MonitorOutcome Outcome(
        List<KeyValuePair<AlarmKey, AlarmState>>? states, List<AlarmJournalEntry>? entries, WaterState? keep, bool changed, DateTimeOffset now)
    {
        List<AlarmView>? views = null;
        if (states is not null)
        {
            views = new List<AlarmView>(states.Count);
            foreach ((AlarmKey key, _) in states)
            {
                if (_rules.Find(key.Rule) is { } rule)
                    views.Add(rule.View(_setup.Place.Name, now));
            }
        }

        return new MonitorOutcome
        {
            StateToKeep = keep,
            Changed = changed || states is not null,
            AlarmEntries = entries ?? (IReadOnlyList<AlarmJournalEntry>)[],
            AlarmStates = states ?? (IReadOnlyList<KeyValuePair<AlarmKey, AlarmState>>)[],
            ChangedAlarms = views ?? (IReadOnlyList<AlarmView>)[],
        };
    }

    private PlaceSnapshot MakeSnapshot()
    {
        var alarms = new List<AlarmView>();
        foreach (WatchedRule rule in _rules.All)
        {
            if (rule.State.Phase != AlarmPhase.Normal || rule.State.Suppression != AlarmSuppression.None)
                alarms.Add(rule.View(_setup.Place.Name, _now));
        }

        alarms.Sort(WorstFirst);
        var latest = new List<Reading>();
        foreach (QuantityBook quantity in _book.Of(_setup.Place.Key).Quantities)
        {
            foreach (SeriesBook series in quantity.Probes)
                latest.Add(series.Latest);
        }

        (string sentence, PlaceUrgency urgency) = PlaceSentence.Of(_setup, _water, alarms, _rules.Limits, latest.Count);
        return new PlaceSnapshot
        {
            Definition = _setup.Place,
            Site = _setup.Site,
            Water = _water.State,
            Alarms = alarms,
            Limits = PlaceLimits.Of(_rules.Limits),
            Latest = latest,
            Sentence = sentence,
            Urgency = urgency,
        };
    }

    private static int WorstFirst(AlarmView left, AlarmView right)
    {
        int order = right.IsActive.CompareTo(left.IsActive);
        if (order == 0)
            order = PlaceSentence.UrgencyOf(right).CompareTo(PlaceSentence.UrgencyOf(left));
        if (order == 0)
            order = right.Priority.CompareTo(left.Priority);
        if (order == 0)
            order = Nullable.Compare(left.State.RaisedAt, right.State.RaisedAt);
        return order == 0 ? string.CompareOrdinal(left.Key.Rule, right.Key.Rule) : order;
    }
}
