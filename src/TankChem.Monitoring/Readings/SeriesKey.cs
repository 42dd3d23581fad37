using TankChem.Monitoring.Places;

namespace TankChem.Monitoring.Readings;

/// <summary>Names one series of readings. A device's state is the quantity <c>state</c> with the device as probe, 1 = on, 0 = off.</summary>
/// <param name="Place">Where.</param>
/// <param name="Quantity">What, by its id.</param>
/// <param name="Probe">By which probe; <c>main</c> when not named.</param>
public readonly record struct SeriesKey(PlaceKey Place, string Quantity, string Probe)
{
    /// <summary>The quantity id of device states.</summary>
    public const string DeviceState = "state";

    /// <summary>The probe id when none is named.</summary>
    public const string MainProbe = "main";
}
