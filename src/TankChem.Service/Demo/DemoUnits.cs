using TankChem.Monitoring.Readings;
using TankChem.Simulation.Demo;

namespace TankChem.Service.Demo;

/// <summary>The unit that goes out with a simulated reading.</summary>
internal static class DemoUnits
{
    /// <summary>Canonical units that are no unit code (° C on screens is Cel on the wire) are left away: a bare number is in the canonical unit, except where the unit must be said.</summary>
    public static string? Sent(SimulatedReading reading) =>
        QuantityCatalog.Get(reading.Quantity).NeedsConfirmedUnit ? reading.Unit : null;
}
