namespace TankChem.Chemistry.Tests;

/// <summary>A farm's history is millions of states: solving one leaves nothing for the garbage collector.</summary>
public class AllocationTests
{
    [Theory]
    [MemberData(nameof(BufferTests.AllKinds), MemberType = typeof(BufferTests))]
    public void Solve_EachPair_AllocatesNothing(string kind)
    {
        Solution water = Waters.Of(kind);
        CarbonateInput[] pairs =
        [
            new() { AlkalinityUmolKg = 2000, PH = 7.5 },
            new() { AlkalinityUmolKg = 2000, DicUmolKg = 2050 },
            new() { AlkalinityUmolKg = 2000, Pco2Uatm = 1500 },
            new() { DicUmolKg = 2000, PH = 7.5 },
            new() { DicUmolKg = 2000, Pco2Uatm = 1500 },
            new() { Pco2Uatm = 1500, PH = 7.5 },
        ];
        double sum = 0;
        foreach (CarbonateInput pair in pairs)
            sum += CarbonateSystem.Solve(water, pair).Co2UmolKg;
        long before = GC.GetAllocatedBytesForCurrentThread();
        foreach (CarbonateInput pair in pairs)
            sum += CarbonateSystem.Solve(water, pair).Co2UmolKg;

        Assert.Equal(before, GC.GetAllocatedBytesForCurrentThread());
        Assert.True(sum > 0);
    }
}
