using System.Diagnostics;

namespace TankChem.Benchmarks;

/// <summary>Times two ways of one job in turns, so that what else the machine does falls on both, and compares medians.</summary>
internal static class Comparison
{
    private const int Rounds = 15;

    /// <summary>Runs both <see cref="Rounds"/> times in turns, after two rounds of warming up, and prints medians per item and their ratio.</summary>
    public static void Print(string name, int items, Action ours, Action bare)
    {
        double[] oursUs = new double[Rounds], bareUs = new double[Rounds];
        for (int i = -2; i < Rounds; i++)
        {
            double a = Time(ours) / items, b = Time(bare) / items;
            if (i >= 0)
                (oursUs[i], bareUs[i]) = (a, b);
        }

        Array.Sort(oursUs);
        Array.Sort(bareUs);
        double median = oursUs[Rounds / 2], reference = bareUs[Rounds / 2];
        Console.WriteLine($"{name,-52} {median,10:F3} {reference,10:F3} {median / reference,8:F2}");
    }

    private static double Time(Action action)
    {
        long start = Stopwatch.GetTimestamp();
        action();
        return Stopwatch.GetElapsedTime(start).TotalMicroseconds;
    }
}
