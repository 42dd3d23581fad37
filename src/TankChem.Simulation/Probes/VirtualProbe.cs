namespace TankChem.Simulation.Probes;

/// <summary>A probe: what it says of a true value, with its noise and its faults.</summary>
public sealed class VirtualProbe
{
    private readonly Noise _noise;
    private double? _last;

    /// <summary>A probe.</summary>
    /// <param name="noise">Standard deviation of its noise, unit of the probe, ≥ 0.</param>
    /// <param name="digits">Digits after the point that it sends, 0…15.</param>
    /// <param name="seed">Seed of its noise.</param>
    /// <param name="faults">Its faults.</param>
    public VirtualProbe(double noise, int digits, int seed, params IReadOnlyList<ProbeFault> faults)
    {
        ArgumentNullException.ThrowIfNull(faults);
        if (!(noise >= 0))
            throw new ArgumentOutOfRangeException(nameof(noise), noise, "The standard deviation of a probe's noise is 0 or more.");
        StandardDeviation = noise;
        Digits = digits;
        Faults = faults;
        _noise = new Noise(seed);
    }

    /// <summary>Standard deviation of its noise, unit of the probe.</summary>
    public double StandardDeviation { get; }

    /// <summary>Digits after the point.</summary>
    public int Digits { get; }

    /// <summary>Its faults.</summary>
    public IReadOnlyList<ProbeFault> Faults { get; }

    /// <summary>What it says; null when it is silent.</summary>
    /// <param name="truth">The true value.</param>
    /// <param name="time">When.</param>
    public double? Read(double truth, DateTimeOffset time)
    {
        // The noise is drawn even when nobody hears it, so that a fault changes nothing after it.
        double reading = truth + StandardDeviation * _noise.Next();
        bool stuck = false;
        foreach (ProbeFault fault in Faults)
        {
            if (!fault.Acts(time))
                continue;
            if (fault is ProbeSilent)
                return null;
            stuck |= fault is ProbeStuck;
            reading += fault.Bias(time);
        }

        double said = stuck && _last is { } last ? last : Math.Round(reading, Digits);
        _last = said;
        return said;
    }
}
