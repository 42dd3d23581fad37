using TankChem.Monitoring.Places;

namespace TankChem.Monitoring.Water;

/// <summary>Makes a place's water state from the newest readings: its own first, its loop's where it has none, its site's for the air. Pure.</summary>
public static class WaterStateBuilder
{
    /// <summary>The water of a place at an instant.</summary>
    /// <param name="site">Its site.</param>
    /// <param name="place">The place.</param>
    /// <param name="book">The newest readings of the place, its loop and its site.</param>
    /// <param name="now">The instant; ages and uncertainties hold for it.</param>
    public static WaterAssessment Build(SiteDefinition site, PlaceDefinition place, ReadingBook book, DateTimeOffset now) =>
        Build(new WaterSetup(site, place), book, now, new CarbonateMemo());

    internal static WaterAssessment Build(WaterSetup setup, ReadingBook book, DateTimeOffset now, CarbonateMemo memo) => new WaterComputation(setup, book, now, memo).Run();
}

/// <summary>What of the set-up matters to a water, looked up once.</summary>
internal sealed class WaterSetup
{
    public WaterSetup(SiteDefinition site, PlaceDefinition place)
    {
        Site = site;
        Place = place;
        SiteKey = new PlaceKey(site.Id, PlaceKey.WholeSite);
        if (place.Loop is not null)
        {
            LoopKey = new PlaceKey(site.Id, place.Loop);
            foreach (PlaceDefinition candidate in site.Places)
            {
                if (candidate.Key == LoopKey)
                    Loop = candidate;
            }
        }

        TanIsExpected = place.Kind != PlaceKind.Site && place.Stock.Any(id => Alarming.StockLimits.Find(id)?.TanIsMeasured == true);
    }

    public SiteDefinition Site { get; }

    public PlaceDefinition Place { get; }

    public PlaceKey SiteKey { get; }

    /// <summary>Key of its loop; only meaningful when it is in one.</summary>
    public PlaceKey LoopKey { get; }

    public PlaceDefinition? Loop { get; }

    public bool IsInLoop => Place.Loop is not null;

    public string LoopName => Loop?.Name ?? LoopKey.Place;

    /// <summary>Whether a missing TAN is worth naming: with stock whose waste is measured, not with plants or corals.</summary>
    public bool TanIsExpected { get; }

    public static ProbeDefinition? Probe(PlaceDefinition? place, string quantity, string probe)
    {
        if (place is null)
            return null;
        for (int i = 0; i < place.Probes.Count; i++)
        {
            ProbeDefinition known = place.Probes[i];
            if (known.Quantity == quantity && known.Probe == probe)
                return known;
        }

        return null;
    }
}
