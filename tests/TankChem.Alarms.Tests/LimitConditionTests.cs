using CsCheck;

namespace TankChem.Alarms.Tests;

public sealed class LimitConditionTests
{
    private static readonly LimitCondition High = new() { IsUpper = true, SetPoint = 15, Deadband = 1.5, WidestGuard = 2.25 };
    private static readonly LimitCondition Lethal = High with { SetPoint = 20, RaiseProbability = 0.1, WidestGuard = 3 };
    private static readonly LimitCondition Low = new() { IsUpper = false, SetPoint = 6.5, Deadband = 0.1 };

    [Theory]
    [InlineData(14.99, false, false)]
    [InlineData(15, false, true)]
    [InlineData(14.99, true, true)]
    [InlineData(13.6, true, true)]
    [InlineData(13.5, true, false)]
    public void Holds_UpperLimit_BeginsAtTheSetPointAndEndsPastTheDeadband(double value, bool before, bool expected) =>
        Assert.Equal(expected, High.Holds(value, null, before));

    [Theory]
    [InlineData(6.51, false, false)]
    [InlineData(6.5, false, true)]
    [InlineData(6.59, true, true)]
    [InlineData(6.601, true, false)]
    public void Holds_LowerLimit_BeginsAtTheSetPointAndEndsPastTheDeadband(double value, bool before, bool expected) =>
        Assert.Equal(expected, Low.Holds(value, null, before));

    [Fact]
    public void Holds_LethalLimit_BeginsWhereTheProbabilityOfBeingPastItIsATenth()
    {
        // P(x > 20) for x = 18, u = 1.6: z = 1.25, P = 0.106; for x = 17.9: z = 1.3125, P = 0.095 (standard normal tables).
        Assert.True(Lethal.Holds(18, 1.6, heldBefore: false));
        Assert.False(Lethal.Holds(17.9, 1.6, heldBefore: false));
        Assert.False(Lethal.Holds(18, null, heldBefore: false));
    }

    [Fact]
    public void Holds_VeryDoubtfulValue_IsDoubtAndNotBadWater()
    {
        Assert.False(Lethal.Holds(12, 9, heldBefore: false));
        Assert.True(Lethal.IsInDoubt(12, 9));
        Assert.False(Lethal.IsInDoubt(5, 9));
        Assert.False(Lethal.IsInDoubt(12, 1));
    }

    [Fact]
    public void RaiseProbability_OtherThanHalfOrTenth_IsRefused() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => new LimitCondition { IsUpper = true, SetPoint = 1, RaiseProbability = 0.3 });

    [Fact]
    public void Holds_ValueThatWandersLessThanTheDeadband_TogglesAtMostOnce() =>
        Gen.Double[13.6, 16].Array[2, 50].Sample(values =>
        {
            bool held = false;
            int changes = 0;
            foreach (double value in values)
            {
                bool now = High.Holds(value, null, held);
                changes += now == held ? 0 : 1;
                held = now;
            }

            Assert.True(changes <= 1);
        });
}
