using System.Globalization;
using Microsoft.AspNetCore.Components;
using Microsoft.JSInterop;
using TankChem.Dashboard.Live;
using TankChem.Monitoring.Configuration;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Dashboard.Components.Pages;

/// <summary>Places: set up the ones that only publish so far, change the others.</summary>
public sealed partial class SetupPage
{
    private readonly HashSet<string> stock = new(StringComparer.Ordinal);
    private PlaceSnapshot? editing;
    private string name = "";
    private PlaceKind kind;
    private string volume = "";
    private string salinity = "";
    private string loop = "";
    private bool injection;
    private string who = "";
    private OperationResult? result;

    /// <summary>Site of the place to edit at once.</summary>
    [SupplyParameterFromQuery(Name = "site")]
    public string? SiteId { get; set; }

    /// <summary>Place to edit at once.</summary>
    [SupplyParameterFromQuery(Name = "place")]
    public string? PlaceId { get; set; }

    /// <summary>What people do.</summary>
    [Inject]
    public required IOperations Operations { get; set; }

    /// <summary>The browser.</summary>
    [Inject]
    public required IJSRuntime Browser { get; set; }

    /// <inheritdoc/>
    protected override void OnInitialized()
    {
        if (SiteId is not null && PlaceId is not null && Farm.Find(new PlaceKey(SiteId, PlaceId)) is { } place)
            Edit(place);
    }

    private static string Words(PlaceSnapshot place)
    {
        PlaceDefinition d = place.Definition;
        string water = d.VolumeM3 is { } v ? v < 1 ? $"{(v * 1000).ToString("0.#", CultureInfo.InvariantCulture)} L" : $"{v.ToString("0.##", CultureInfo.InvariantCulture)} m³" : "volume not on record";
        return $"{d.Key}, {water}{(d.Stock.Count > 0 ? $", {string.Join(" and ", d.Stock)}" : "")}{(d.Loop is { } l ? $", in {l}" : "")}";
    }

    private void Edit(PlaceSnapshot place)
    {
        editing = place;
        result = null;
        PlaceDefinition d = place.Definition;
        name = d.Name;
        kind = d.Kind;
        volume = d.VolumeM3 is { } v ? v < 1 ? $"{(v * 1000).ToString("0.###", CultureInfo.InvariantCulture)} L" : $"{v.ToString("0.###", CultureInfo.InvariantCulture)} m3" : "";
        salinity = d.Salinity?.ToString(CultureInfo.InvariantCulture) ?? "";
        loop = d.Loop ?? "";
        injection = d.Co2Injection;
        stock.Clear();
        stock.UnionWith(d.Stock);
    }

    private void Toggle(string id, bool on)
    {
        if (on)
            stock.Add(id);
        else
            stock.Remove(id);
    }

    private string? FaultOf(string field) => result is { Done: false } && result.Field == field ? result.Fault : null;

    private RenderFragment? FaultMarkup(string field) => FaultOf(field) is { } fault
        ? builder =>
        {
            builder.OpenElement(0, "span");
            builder.AddAttribute(1, "class", "fault");
            builder.AddAttribute(2, "role", "alert");
            builder.AddContent(3, fault);
            builder.CloseElement();
        }
    : null;

    private async Task SaveAsync()
    {
        result = Read(out PlaceDefinition? place) ?? await Operations.SetUpPlaceAsync(place!, who, CancellationToken.None);
        if (!result.Done)
            return;
        await BrowserMemory.RememberNameAsync(Browser, who);
        editing = null;
    }

    private OperationResult? Read(out PlaceDefinition? place)
    {
        place = null;
        double? cubicMetres = null, salt = null;
        if (!string.IsNullOrWhiteSpace(volume))
        {
            if (!MeasureText.TryVolume(volume, out double read, out string? volumeFault))
                return new OperationResult(false, volumeFault, "volume");
            cubicMetres = read;
        }

        if (!string.IsNullOrWhiteSpace(salinity))
        {
            if (!DecimalText.TryParse(salinity, out double read, out string? saltFault))
                return new OperationResult(false, saltFault, "salinity");
            salt = read;
        }

        place = editing!.Definition with
        {
            Name = name.Trim(),
            Kind = kind,
            VolumeM3 = cubicMetres,
            Salinity = salt,
            Loop = kind == PlaceKind.Tank && loop.Length > 0 ? loop : null,
            Stock = [.. stock.Order(StringComparer.Ordinal)],
            Co2Injection = injection,
            Assigned = true,
        };
        return null;
    }
}
