using System.Diagnostics;

namespace TankChem.Dosing.Tests;

/// <summary>Timed alone, after the tests that run side by side.</summary>
[CollectionDefinition("timed", DisableParallelization = true)]
public class TimedCollection;

[Collection("timed")]
public class DosePlannerSpeedTests
{
    private const int Runs = 21;

    [Fact]
    public void Plan_AllowedOrRefused_TakesAtMost50Milliseconds()
    {
        DoseProblem twoTanks = Waters.In(42, Waters.Tank(7.1, 0.6), Waters.Tank(7.2, 0.6, name: "Raceway 2")), worked = Waters.In(10, Waters.Worked());

        // The median, because other programs run on the machine of a test.
        Assert.InRange(Median(() => twoTanks.PlanTo(2)), 0, 50);
        Assert.InRange(Median(() => worked.PlanTo(2, "sodium-carbonate")), 0, 50);
    }

    private static double Median(Func<DosePlan> make)
    {
        make();
        double[] taken = new double[Runs];
        for (int i = 0; i < Runs; i++)
        {
            long from = Stopwatch.GetTimestamp();
            make();
            taken[i] = Stopwatch.GetElapsedTime(from).TotalMilliseconds;
        }

        return taken.Order().ElementAt(Runs / 2);
    }
}
