namespace TankChem.Dosing;

/// <summary>The log-normal law of amounts that cannot be negative and spread by factors: a value and its standard uncertainty, and the spread of its logarithm.</summary>
internal static class LogNormal
{
    /// <summary>The estimate whose logarithm spreads by <paramref name="sigma"/>: u/value = √(exp(σ²) − 1).</summary>
    public static Estimate Estimate(double value, double sigma) => new(value, value * Math.Sqrt(Math.Exp(sigma * sigma) - 1));

    /// <summary>The spread of the logarithm of an estimate: σ = √ln(1 + (u/value)²).</summary>
    public static double Sigma(Estimate estimate)
    {
        double relative = estimate.StandardUncertainty / estimate.Value;
        return Math.Sqrt(Math.Log(1 + relative * relative));
    }
}
