using CsCheck;

namespace TankChem.Dosing.Tests;

public class DoseScheduleTests
{
    [Fact]
    public void Of_RiseInsideADay_IsEqualPortions()
    {
        IReadOnlyList<Portion> portions = Of(1.0, 1.0, 0, 0.45);

        Assert.Equal([0, 7200, 14400], portions.Select(p => p.AfterS));
        Assert.All(portions, p => Assert.Equal(1.0 / 3, p.MmolL, 1e-12));
    }

    [Fact]
    public void Of_RiseJustAboveADay_LeavesNoCrumb() =>
        Assert.All(Of(1.001, 1.0, 0, 0.45), p => Assert.True(p.MmolL > 0.2));

    [Fact]
    public void Of_MoreDosedTodayThanADayTakes_BeginsTomorrow() =>
        Assert.Equal(86400, Of(0.3, 1.0, 1.5, 0.45)[0].AfterS);

    [Fact]
    public void Of_NegativeDosedToday_GivesNoMoreRoomThanADay() =>
        Assert.True(Of(2.0, 1.0, -5, 0.45).Where(p => p.AfterS < 86400).Sum(p => p.MmolL) <= 1.0);

    [Theory]
    [InlineData(8.0, 1.0, 0.45)]
    [InlineData(1.0, 1.0, 0.02)]
    [InlineData(1.0, 1.0, 0)]
    public void Of_TooManyDaysOrPortions_IsNone(double rise, double dayMax, double portionMax) =>
        Assert.Empty(Of(rise, dayMax, 0, portionMax));

    [Fact]
    public void Of_AnyRise_KeepsDaysApart() => Gen.Select(Gen.Double[0.01, 4], Gen.Double[0.2, 2], Gen.Double[0, 2], Gen.Double[0.05, 0.5]).Sample((rise, dayMax, today, portionMax) =>
    {
        IReadOnlyList<Portion> portions = Of(rise, dayMax, today, portionMax);
        if (portions.Count == 0)
            return;
        Assert.Equal(rise, portions.Sum(p => p.MmolL), 1e-6);
        Assert.True(portions.Count <= DoseSchedule.PortionsMax);
        Assert.All(portions.Zip(portions.Skip(1)), pair => Assert.True(pair.Second.AfterS - pair.First.AfterS >= DoseSchedule.BetweenPortionsS));
        Assert.All(portions.GroupBy(p => (int)(p.AfterS / 86400)), day => Assert.True(day.Sum(p => p.MmolL) + (day.Key == 0 ? today : 0) <= dayMax + 1e-9));
    });

    private static IReadOnlyList<Portion> Of(double rise, double dayMax, double today, double portionMax) =>
        DoseSchedule.Of(rise, dayMax, today, (_, wanted) => wanted, (_, wanted) => Math.Min(wanted, portionMax));
}
