using TankChem.Dashboard.Text;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;

namespace TankChem.Dashboard.Components.Pages;

/// <summary>Every place as one plain sentence, worst first; the order waits while somebody is in the list.</summary>
public sealed partial class RoundsPage
{
    private List<PlaceKey> order = [];
    private bool held;
    private int formsOpen;

    private string Title => Farm.Places.Count(p => p.Urgency >= PlaceUrgency.Doubt) is var count and > 0 ? $"({count}) Rounds – TankChem" : "Rounds – TankChem";

    /// <inheritdoc/>
    protected override void OnInitialized() => Sort();

    /// <inheritdoc/>
    protected override void OnFarmChanged()
    {
        if (!held && formsOpen == 0)
            Sort();
        else
            AddNewAtTheEnd();
    }

    private void Sort() => order = [.. Farm.Places.Select(p => p.Definition.Key)];

    private void AddNewAtTheEnd()
    {
        foreach (PlaceSnapshot place in Farm.Places)
        {
            if (!order.Contains(place.Definition.Key))
                order.Add(place.Definition.Key);
        }
    }

    private IEnumerable<PlaceSnapshot> Shown() => order.Select(Farm.Find).OfType<PlaceSnapshot>();

    private void Hold() => held = true;

    private void Release() => held = false;

    private void Opened(bool open) => formsOpen = Math.Max(0, formsOpen + (open ? 1 : -1));

    private string Summary()
    {
        int urgent = Farm.Places.Count(p => p.Urgency >= PlaceUrgency.Urgent);
        int look = Farm.Places.Count(p => p.Urgency is PlaceUrgency.Warning or PlaceUrgency.Doubt);
        return (urgent, look) switch
        {
            (0, 0) => "All is well in every place that is set up.",
            (0, _) => $"{Places(look)} to look at, none urgent.",
            (_, 0) => $"{Places(urgent)} in danger.",
            _ => $"{Places(urgent)} in danger, {Places(look)} to look at.",
        };
    }

    private static string Places(int count) => count == 1 ? "One place" : $"{count} places";

    private string Heard(PlaceSnapshot place)
    {
        DateTimeOffset? newest = place.Latest.Count == 0 ? null : place.Latest.Max(r => r.Time);
        return newest is { } time ? $"Last heard {TimeText.Ago(time, Farm.Now)}" : "Nothing heard yet";
    }

    private static string Href(PlaceSnapshot place) => $"/place/{place.Definition.Key.Site}/{place.Definition.Key.Place}";
}
