using Microsoft.AspNetCore.Components;
using Microsoft.JSInterop;
using TankChem.Dashboard.Live;
using TankChem.Dashboard.Text;
using TankChem.Dosing;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Dashboard.Components.Parts;

/// <summary>The logbook of a place, and what can be written into it.</summary>
public sealed partial class LogView
{
    private const int EntriesMax = 120;
    private static readonly LogKind[] Kinds = [LogKind.Note, LogKind.Feed, LogKind.WaterExchange, LogKind.Dose, LogKind.Cleaning, LogKind.Calibration];

    private static readonly QuantityDefinition[] Measurable =
        [.. QuantityCatalog.All.Where(q => !q.Computed && q.Id is "alkalinity" or "ph" or "tan" or "nitrite" or "calcium" or "oxygen" or "oxygen-saturation" or "temperature" or "salinity" or "gas-pressure").OrderBy(q => q.Id != "alkalinity")];

    private string quantity = "alkalinity";
    private string number = "";
    private string unit = "";
    private string drawn = "";
    private string who = "";
    private OperationResult? measured;
    private LogKind kind = LogKind.Note;
    private string amount = "";
    private string? amountFault;
    private string subject = ReagentCatalog.Bicarbonate;
    private string text = "";
    private string when = "";
    private OperationResult? written;
    private IReadOnlyList<LogEntry>? entries;

    /// <summary>The place.</summary>
    [Parameter, EditorRequired]
    public required PlaceSnapshot Place { get; set; }

    /// <summary>What people do.</summary>
    [Inject]
    public required IOperations Operations { get; set; }

    /// <summary>What is on disk.</summary>
    [Inject]
    public required IHistory History { get; set; }

    /// <summary>The live farm, for its clock.</summary>
    [Inject]
    public required IFarm Farm { get; set; }

    /// <summary>The browser.</summary>
    [Inject]
    public required IJSRuntime Browser { get; set; }

    private IEnumerable<string> UnitChoices =>
        QuantityCatalog.Get(quantity) is { UnitChoices.Count: > 0 } known ? known.UnitChoices : [QuantityCatalog.Get(quantity).Unit is { Length: > 0 } canonical ? canonical : "1"];

    private string? AmountUnit => kind switch
    {
        LogKind.Feed => "kg",
        LogKind.WaterExchange => "m³",
        LogKind.Dose => "g",
        _ => null,
    };

    /// <inheritdoc/>
    protected override async Task OnInitializedAsync()
    {
        drawn = when = TimeText.Field(Farm.Now, Place.Site);
        TakeUnit();
        await LoadAsync();
    }

    private string? MeasureFault(string field) => measured is { Done: false } && measured.Field == field ? measured.Fault : null;

    private string? WriteFault(string field) => written is { Done: false } && written.Field == field ? written.Fault : null;

    /// <summary>The tank's own unit, when somebody said which it is.</summary>
    private void TakeUnit()
    {
        string? own = Place.Definition.Probes.FirstOrDefault(p => p.Quantity == quantity)?.Unit;
        unit = own is not null && UnitChoices.Contains(own, StringComparer.Ordinal) ? own : UnitChoices.First();
    }

    private static string AmountOf(LogEntry entry) =>
        entry is { Amount: { } value, Kind: LogKind.Feed or LogKind.WaterExchange or LogKind.Dose }
            ? $" ({value.ToString("0.##", System.Globalization.CultureInfo.InvariantCulture)} {entry.Unit})"
            : "";

    private async Task LoadAsync() =>
        entries = await History.LogAsync(Place.Definition.Key, Farm.Now.AddDays(-30), Farm.Now.AddDays(1), EntriesMax, CancellationToken.None);

    private async Task MeasureAsync()
    {
        if (!TimeText.TryField(drawn, Place.Site, out DateTimeOffset drawnAt))
        {
            measured = new OperationResult(false, "When was the sample drawn? Date and time.", "time");
            return;
        }

        measured = await Operations.RecordMeasurementAsync(Place.Definition.Key, quantity, number, unit, drawnAt, who, CancellationToken.None);
        if (!measured.Done)
            return;
        number = "";
        await BrowserMemory.RememberNameAsync(Browser, who);
        await LoadAsync();
    }

    private async Task WriteAsync()
    {
        amountFault = null;
        double value = 0;
        if (AmountUnit is not null && !DecimalText.TryParse(amount, out value, out amountFault))
            return;
        if (!TimeText.TryField(when, Place.Site, out DateTimeOffset at))
        {
            written = new OperationResult(false, "When was it? Date and time.", "time");
            return;
        }

        written = await Operations.RecordAsync(
            new LogEntry
            {
                Place = Place.Definition.Key,
                At = at,
                RecordedAt = Farm.Now,
                Kind = kind,
                Who = who,
                Text = text.Length == 0 && AmountUnit is not null ? LogText.Kind(kind) : text,
                Amount = AmountUnit is null ? null : value,
                Unit = AmountUnit,
                Subject = kind == LogKind.Dose ? subject : null,
            },
            CancellationToken.None);
        if (!written.Done)
            return;
        text = "";
        amount = "";
        await BrowserMemory.RememberNameAsync(Browser, who);
        await LoadAsync();
    }
}
