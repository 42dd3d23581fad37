using System.Globalization;
using Microsoft.AspNetCore.Components;
using Microsoft.JSInterop;
using TankChem.Dashboard.Live;
using TankChem.Dashboard.Text;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;

namespace TankChem.Dashboard.Components.Pages;

/// <summary>Losses: those recorded, and a form for a new one.</summary>
public sealed partial class LossesPage
{
    private string where = "";
    private string found = "";
    private string count = "";
    private string stock = "";
    private string notes = "";
    private string who = "";
    private OperationResult? result;
    private IReadOnlyList<LossRecord>? losses;

    /// <summary>Site that is chosen at first.</summary>
    [SupplyParameterFromQuery(Name = "site")]
    public string? SiteId { get; set; }

    /// <summary>Place that is chosen at first.</summary>
    [SupplyParameterFromQuery(Name = "place")]
    public string? PlaceId { get; set; }

    /// <summary>What is on disk.</summary>
    [Inject]
    public required IHistory History { get; set; }

    /// <summary>What people do.</summary>
    [Inject]
    public required IOperations Operations { get; set; }

    /// <summary>Leads to the review.</summary>
    [Inject]
    public required NavigationManager Navigation { get; set; }

    /// <summary>The browser.</summary>
    [Inject]
    public required IJSRuntime Browser { get; set; }

    private IEnumerable<PlaceSnapshot> Tanks => Farm.Places.Where(p => p.Definition.Kind == PlaceKind.Tank).OrderBy(p => p.Definition.Name, StringComparer.Ordinal);

    private PlaceSnapshot? Chosen => Farm.Places.FirstOrDefault(p => p.Definition.Key.ToString() == where);

    private SiteDefinition? ChosenSite => Chosen?.Site;

    /// <inheritdoc/>
    protected override async Task OnInitializedAsync()
    {
        where = SiteId is not null && PlaceId is not null ? new PlaceKey(SiteId, PlaceId).ToString() : Tanks.FirstOrDefault()?.Definition.Key.ToString() ?? "";
        found = TimeText.Field(Farm.Now, ChosenSite);
        stock = Chosen?.Definition.Stock.Count > 0 ? Chosen.Definition.Stock[0] : "";
        losses = await History.LossesAsync(CancellationToken.None);
    }

    private string? FaultOf(string field) => result is { Done: false } && result.Field == field ? result.Fault : null;

    private async Task RecordAsync()
    {
        result = Read(out LossRecord? loss) ?? await Operations.RecordLossAsync(loss!, CancellationToken.None);
        if (!result.Done)
            return;
        await BrowserMemory.RememberNameAsync(Browser, who);
        Navigation.NavigateTo($"/losses/{result.Id}");
    }

    private OperationResult? Read(out LossRecord? loss)
    {
        loss = null;
        if (Chosen is not { } place)
            return new OperationResult(false, "Where? Choose a place.", "place");
        if (!TimeText.TryField(found, place.Site, out DateTimeOffset foundAt))
            return new OperationResult(false, "When was it found? Date and time.", "time");
        int? number = null;
        if (!string.IsNullOrWhiteSpace(count))
        {
            if (!int.TryParse(count.Trim(), NumberStyles.None, CultureInfo.InvariantCulture, out int lost))
                return new OperationResult(false, $"\"{count}\" is not a whole number; leave it empty when nobody counted.", "count");
            number = lost;
        }

        loss = new LossRecord { Place = place.Definition.Key, FoundAt = foundAt, Count = number, Stock = stock, Who = who, Notes = notes, RecordedAt = Farm.Now };
        return null;
    }
}
