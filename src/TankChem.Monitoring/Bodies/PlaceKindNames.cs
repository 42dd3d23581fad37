using TankChem.Monitoring.Places;

namespace TankChem.Monitoring.Bodies;

/// <summary>Kinds of place as bodies write them.</summary>
public static class PlaceKindNames
{
    /// <summary><c>tank</c>, <c>loop</c> or <c>site</c>.</summary>
    public static string Of(PlaceKind kind) => kind switch
    {
        PlaceKind.Tank => "tank",
        PlaceKind.Loop => "loop",
        PlaceKind.Site => "site",
    };
}
