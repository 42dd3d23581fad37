namespace TankChem.Simulation.Probes;

/// <summary>Something wrong with a probe from one time to another; a calibration or a cleaning ends it in a step.</summary>
/// <param name="From">Begins.</param>
/// <param name="Until">Ends; the probe is right again at this time.</param>
public abstract record ProbeFault(DateTimeOffset From, DateTimeOffset Until)
{
    /// <summary>Whether it acts at a time.</summary>
    public bool Acts(DateTimeOffset time) => time >= From && time < Until;

    /// <summary>What it adds to the reading at a time, unit of the probe.</summary>
    internal virtual double Bias(DateTimeOffset time) => 0;
}

/// <summary>The reading is off by a constant.</summary>
/// <param name="From">Begins.</param>
/// <param name="Until">Ends.</param>
/// <param name="Amount">How far, unit of the probe.</param>
public sealed record ProbeOffset(DateTimeOffset From, DateTimeOffset Until, double Amount) : ProbeFault(From, Until)
{
    internal override double Bias(DateTimeOffset time) => Amount;
}

/// <summary>The reading walks away at a steady pace.</summary>
/// <param name="From">Begins.</param>
/// <param name="Until">Ends.</param>
/// <param name="PerDay">Pace, unit of the probe a day.</param>
public sealed record ProbeDrift(DateTimeOffset From, DateTimeOffset Until, double PerDay) : ProbeFault(From, Until)
{
    internal override double Bias(DateTimeOffset time) => PerDay * (time - From).TotalDays;
}

/// <summary>A growth on the probe: the error grows quickly, then levels off.</summary>
/// <param name="From">Begins.</param>
/// <param name="Until">Ends.</param>
/// <param name="Final">Error that it levels off at, unit of the probe.</param>
/// <param name="DaysToTwoThirds">Days until 63 % of it.</param>
public sealed record ProbeFouling(DateTimeOffset From, DateTimeOffset Until, double Final, double DaysToTwoThirds) : ProbeFault(From, Until)
{
    internal override double Bias(DateTimeOffset time) => Final * (1 - Math.Exp(-(time - From).TotalDays / DaysToTwoThirds));
}

/// <summary>The reading stays where it was.</summary>
/// <param name="From">Begins.</param>
/// <param name="Until">Ends.</param>
public sealed record ProbeStuck(DateTimeOffset From, DateTimeOffset Until) : ProbeFault(From, Until);

/// <summary>No reading comes.</summary>
/// <param name="From">Begins.</param>
/// <param name="Until">Ends.</param>
public sealed record ProbeSilent(DateTimeOffset From, DateTimeOffset Until) : ProbeFault(From, Until);
