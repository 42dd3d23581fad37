using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;

namespace TankChem.Dashboard.Text;

/// <summary>Words about places.</summary>
internal static class Place
{
    /// <summary>What kind of place it is, or in which loop; null for a tank on its own.</summary>
    public static string? InLoop(PlaceSnapshot place) => place.Definition.Kind switch
    {
        PlaceKind.Loop => "loop",
        PlaceKind.Site => "whole site",
        PlaceKind.Tank => place.Definition.Loop is { } loop
            ? $"in {place.Site.Places.FirstOrDefault(p => p.Key.Place == loop)?.Name ?? loop}"
            : null,
    };
}
