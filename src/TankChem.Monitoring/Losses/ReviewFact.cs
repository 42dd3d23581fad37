namespace TankChem.Monitoring.Losses;

/// <summary>Something that happened, in a loss review.</summary>
/// <param name="At">When.</param>
/// <param name="Text">In a sentence.</param>
/// <param name="Kind">Who or what did it.</param>
public sealed record ReviewFact(DateTimeOffset At, string Text, ReviewFactKind Kind);

/// <summary>Who or what did it.</summary>
public enum ReviewFactKind
{
    /// <summary>An alarm spoke.</summary>
    Alarm,

    /// <summary>A person did or wrote something.</summary>
    Person,

    /// <summary>A device went on or off.</summary>
    Device,

    /// <summary>A probe was not heard.</summary>
    Gap,

    /// <summary>The loss was found.</summary>
    Loss,
}
