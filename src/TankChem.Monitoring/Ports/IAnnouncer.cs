using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Ports;

/// <summary>Tells the outside what is on disk. Never blocks; the newest of each place and alarm wins.</summary>
public interface IAnnouncer
{
    /// <summary>A place's newest water state.</summary>
    void Announce(WaterState water);

    /// <summary>An alarm's newest state.</summary>
    void Announce(AlarmView alarm);
}
