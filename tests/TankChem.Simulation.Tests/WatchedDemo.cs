using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Monitors;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;
using TankChem.Simulation.Demo;

namespace TankChem.Simulation.Tests;

/// <summary>The demo site watched by the real monitors.</summary>
internal sealed class WatchedDemo
{
    private readonly Dictionary<string, TankMonitor> _monitors = new(StringComparer.Ordinal);
    private readonly Dictionary<string, string?> _loopOf = new(StringComparer.Ordinal);
    private readonly List<Reading> _batch = [];
    private readonly List<AlarmJournalEntry> _journal = [];

    public WatchedDemo(IReadOnlyList<DemoPlace> places)
    {
        var site = new SiteDefinition
        {
            Id = DemoSite.Id,
            Name = DemoSite.Name,
            AirCo2Ppm = DemoSite.AirCo2Ppm,
            ElevationM = DemoSite.ElevationM,
            Places = [.. places.Where(place => place.Assigned).Select(Definition)],
        };
        foreach (PlaceDefinition place in site.Places)
        {
            _monitors[place.Key.Place] = new TankMonitor(site, place, [], []);
            _loopOf[place.Key.Place] = place.Loop;
        }
    }

    /// <summary>All alarm changes so far.</summary>
    public IReadOnlyList<AlarmJournalEntry> Journal => _journal;

    public TankMonitor this[string place] => _monitors[place];

    /// <summary>Takes events in, in order; those of one minute together.</summary>
    public void Take(IEnumerable<SimulatedEvent> events)
    {
        DateTimeOffset minute = default;
        foreach (SimulatedEvent happened in events)
        {
            if (happened.At != minute)
                Step(minute);
            minute = happened.At;
            if (happened is SimulatedAcknowledgement given)
                Acknowledge(given);
            if (AsReading(happened) is { } reading)
                _batch.Add(reading);
        }

        Step(minute);
    }

    private void Acknowledge(SimulatedAcknowledgement given)
    {
        TankMonitor monitor = _monitors[given.Place];
        foreach (AlarmView alarm in monitor.Snapshot.Alarms)
        {
            if (alarm.NeedsAcknowledgement && alarm.Key.Rule.StartsWith(given.RulePrefix, StringComparison.Ordinal))
                _journal.AddRange(monitor.Apply(new AlarmCommand(alarm.Key, AlarmAction.Acknowledge, given.Who, given.Reason, null), given.At).AlarmEntries);
        }
    }

    private void Step(DateTimeOffset now)
    {
        if (_batch.Count == 0)
            return;
        foreach ((string place, TankMonitor monitor) in _monitors)
        {
            Reading[] readings = [.. _batch.Where(reading => reading.Series.Place.Place is var of && (of == place || of == _loopOf[place] || of == DemoIds.Site))];
            _journal.AddRange(monitor.Advance(readings, now).AlarmEntries);
        }

        _batch.Clear();
    }

    private static Reading? AsReading(SimulatedEvent happened) => happened switch
    {
        SimulatedReading reading => Make(reading.Place, reading.Quantity, reading.Probe, reading.At, reading.At, reading.Value, reading.Unit, ReadingOrigin.Live),
        SimulatedDeviceState state => Make(state.Place, SeriesKey.DeviceState, state.Device, state.At, state.At, state.IsOn ? 1 : 0, "1", ReadingOrigin.Live),
        SimulatedLogEntry { Kind: SimulatedLogKind.Titration, Amount: { } amount, Unit: { } unit, Subject: { } quantity } entry =>
            Make(entry.Place, quantity, SeriesKey.MainProbe, entry.HappenedAt, entry.At, amount, unit, ReadingOrigin.Manual),
        _ => null,
    };

    private static Reading Make(string place, string quantity, string probe, DateTimeOffset time, DateTimeOffset received, double raw, string unit, ReadingOrigin origin)
    {
        if (!UnitConverter.TryConvert(quantity, unit, raw, out double value, out string? fault))
            throw new InvalidOperationException($"{place}/{quantity}: {fault}");
        return new Reading
        {
            Series = new SeriesKey(new PlaceKey(DemoSite.Id, place), quantity, probe),
            Time = time,
            ReceivedAt = received,
            RawValue = raw,
            RawUnit = unit,
            Value = value,
            Flag = QualityFlag.Pass,
            Origin = origin,
        };
    }

    private static PlaceDefinition Definition(DemoPlace place) => new()
    {
        Key = new PlaceKey(DemoSite.Id, place.Id),
        Kind = place.Kind switch { DemoPlaceKind.Tank => PlaceKind.Tank, DemoPlaceKind.Loop => PlaceKind.Loop },
        Name = place.Name,
        Loop = place.Loop,
        VolumeM3 = place.VolumeM3,
        Salinity = place.Salinity,
        Stock = place.Stock,
        Co2Injection = place.Co2Injection,
        Ions = place.Ions is not { } ions ? null : new IonContent
        {
            CalciumMgL = ions.CalciumMgL,
            MagnesiumMgL = ions.MagnesiumMgL,
            SodiumMgL = ions.SodiumMgL,
            PotassiumMgL = ions.PotassiumMgL,
            ChlorideMgL = ions.ChlorideMgL,
            SulfateMgL = ions.SulfateMgL,
        },
        Probes = [.. place.Probes.Select(probe => new ProbeDefinition
        {
            Quantity = probe.Quantity,
            Probe = probe.Probe,
            Unit = probe.Unit,
            StandardUncertainty = probe.StandardUncertainty,
            DriftPerDay = probe.DriftPerDay,
            OldestUsed = probe.OldestUsed,
            CalibratedAt = probe.CalibratedAt,
        })],
    };
}
