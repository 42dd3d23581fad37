namespace TankChem.Simulation.Tanks;

/// <summary>Hours of the day in which something runs.</summary>
/// <param name="Start">Begins at.</param>
/// <param name="End">Ends at; before <paramref name="Start"/> when it runs over midnight.</param>
public readonly record struct Hours(TimeOnly Start, TimeOnly End)
{
    /// <summary>Whether it runs at a time of day.</summary>
    public bool Contains(TimeOnly time) => time.IsBetween(Start, End);
}
