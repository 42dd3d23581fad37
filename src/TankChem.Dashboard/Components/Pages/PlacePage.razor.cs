using Microsoft.AspNetCore.Components;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;

namespace TankChem.Dashboard.Components.Pages;

/// <summary>One place in four questions: what the water is, what it will do, what to do, what was done.</summary>
public sealed partial class PlacePage
{
    private static readonly (string Id, string Word, string Question)[] Views =
    [
        ("now", "Now", "What the water is"),
        ("next", "Next", "Where it is going"),
        ("act", "Act", "What to do"),
        ("log", "Log", "What was done"),
    ];

    /// <summary>Site id.</summary>
    [Parameter]
    public string Site { get; set; } = "";

    /// <summary>Place id.</summary>
    [Parameter]
    public string PlaceId { get; set; } = "";

    /// <summary>Which question.</summary>
    [SupplyParameterFromQuery(Name = "view")]
    public string? View { get; set; }

    private string Current => Array.Exists(Views, v => v.Id == View) ? View! : "now";

    private PlaceSnapshot? Snapshot => Farm.Find(new PlaceKey(Site, PlaceId));
}
