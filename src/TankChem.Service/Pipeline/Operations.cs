using TankChem.Dosing;
using TankChem.Monitoring.Advising;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Service.Pipeline;

/// <summary>What people do, checked, then run by the writer so that it is on disk when they are answered.</summary>
internal sealed class Operations : IOperations
{
    /// <summary>A longest text, so that a log entry stays one.</summary>
    private const int TextMax = 4_000;
    private const int WhoMax = 80;
    private const int RederiveMax = 200_000;
    private static readonly TimeSpan ClockSlack = TimeSpan.FromMinutes(5);

    private readonly FarmPipeline pipeline;
    private readonly Farm farm;
    private readonly IHistory history;
    private readonly IRecovery recovery;
    private readonly DoseLedger ledger;

    public Operations(FarmPipeline pipeline, Farm farm, IHistory history, IRecovery recovery, DoseLedger ledger)
    {
        this.pipeline = pipeline;
        this.farm = farm;
        this.history = history;
        this.recovery = recovery;
        this.ledger = ledger;
    }

    public Task<OperationResult> CommandAlarmAsync(AlarmCommand command, CancellationToken cancellationToken)
    {
        ArgumentNullException.ThrowIfNull(command);
        return FaultOfWho(command.Who) is { } fault
            ? Task.FromResult(fault)
            : pipeline.RunAsync((engine, now) => engine.Apply(command, now) is { } refusal ? new OperationResult(false, refusal) : OperationResult.Success, cancellationToken);
    }

    public Task<OperationResult> RecordAsync(LogEntry entry, CancellationToken cancellationToken)
    {
        ArgumentNullException.ThrowIfNull(entry);
        return FaultOf(entry.Place, entry.Who, entry.At, entry.Text) is { } fault
            ? Task.FromResult(fault)
            : pipeline.RunAsync(
                (engine, now) =>
                {
                    LogEntry kept = entry with { RecordedAt = now };
                    engine.Batch.Log.Add(kept);
                    ledger.Take(kept);
                    return OperationResult.Success;
                },
                cancellationToken);
    }

    public Task<OperationResult> RecordMeasurementAsync(PlaceKey place, string quantity, string text, string unit, DateTimeOffset drawnAt, string who, CancellationToken cancellationToken)
    {
        if (FaultOf(place, who, drawnAt, text) is { } fault)
            return Task.FromResult(fault);
        if (!DecimalText.TryParse(text, out double raw, out string? numberFault))
            return Task.FromResult(new OperationResult(false, numberFault, "value"));
        QuantityDefinition definition = QuantityCatalog.Get(quantity);
        if (definition.Computed)
            return Task.FromResult(new OperationResult(false, $"{definition.Name} is computed here and cannot be typed.", "quantity"));
        if (!UnitConverter.TryConvert(quantity, unit, raw, out _, out string? unitFault))
            return Task.FromResult(new OperationResult(false, unitFault, "unit"));

        var parsed = new ParsedReading(new SeriesKey(place, quantity, SeriesKey.MainProbe), raw, unit, drawnAt.ToUniversalTime());
        Reading trial = ReadingResolver.Resolve(parsed, farm.Now, ReadingOrigin.Manual, parsed.OwnTime!.Value, unit);
        if (!trial.IsUsable)
            return Task.FromResult(new OperationResult(false, $"{text} {unit} is not a possible {definition.Name}: {trial.Reason}.", "value"));

        return pipeline.RunAsync(
            (engine, now) =>
            {
                engine.Take(parsed, now, ReadingOrigin.Manual);
                engine.Batch.Log.Add(new LogEntry
                {
                    Place = place,
                    At = parsed.OwnTime!.Value,
                    RecordedAt = now,
                    Kind = LogKind.Titration,
                    Who = who,
                    Text = $"{definition.Name} {text.Trim()} {unit}, measured by hand",
                    Amount = raw,
                    Unit = unit,
                    Subject = quantity,
                });
                return OperationResult.Success;
            },
            cancellationToken);
    }

    public async Task<OperationResult> RecordLossAsync(LossRecord loss, CancellationToken cancellationToken)
    {
        ArgumentNullException.ThrowIfNull(loss);
        if (FaultOf(loss.Place, loss.Who, loss.FoundAt, loss.Stock) is { } fault)
            return fault.Field == "text" ? fault with { Field = "stock", Fault = "Which stock was lost? A few words or the stock group." } : fault;
        if (loss.Count is < 0)
            return new OperationResult(false, "The number lost cannot be negative; leave it empty when nobody counted.", "count");
        if (loss.Notes.Length > TextMax)
            return new OperationResult(false, $"The notes are longer than {TextMax} characters.", "notes");

        LossRecord kept = await pipeline.RunAsync(
            (engine, now) =>
            {
                LossRecord dated = loss with { RecordedAt = now };
                engine.Batch.Losses.Add(dated);
                engine.Batch.Log.Add(new LogEntry
                {
                    Place = loss.Place,
                    At = loss.FoundAt,
                    RecordedAt = now,
                    Kind = LogKind.Loss,
                    Who = loss.Who,
                    Text = loss.Count is { } count ? $"{count} {loss.Stock} lost. {loss.Notes}".TrimEnd() : $"{loss.Stock} lost, not counted. {loss.Notes}".TrimEnd(),
                    Amount = loss.Count,
                    Subject = loss.Stock,
                });
                return dated;
            },
            cancellationToken);
        IReadOnlyList<LossRecord> all = await history.LossesAsync(cancellationToken);
        long id = all.Where(l => l.Place == kept.Place && l.RecordedAt.ToUnixTimeMilliseconds() == kept.RecordedAt.ToUnixTimeMilliseconds()).Select(l => l.Id).DefaultIfEmpty().Max();
        return new OperationResult(true, null, Id: id);
    }

