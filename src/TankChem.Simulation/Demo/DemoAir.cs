using TankChem.Chemistry;
using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Demo;

/// <summary>The air of the demo's hall: more CO2 while people work there, a barometer that wanders.</summary>
internal static class DemoAir
{
    private const double WanderHpa = 7;
    private const double WanderDays = 5.7;
    private const double HpaPerAtm = 1013.25;

    private static readonly double StandardAtm = Atmosphere.PressureAtmAtElevation(DemoSite.ElevationM);

    public static Air At(DateTimeOffset time)
    {
        double hour = time.UtcDateTime.TimeOfDay.TotalHours;
        double days = (time.UtcDateTime - DateTime.UnixEpoch).TotalDays;
        double co2 = DemoSite.AirCo2Ppm + 45 * Math.Max(0, Math.Sin(Math.PI * (hour - 7) / 11)) + 8 * Math.Sin(2 * Math.PI * days / 3.1);
        double pressure = StandardAtm + WanderHpa / HpaPerAtm * Math.Sin(2 * Math.PI * days / WanderDays);
        return new Air(co2, pressure);
    }
}
