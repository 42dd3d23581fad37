namespace TankChem.Alarms;

/// <summary>How one alarm behaves; fixed while the alarm lives.</summary>
public sealed record AlarmSettings
{
    /// <summary>Longest shelf of an ordinary alarm: one working shift (common practice, no source).</summary>
    public static readonly TimeSpan OrdinaryLongestShelf = TimeSpan.FromHours(12);

    /// <summary>Longest shelf of an alarm that is critical or about people (common practice, no source).</summary>
    public static readonly TimeSpan CriticalLongestShelf = TimeSpan.FromHours(1);

    /// <summary>How long the condition must hold before the alarm is raised, ≥ 0.</summary>
    public TimeSpan OnDelay { get; init; }

    /// <summary>How long the condition must be gone before the alarm returns to normal, ≥ 0.</summary>
    public TimeSpan OffDelay { get; init; }

    /// <summary>Whether it is held after its condition is gone, until a person resets it.</summary>
    public bool Latching { get; init; }

    /// <summary>The longest time a person may shelve it at once, &gt; 0.</summary>
    public TimeSpan LongestShelf { get; init; } = OrdinaryLongestShelf;
}
