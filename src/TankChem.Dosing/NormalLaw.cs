namespace TankChem.Dosing;

/// <summary>Probabilities of the normal law.</summary>
internal static class NormalLaw
{
    /// <summary>P(Z ≤ z), absolute error below 7.5e-8. Abramowitz &amp; Stegun 1964, 26.2.17.</summary>
    public static double Below(double z)
    {
        double t = 1 / (1 + 0.2316419 * Math.Abs(z));
        double tail = Math.Exp(-0.5 * z * z) / Math.Sqrt(2 * Math.PI)
            * t * (0.319381530 + t * (-0.356563782 + t * (1.781477937 + t * (-1.821255978 + t * 1.330274429))));
        return z >= 0 ? 1 - tail : tail;
    }
}
