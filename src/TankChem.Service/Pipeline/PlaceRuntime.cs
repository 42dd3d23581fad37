using TankChem.Monitoring.Monitors;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Service.Pipeline;

/// <summary>A place as it runs: its set-up, its monitor, and what waits for it.</summary>
internal sealed class PlaceRuntime(SiteDefinition site, PlaceDefinition definition, TankMonitor monitor)
{
    /// <summary>Its site.</summary>
    public SiteDefinition Site { get; set; } = site;

    /// <summary>Its set-up.</summary>
    public PlaceDefinition Definition { get; set; } = definition;

    /// <summary>Its monitor; replaced when the loop it belongs to changes.</summary>
    public TankMonitor Monitor { get; set; } = monitor;

    /// <summary>Readings for its next step: its own, its loop's, its site's.</summary>
    public List<Reading> Pending { get; } = [];

    /// <summary>Why its last step failed; null when it did not.</summary>
    public string? Fault { get; set; }
}
