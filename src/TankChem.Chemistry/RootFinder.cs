namespace TankChem.Chemistry;

/// <summary>What a root is sought of: a function that rises with its argument, and its slope.</summary>
internal interface IRisingFunction
{
    /// <summary>Whether the slope is the derivative itself; one that leaves a small dependence out is bettered by the secant near the root.</summary>
    static abstract bool SlopeIsExact { get; }

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

    /// <summary>Step below which the function is straight enough for a secant to be the better slope.</summary>
    private const double SecantStepMax = 0.1;

    /// <summary>Finds the root of a rising function between two ends. The ends are looked at only when a step would leave them: a root found inside proves them.</summary>
    public static SolveStatus TryFind<T>(ref T function, double low, double high, double start, out double root)
        where T : struct, IRisingFunction
    {
        root = double.NaN;
        bool lowHolds = false, highHolds = false;
        double x = start > low && start < high ? start : 0.5 * (low + high);
        double xBefore = double.NaN, valueBefore = double.NaN;
        for (int i = 0; i < IterationsMax; i++)
        {
            double value = function.At(x, out double slope);
            if (value == 0)
            {
                root = x;
                return SolveStatus.Solved;
            }

            if (value < 0)
                (low, lowHolds) = (x, true);
            else
                (high, highHolds) = (x, true);
            if (!T.SlopeIsExact && Math.Abs(x - xBefore) < SecantStepMax)
                slope = Secant(slope, (value - valueBefore) / (x - xBefore));
            double next = x - value / slope;
            if (Math.Abs(next - x) <= Tolerance * Math.Max(1, Math.Abs(x)))
            {
                root = next;
                return SolveStatus.Solved;
            }

            if (!(next > low && next < high))
            {
                if ((!lowHolds && !(function.At(low, out _) <= 0)) || (!highHolds && !(function.At(high, out _) >= 0)))
                    return SolveStatus.Impossible;
                (lowHolds, highHolds) = (true, true);
                next = 0.5 * (low + high);
            }

            if (next == low || next == high)
            {
                root = next;
                return SolveStatus.Solved;
            }

            (xBefore, valueBefore) = (x, value);
            x = next;
        }

        return SolveStatus.NotConverged;
    }

    /// <summary>The secant where it is near the slope; where rounding spoils it, the slope.</summary>
    private static double Secant(double slope, double secant) => secant > 0.5 * slope && secant < 2 * slope ? secant : slope;
}
