using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Water;

/// <summary>One computation of a water state: chooses inputs, then fills in what follows from them. Lives for one call.</summary>
internal sealed partial class WaterComputation(WaterSetup setup, ReadingBook book, DateTimeOffset now, CarbonateMemo memo)
{
    private readonly Dictionary<string, WaterValue> _values = new(32, StringComparer.Ordinal);
    private readonly List<KnowledgeGap> _gaps = [];
    private DateTimeOffset _staysUntil = DateTimeOffset.MaxValue;

    private ChosenInput? _ph;
    private ChosenInput? _alkalinity;
    private ChosenInput? _temperature;
    private ChosenInput? _salinityProbe;
    private ChosenInput? _conductivity;
    private ChosenInput? _tan;
    private ChosenInput? _oxygen;
    private ChosenInput? _oxygenSaturation;
    private ChosenInput? _airCo2;
    private ChosenInput? _airPressure;
    private ChosenInput? _calcium;

    public WaterAssessment Run()
    {
        PlaceBook own = book.Of(setup.Place.Key);
        foreach (QuantityBook quantity in own.Quantities)
            PassThrough(quantity);
        if (setup.Place.Kind != PlaceKind.Site)
        {
            if (setup.IsInLoop)
                InheritFromLoop();
            ComputeWater(own);
        }

        return new WaterAssessment(State(), _gaps, _staysUntil);
    }

    private WaterState State()
    {
        bool nothing = true;
        foreach (WaterValue value in _values.Values)
            nothing &= value.Inputs.Count == 0;
        if (nothing)
            _values.Clear();
        return new WaterState
        {
            Place = setup.Place.Key,
            Kind = setup.Place.Kind,
            Assigned = setup.Place.Assigned,
            Time = nothing ? null : now,
            Status = nothing ? WaterStatus.None : _gaps.Count > 0 ? WaterStatus.Partial : WaterStatus.Ok,
            Reason = Reason(nothing),
            Values = _values,
        };
    }

    private string? Reason(bool nothing)
    {
        if (_gaps.Count == 0)
            return nothing ? "no usable reading yet" : null;
        var parts = new List<string>();
        foreach (KnowledgeGap gap in _gaps)
        {
            string start = $"{gap.Value} cannot be computed: ";
            int known = parts.FindIndex(part => part.StartsWith(start, StringComparison.Ordinal));
            if (known < 0)
                parts.Add(start + gap.Text);
            else
                parts[known] += ", " + gap.Text;
        }

        return string.Join("; ", parts);
    }

    private void PassThrough(QuantityBook quantity)
    {
        if (quantity.Quantity == SeriesKey.DeviceState || ChosenInput.Of(quantity, setup.Place, now) is not { } chosen)
            return;
        Remember(quantity.Quantity, chosen);
        Put(quantity.Quantity == "pco2" ? "pco2-measured" : quantity.Quantity, quantity.Definition.Unit, chosen);
    }

    private void Remember(string quantity, ChosenInput chosen)
    {
        switch (quantity)
        {
            case "ph":
                _ph = chosen;
                break;
            case "alkalinity":
                _alkalinity = chosen;
                break;
            case "temperature":
                _temperature = chosen;
                break;
            case "salinity":
                _salinityProbe = chosen;
                break;
            case "conductivity":
                _conductivity = chosen;
                break;
            case "tan":
                _tan = chosen;
                break;
            case "oxygen":
                _oxygen = chosen;
                break;
            case "oxygen-saturation":
                _oxygenSaturation = chosen;
                break;
            case "air-co2":
                _airCo2 = chosen;
                break;
            case "air-pressure":
                _airPressure = chosen;
                break;
            case "calcium":
                _calcium = chosen;
                break;
        }
    }

