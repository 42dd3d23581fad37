namespace TankChem.Chemistry;

/// <summary>What a root is sought of: a function that rises with its argument, and its slope.</summary>
internal interface IRisingFunction
{
    /// <summary>The value at <paramref name="x"/> and the slope there.</summary>
    double At(double x, out double slope);
}

/// <summary>Newton's method kept inside a bracket by bisection, with a cap on iterations.</summary>
internal static class RootFinder
{
    /// <summary>Iterations after which bisection alone would have reached the last bit of a pH.</summary>
    private const int IterationsMax = 100;

    /// <summary>Far below what a measurement could ever tell (0.001 pH), near the resolution of a double at pH 8.</summary>
    private const double Tolerance = 1e-13;

    /// <summary>Finds the root of a rising function between two ends.</summary>
    public static SolveStatus TryFind<T>(ref T function, double low, double high, double start, out double root)
        where T : struct, IRisingFunction
    {
        root = double.NaN;
        if (!(function.At(low, out _) <= 0) || !(function.At(high, out _) >= 0))
            return SolveStatus.Impossible;
        double x = Math.Clamp(start, low, high);
        for (int i = 0; i < IterationsMax; i++)
        {
            double value = function.At(x, out double slope);
            if (value == 0)
            {
                root = x;
                return SolveStatus.Solved;
            }

            if (value < 0)
                low = x;
            else
                high = x;
            double next = x - value / slope;
            if (!(next > low && next < high))
                next = 0.5 * (low + high);
            if (Math.Abs(next - x) <= Tolerance * Math.Max(1, Math.Abs(x)) || next == low || next == high)
            {
                root = next;
                return SolveStatus.Solved;
            }

            x = next;
        }

        return SolveStatus.NotConverged;
    }
}
