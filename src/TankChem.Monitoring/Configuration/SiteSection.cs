using System.Text.Json;
using TankChem.Monitoring.Places;

namespace TankChem.Monitoring.Configuration;

/// <summary>Reads a site with its loops and tanks, and looks at what they are to each other.</summary>
internal static class SiteSection
{
    public static SiteDefinition? Read(JsonElement element, string path, ConfigurationNotes notes)
    {
        var node = new ConfigurationNode(element, path, notes, "id", "name", "airCo2Ppm", "elevationM", "timeZone", "loops", "tanks");
        string? id = node.Text("id", required: true);
        if (id is null || !PlaceSection.IsUsableId(id, node.PathOf("id"), notes))
            return null;
        string zone = node.Text("timeZone") ?? "UTC";
        if (!TimeZoneInfo.TryFindSystemTimeZoneById(zone, out _))
            notes.Fault(node.PathOf("timeZone"), $"\"{zone}\" is no time zone that this machine knows; right would be like Europe/Oslo");

        var places = new Dictionary<string, PlaceDefinition>(StringComparer.Ordinal);
        ReadPlaces(node, "loops", PlaceKind.Loop, id, places, notes);
        ReadPlaces(node, "tanks", PlaceKind.Tank, id, places, notes);
        if (places.Count == 0)
            notes.Warning(path, $"{id} has neither loops nor tanks");
        CheckLoops(node, places, notes);
        return new SiteDefinition
        {
            Id = id,
            Name = node.Text("name") ?? id,
            AirCo2Ppm = node.Number("airCo2Ppm", 1, 100_000) ?? new SiteDefinition { Id = id, Name = id }.AirCo2Ppm,
            ElevationM = node.Number("elevationM", -500, 5_000) ?? 0,
            TimeZone = zone,
            Places = [.. places.Values],
        };
    }

    private static void ReadPlaces(ConfigurationNode site, string key, PlaceKind kind, string siteId, Dictionary<string, PlaceDefinition> places, ConfigurationNotes notes)
    {
        foreach ((JsonElement element, string path) in site.Items(key))
        {
            if (PlaceSection.Read(element, path, kind, siteId, notes) is not { } place)
                continue;
            if (!places.TryAdd(place.Key.Place, place))
                notes.Fault($"{path}.id", $"\"{place.Key.Place}\" stands twice at this site");
        }
    }

    private static void CheckLoops(ConfigurationNode site, Dictionary<string, PlaceDefinition> places, ConfigurationNotes notes)
    {
        int at = 0;
        foreach (PlaceDefinition tank in places.Values.Where(p => p.Kind == PlaceKind.Tank))
        {
            if (tank.Loop is { } loop && (!places.TryGetValue(loop, out PlaceDefinition? found) || found.Kind != PlaceKind.Loop))
                notes.Fault($"{site.PathOf("tanks")}[{at}].loop", $"there is no loop \"{loop}\" at this site{(places.Values.Any(p => p.Kind == PlaceKind.Loop) ? $"; its loops are {string.Join(", ", places.Values.Where(p => p.Kind == PlaceKind.Loop).Select(p => p.Key.Place))}" : "")}");
            at++;
        }

        at = 0;
        foreach (PlaceDefinition loop in places.Values.Where(p => p.Kind == PlaceKind.Loop))
        {
            PlaceDefinition[] tanks = [.. places.Values.Where(p => p.Loop == loop.Key.Place)];
            double sum = tanks.Sum(t => t.VolumeM3 ?? 0);
            if (loop.VolumeM3 is { } volume && sum > volume * (1 + 1e-9))
                notes.Warning($"{site.PathOf("loops")}[{at}].volume", string.Create(System.Globalization.CultureInfo.InvariantCulture, $"the loop holds {volume:0.###} m3, its tanks together {sum:0.###} m3; a loop's volume is all of its water, its tanks included"));
            if (tanks.Length == 0)
                notes.Warning($"{site.PathOf("loops")}[{at}]", $"no tank is in the loop {loop.Key.Place}");
            at++;
        }
    }
}
