namespace TankChem.Simulation.Demo;

/// <summary>The demo's site: invented, like all names in it.</summary>
public static class DemoSite
{
    /// <summary>Id of the site.</summary>
    public const string Id = "osier-reach";

    /// <summary>Name of the site.</summary>
    public const string Name = "Osier Reach";

    /// <summary>CO2 of the air, ppm, that belongs in the site's set-up.</summary>
    public const double AirCo2Ppm = 440;

    /// <summary>Elevation, m.</summary>
    public const double ElevationM = 60;

    /// <summary>How long a history the demo is made for; its stories lie inside.</summary>
    public static readonly TimeSpan HistoryLength = TimeSpan.FromDays(30);

    /// <summary>Makes the site as it stands at a time.</summary>
    /// <param name="historyEnd">When the history ends and live readings begin; taken down to the full minute.</param>
    /// <param name="seed">Seed of all that is random.</param>
    public static DemoScenario Create(DateTimeOffset historyEnd, int seed) => new(historyEnd, seed);
}