    public Task<OperationResult> ConfirmUnitAsync(SeriesKey series, string unit, string who, CancellationToken cancellationToken)
    {
        if (FaultOfWho(who) is { } fault)
            return Task.FromResult(fault);
        if (!UnitConverter.TryConvert(series.Quantity, unit, 1, out _, out string? unitFault))
            return Task.FromResult(new OperationResult(false, unitFault, "unit"));
        if (farm.Find(series.Place) is null)
            return Task.FromResult(new OperationResult(false, $"There is no place {series.Place}.", "place"));

        return pipeline.RunAsync(
            (engine, now) =>
            {
                PlaceRuntime place = engine.Find(series.Place)!;
                List<ProbeDefinition> probes = [.. place.Definition.Probes];
                int at = probes.FindIndex(p => p.Quantity == series.Quantity && p.Probe == series.Probe);
                if (at < 0)
                    probes.Add(new ProbeDefinition { Quantity = series.Quantity, Probe = series.Probe, Unit = unit });
                else
                    probes[at] = probes[at] with { Unit = unit };
                engine.SetUp(place.Definition with { Probes = probes });
                foreach (Reading kept in recovery.LoadUnconfirmed(series, DateTimeOffset.UnixEpoch, RederiveMax))
                {
                    Reading derived = ReadingResolver.Rederive(kept, unit);
                    engine.Batch.Rederived.Add(derived);
                    engine.Deliver(place, derived);
                }

                engine.Batch.Log.Add(new LogEntry { Place = series.Place, At = now, RecordedAt = now, Kind = LogKind.Setup, Who = who, Text = $"The bare numbers of {series.Quantity}/{series.Probe} are in {unit}", Subject = series.Quantity, Unit = unit });
                return OperationResult.Success;
            },
            cancellationToken);
    }

    public Task<OperationResult> SetUpPlaceAsync(PlaceDefinition place, string who, CancellationToken cancellationToken)
    {
        ArgumentNullException.ThrowIfNull(place);
        if (FaultOfWho(who) is { } fault)
            return Task.FromResult(fault);
        return pipeline.RunAsync(
            (engine, now) =>
            {
                if (PlaceCheck.FaultOf(place, engine) is { } placeFault)
                    return placeFault;
                engine.SetUp(place with { Assigned = true });
                engine.Batch.Log.Add(new LogEntry { Place = place.Key, At = now, RecordedAt = now, Kind = LogKind.Setup, Who = who, Text = $"Set up as {place.Name}" });
                return OperationResult.Success;
            },
            cancellationToken);
    }

    public DosePlan PlanDose(PlaceKey place, DoseTarget target, IReadOnlyList<string> reagents) =>
        DosePlanner.Plan(Problem(place), target, reagents);

    public IReadOnlyList<Remedy> Remedies(PlaceKey place)
    {
        PlaceSnapshot? snapshot = farm.Find(place);
        return snapshot is null || !snapshot.Definition.Assigned ? [] : RemedyAdvisor.ForHighCo2(Problem(place), snapshot.Definition.Co2Injection);
    }

    private DoseProblem Problem(PlaceKey key)
    {
        PlaceSnapshot place = farm.Find(key) ?? throw new ArgumentException($"There is no place {key}.", nameof(key));
        string? loopId = place.Definition.Kind == PlaceKind.Loop ? key.Place : place.Definition.Loop;
        PlaceSnapshot? loop = loopId is null ? null : farm.Find(new PlaceKey(key.Site, loopId));
        PlaceSnapshot[] tanks = loopId is null ? [] : [.. farm.Places.Where(p => p.Definition.Key.Site == key.Site && p.Definition.Loop == loopId)];
        HashSet<PlaceKey> shared = [key, .. tanks.Select(t => t.Definition.Key)];
        if (loop is not null)
            shared.Add(loop.Definition.Key);
        double? volume = loop is not null ? loop.Definition.VolumeM3 : place.Definition.VolumeM3;
        return DoseAdvice.Problem(place, loop, tanks, farm.Now, ledger.DosedTodayMmolL(place.Site, shared, volume, farm.Now));
    }

    private OperationResult? FaultOf(PlaceKey place, string who, DateTimeOffset at, string text)
    {
        if (farm.Find(place) is null)
            return new OperationResult(false, $"There is no place {place}.", "place");
        if (FaultOfWho(who) is { } fault)
            return fault;
        if (at > farm.Now + ClockSlack)
            return new OperationResult(false, $"The time {at:yyyy-MM-dd HH:mm} is in the future; it is now {farm.Now:yyyy-MM-dd HH:mm} UTC.", "time");
        if (at < DateTimeOffset.UnixEpoch.AddYears(30))
            return new OperationResult(false, $"The time {at:yyyy-MM-dd HH:mm} is before the year 2000.", "time");
        if (string.IsNullOrWhiteSpace(text))
            return new OperationResult(false, "Say in a few words what was done or seen.", "text");
        return text.Length > TextMax ? new OperationResult(false, $"The text is longer than {TextMax} characters.", "text") : null;
    }

    private static OperationResult? FaultOfWho(string who)
    {
        if (string.IsNullOrWhiteSpace(who))
            return new OperationResult(false, "Say who you are: a name or initials.", "who");
        return who.Length > WhoMax ? new OperationResult(false, $"The name is longer than {WhoMax} characters.", "who") : null;
    }
}