    private void InheritFromLoop()
    {
        PlaceBook loop = book.Of(setup.LoopKey);
        Inherit(loop, "alkalinity", ref _alkalinity);
        Inherit(loop, "temperature", ref _temperature);
        Inherit(loop, "tan", ref _tan);
        Inherit(loop, "calcium", ref _calcium);

        // Its own conductivity says more about a tank's salt than its loop's salinity probe.
        bool hasOwnSalt = _salinityProbe is { IsStale: false } || _conductivity is { IsStale: false };
        if (!hasOwnSalt)
        {
            Inherit(loop, "salinity", ref _salinityProbe);
            Inherit(loop, "conductivity", ref _conductivity);
        }
    }

    private void Inherit(PlaceBook loop, string quantity, ref ChosenInput? own)
    {
        if (own is { IsStale: false } || loop.Find(quantity) is not { } loopQuantity || ChosenInput.Of(loopQuantity, setup.Loop, now) is not { } inherited)
            return;
        if (own is not null && inherited.IsStale && own.Time >= inherited.Time)
            return;
        string from = $"from {setup.LoopName}";
        inherited.Caveat = inherited.Caveat is null ? from : $"{from}; {inherited.Caveat}";
        own = inherited;
        Put(quantity, loopQuantity.Definition.Unit, inherited);
    }

    /// <summary>A reading as a value.</summary>
    private void Put(string name, string unit, ChosenInput chosen)
    {
        if (!chosen.IsStale && chosen.UsedUntil < _staysUntil)
            _staysUntil = chosen.UsedUntil;
        string? second = chosen.IsStale ? "last known, too old to be used"
            : name == "ph" && !chosen.IsCalibrated ? "no calibration on record"
            : null;
        string[] caveats = (chosen.Caveat, second) switch
        {
            (null, null) => [],
            (null, _) => [second],
            (_, null) => [chosen.Caveat],
            _ => [chosen.Caveat, second],
        };
        _values[name] = new WaterValue
        {
            Value = chosen.Value,
            Unit = unit,
            U = chosen.U,
            Time = chosen.Time,
            Stale = chosen.IsStale,
            Inputs = [chosen.Input],
            Caveats = caveats,
        };
    }

    /// <summary>A computed value; one that is no number is left out, and the gap says so.</summary>
    private void PutComputed(string name, double value, double? u, Ground ground)
    {
        if (!double.IsFinite(value))
            return;
        _values[name] = new WaterValue
        {
            Value = value,
            Unit = QuantityCatalog.Get(name).Unit,
            U = u is { } known && double.IsFinite(known) ? Math.Abs(known) : null,
            Time = ground.Time,
            Inputs = ground.Inputs,
            Caveats = ground.Caveats,
        };
    }

    private void AddGap(string value, string quantity, string name, ChosenInput? input, PlaceBook own)
    {
        if (input is { IsStale: true })
        {
            _gaps.Add(new KnowledgeGap(value, quantity, KnowledgeGapKind.TooOld, $"{name} last known {Moment.Words(input.Time, now)}"));
            return;
        }

        Reading? newest = NewestUnusable(own.Find(quantity)) ?? (setup.IsInLoop ? NewestUnusable(book.Of(setup.LoopKey).Find(quantity)) : null);
        _gaps.Add(newest is null
            ? new KnowledgeGap(value, quantity, KnowledgeGapKind.NeverKnown, $"{name} not known")
            : new KnowledgeGap(value, quantity, KnowledgeGapKind.NotUsable, $"{name} not usable ({newest.Reason ?? "of doubtful quality"})"));
    }

    private static Reading? NewestUnusable(QuantityBook? quantity)
    {
        Reading? newest = null;
        if (quantity is not null)
        {
            foreach (SeriesBook series in quantity.Probes)
            {
                if (!series.Latest.IsUsable && (newest is null || series.Latest.Time > newest.Time))
                    newest = series.Latest;
            }
        }

        return newest;
    }

    /// <summary>What a computed value stands on.</summary>
    private sealed record Ground(DateTimeOffset Time, IReadOnlyList<WaterInput> Inputs, IReadOnlyList<string> Caveats);
}
