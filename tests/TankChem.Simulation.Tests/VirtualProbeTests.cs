using TankChem.Simulation.Probes;
using static TankChem.Simulation.Tests.TestWaters;

namespace TankChem.Simulation.Tests;

public sealed class VirtualProbeTests
{
    private static readonly DateTimeOffset Far = Start.AddYears(1);

    [Fact]
    public void Read_NoiseOnly_HasItsMeanAndSpread()
    {
        var probe = new VirtualProbe(0.1, 6, seed: 7);
        double[] readings = [.. Enumerable.Range(0, 20_000).Select(minute => probe.Read(5, Start.AddMinutes(minute)) ?? double.NaN)];
        double mean = readings.Average();
        double spread = Math.Sqrt(readings.Average(reading => (reading - mean) * (reading - mean)));
        Assert.Equal(5, mean, 0.005);
        Assert.Equal(0.1, spread, 0.003);
    }

    [Fact]
    public void Read_Drift_WalksAwayUntilItIsCalibrated()
    {
        var probe = new VirtualProbe(0, 4, 1, new ProbeDrift(Start, Start.AddDays(10), -0.03));
        Assert.Equal(8.2, probe.Read(8.2, Start));
        Assert.Equal(7.93, probe.Read(8.2, Start.AddDays(9)));
        Assert.Equal(8.2, probe.Read(8.2, Start.AddDays(10)));
    }

    [Fact]
    public void Read_OffsetAndFouling_AddUp()
    {
        var probe = new VirtualProbe(0, 4, 1, new ProbeOffset(Start, Far, 0.1), new ProbeFouling(Start, Far, 0.2, 3));
        Assert.Equal(7.1, probe.Read(7, Start));
        Assert.Equal(7.2264, probe.Read(7, Start.AddDays(3)));
    }

    [Fact]
    public void Read_Stuck_RepeatsItsLastWordThenFollowsAgain()
    {
        var probe = new VirtualProbe(0.01, 3, 3, new ProbeStuck(Start.AddHours(1), Start.AddHours(2)));
        double? last = probe.Read(7, Start);
        Assert.Equal(last, probe.Read(6, Start.AddHours(1)));
        Assert.Equal(last, probe.Read(5, Start.AddHours(1.5)));
        Assert.Equal(6, probe.Read(6, Start.AddHours(2)) ?? double.NaN, 0.06);
    }

    [Fact]
    public void Read_Silent_SaysNothingAndItsNoiseGoesOn()
    {
        var whole = new VirtualProbe(0.1, 6, 9);
        var broken = new VirtualProbe(0.1, 6, 9, new ProbeSilent(Start.AddMinutes(3), Start.AddMinutes(6)));
        for (int minute = 0; minute < 10; minute++)
        {
            double? expected = whole.Read(5, Start.AddMinutes(minute));
            double? said = broken.Read(5, Start.AddMinutes(minute));
            Assert.Equal(minute is >= 3 and < 6 ? null : expected, said);
        }
    }

    [Fact]
    public void SeedOf_DifferentParts_DifferentSeeds()
    {
        Assert.NotEqual(Noise.SeedOf(1, "north-1/ph"), Noise.SeedOf(1, "north-2/ph"));
        Assert.NotEqual(Noise.SeedOf(1, "north-1/ph"), Noise.SeedOf(2, "north-1/ph"));
        Assert.Equal(Noise.SeedOf(1, "north-1/ph"), Noise.SeedOf(1, "north-1/ph"));
    }
}
