using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Monitors;

/// <summary>Watches one place: readings and the passing of time in, water states and alarm events out. No clock, no I/O; not thread-safe.</summary>
public sealed class TankMonitor
{
    /// <summary>A monitor that remembers what was on disk.</summary>
    /// <param name="site">The place's site.</param>
    /// <param name="place">The place.</param>
    /// <param name="remembered">Its newest readings, its loop's and its site's; any order.</param>
    /// <param name="alarmStates">Its alarm states.</param>
    public TankMonitor(SiteDefinition site, PlaceDefinition place, IEnumerable<Reading> remembered, IEnumerable<KeyValuePair<AlarmKey, AlarmState>> alarmStates) => throw new NotSupportedException();

    /// <summary>The place as of the last step.</summary>
    public PlaceSnapshot Snapshot => throw new NotSupportedException();

    /// <summary>Takes new readings (of the place itself, its loop, or its site; any order, late ones too) and the time.</summary>
    public MonitorOutcome Advance(IReadOnlyList<Reading> readings, DateTimeOffset now) => throw new NotSupportedException();

    /// <summary>Applies a person's command to one of its alarms.</summary>
    public MonitorOutcome Apply(AlarmCommand command, DateTimeOffset now) => throw new NotSupportedException();

    /// <summary>Takes a changed set-up of its site or place; what it remembers stays.</summary>
    public void Reconfigure(SiteDefinition site, PlaceDefinition place) => throw new NotSupportedException();
}
