namespace TankChem.Simulation.Tanks;

/// <summary>What people and faults change at a virtual tank while it runs.</summary>
public sealed class TankControls
{
    /// <summary>Whether the degasser runs.</summary>
    public bool DegasserOn { get; set; } = true;

    /// <summary>Gas valve stuck open (true) or shut (false); null when it follows its timer.</summary>
    public bool? ValveStuck { get; set; }

    /// <summary>CO2 that flows through the open valve, as a share of its setting.</summary>
    public double InjectionShare { get; set; } = 1;

    /// <summary>Share of the usual feed.</summary>
    public double FeedShare { get; set; } = 1;

    /// <summary>Share of the usual water exchange.</summary>
    public double ExchangeShare { get; set; } = 1;

    /// <summary>Whether the alkalinity doser runs.</summary>
    public bool DoserOn { get; set; } = true;

    /// <summary>Whether the pure oxygen is on.</summary>
    public bool OxygenOn { get; set; } = true;
}
