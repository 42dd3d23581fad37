using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;
using TankChem.Service.Pipeline;

namespace TankChem.Service.Tests.Pipeline;

public class SeriesClockTests
{
    private static readonly DateTimeOffset Noon = new(2026, 5, 1, 12, 0, 0, TimeSpan.Zero);
    private readonly SeriesClock clock = new();

    [Fact]
    public void Stamp_ThreeInOneMillisecond_GetSuccessiveOnes() =>
        Assert.Equal([Noon, Noon.AddMilliseconds(1), Noon.AddMilliseconds(2)], [Stamp(Noon), Stamp(Noon), Stamp(Noon)]);

    [Fact]
    public void Stamp_OtherSeriesInTheSameMillisecond_KeepsTheTimeOfReceipt()
    {
        Stamp(Noon);

        Assert.Equal(Noon, Stamp(Noon, quantity: "temperature"));
    }

    [Fact]
    public void Stamp_ReadingWithItsOwnTime_KeepsIt()
    {
        Stamp(Noon);

        Assert.Equal(Noon.AddHours(-3), Stamp(Noon, own: Noon.AddHours(-3)));
    }

    [Fact]
    public void Stamp_ClockSetBackByAnHour_FollowsTheClock()
    {
        Stamp(Noon);

        Assert.Equal(Noon.AddHours(-1), Stamp(Noon.AddHours(-1)));
    }

    private DateTimeOffset Stamp(DateTimeOffset receivedAt, DateTimeOffset? own = null, string quantity = "ph") =>
        clock.Stamp(new ParsedReading(new SeriesKey(new PlaceKey("north-quay", "tank-1"), quantity, "main"), 7.2, null, own), receivedAt);
}
