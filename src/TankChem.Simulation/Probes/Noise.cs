namespace TankChem.Simulation.Probes;

/// <summary>Normally distributed numbers from a seed (Box and Muller 1958).</summary>
public sealed class Noise(int seed)
{
    private readonly Random _random = new(seed);
    private double? _spare;

    /// <summary>The next number, mean 0, standard deviation 1.</summary>
    public double Next()
    {
        if (_spare is { } spare)
        {
            _spare = null;
            return spare;
        }

        double radius = Math.Sqrt(-2 * Math.Log(1 - _random.NextDouble()));
        double angle = 2 * Math.PI * _random.NextDouble();
        _spare = radius * Math.Sin(angle);
        return radius * Math.Cos(angle);
    }

    /// <summary>A seed of its own for a part, the same on every machine (FNV-1a of the name, mixed with the seed).</summary>
    /// <param name="seed">Seed of the whole.</param>
    /// <param name="part">Name of the part.</param>
    public static int SeedOf(int seed, string part)
    {
        ArgumentNullException.ThrowIfNull(part);
        uint hash = 2166136261u ^ (uint)seed;
        foreach (char letter in part)
            hash = (hash ^ letter) * 16777619u;
        return (int)(hash & int.MaxValue);
    }
}
