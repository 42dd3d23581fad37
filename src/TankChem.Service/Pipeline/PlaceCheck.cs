using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;

namespace TankChem.Service.Pipeline;

/// <summary>Whether a place can be set up as a person typed it.</summary>
internal static class PlaceCheck
{
    private const int NameMax = 80;
    private const double VolumeM3Max = 1_000_000;

    /// <summary>What is wrong and what would be right, or null.</summary>
    public static OperationResult? FaultOf(PlaceDefinition place, FarmEngine engine)
    {
        if (!PlaceNames.IsValidId(place.Key.Site) || !PlaceNames.IsValidId(place.Key.Place))
            return new OperationResult(false, $"{place.Key} is no id: site and place are 1 to 64 of a-z 0-9 - _ each.", "place");
        if ((place.Kind == PlaceKind.Site) != (place.Key.Place == PlaceKey.WholeSite))
            return new OperationResult(false, $"The id {PlaceKey.WholeSite} is reserved for the whole site.", "place");
        if (string.IsNullOrWhiteSpace(place.Name) || place.Name.Length > NameMax)
            return new OperationResult(false, $"A name of 1 to {NameMax} characters is needed.", "name");
        if (place.VolumeM3 is { } volume && (!double.IsFinite(volume) || volume <= 0 || volume > VolumeM3Max))
            return new OperationResult(false, "The volume must be more than 0, in m³ or litres.", "volume");
        if (place.Salinity is { } salinity && (!double.IsFinite(salinity) || salinity < 0 || salinity > 60))
            return new OperationResult(false, "The salinity must be between 0 and 60.", "salinity");
        if (place.Stock.FirstOrDefault(id => StockLimits.Find(id) is null) is { } unknown)
            return new OperationResult(false, $"\"{unknown}\" is no stock group; known are {string.Join(", ", StockLimits.Groups.Select(g => g.Id))}.", "stock");
        if (place.Loop is null)
            return null;
        if (place.Kind != PlaceKind.Tank)
            return new OperationResult(false, "Only a tank can be in a loop.", "loop");
        PlaceRuntime? loop = engine.Find(new PlaceKey(place.Key.Site, place.Loop));
        return loop is null || loop.Definition.Kind != PlaceKind.Loop
            ? new OperationResult(false, $"There is no loop {place.Loop} at this site.", "loop")
            : null;
    }
}
