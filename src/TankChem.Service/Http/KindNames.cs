using TankChem.Monitoring.Places;

namespace TankChem.Service.Http;

/// <summary>Kinds of place as the API writes them.</summary>
internal static class KindNames
{
    public static string Of(PlaceKind kind) => kind switch
    {
        PlaceKind.Tank => "tank",
        PlaceKind.Loop => "loop",
        PlaceKind.Site => "site",
    };
}
