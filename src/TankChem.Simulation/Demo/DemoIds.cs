namespace TankChem.Simulation.Demo;

/// <summary>Ids of the demo's places.</summary>
public static class DemoIds
{
    /// <summary>Planted tank with CO2 on a schedule.</summary>
    public const string Scape = "foyer-scape";

    /// <summary>Reef.</summary>
    public const string Reef = "reef-hall";

    /// <summary>Loop of the salmonids.</summary>
    public const string Loop = "north-loop";

    /// <summary>First tank of the loop.</summary>
    public const string North1 = "north-1";

    /// <summary>Second tank of the loop.</summary>
    public const string North2 = "north-2";

    /// <summary>Warm-water raceway.</summary>
    public const string Raceway = "raceway-c";

    /// <summary>Shrimp.</summary>
    public const string Shrimp = "shrimp-4";

    /// <summary>Publishes, but nobody has set it up.</summary>
    public const string Bench = "bench-trial";

    /// <summary>The reserved place of readings that hold for the whole site.</summary>
    public const string Site = "site";
}
