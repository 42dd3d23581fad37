using TankChem.Monitoring.Configuration;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Mqtt.Tests.Payloads;

public sealed class MappingTests
{
    private static readonly SeriesKey Series = new(new PlaceKey("hollow-weir", "tank-1"), "temperature", "gateway");

    [Theory]
    [InlineData("gateway/+/up", "/data/0/t~1f", """{"data":[{"t/f":56.3}]}""", 56.3)]
    [InlineData("gateway/#", "/a~0b", """{"a~b":"12.5"}""", 12.5)]
    [InlineData("gateway/7/up", "", "12.5", 12.5)]
    [InlineData("+/+/+", "/on", """{"on":true}""", 1)]
    public void Read_PointerToANumber_IsItsReading(string filter, string at, string payload, double expected)
    {
        ParsedReading reading = Assert.Single(PayloadCase.ReadMapped([new TopicMapping { Topic = filter, Series = Series, Value = at }], "gateway/7/up", payload).Readings);
        Assert.Equal(new ParsedReading(Series, expected, null, null), reading);
    }

    [Fact]
    public void Read_FactorOffsetUnitAndTime_AllCount()
    {
        var mapping = new TopicMapping { Topic = "gateway/7/up", Series = Series, Value = "/raw", Time = "/at", Unit = "Cel", Factor = 0.1, Offset = -40 };
        ParsedReading reading = Assert.Single(PayloadCase.ReadMapped([mapping], "gateway/7/up", """{"raw":535,"at":1777629600}""").Readings);
        Assert.Equal(13.5, reading.RawValue, 9);
        Assert.Equal("Cel", reading.RawUnit);
        Assert.Equal(DateTimeOffset.FromUnixTimeSeconds(1777629600), reading.OwnTime);
    }

    [Fact]
    public void Read_TwoMappingsOneFails_TheOtherIsTaken()
    {
        TopicMapping[] mappings = [new TopicMapping { Topic = "gateway/#", Series = Series, Value = "/t" }, new TopicMapping { Topic = "gateway/#", Series = Series with { Quantity = "ph" }, Value = "/ph" }];
        Arrival arrival = PayloadCase.ReadMapped(mappings, "gateway/7/up", """{"t":13.5}""");
        Assert.Equal("temperature", Assert.Single(arrival.Readings).Series.Quantity);
        Assert.Contains("nothing at \"/ph\"", PayloadCase.Reason(arrival), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("""{"t":{"x":1}}""", "a number would be right")]
    [InlineData("""{"t":"warm"}""", "no number")]
    [InlineData("""{"t":1e999}""", "larger than any number")]
    [InlineData("""{"t":1,"t":2}""", "no valid JSON")]
    [InlineData("{", "no valid JSON")]
    [InlineData("", "empty")]
    public void Read_NoNumberThere_SaysWhy(string payload, string reason)
    {
        Arrival arrival = PayloadCase.ReadMapped([new TopicMapping { Topic = "gateway/7/up", Series = Series, Value = "/t" }], "gateway/7/up", payload);
        Assert.Empty(arrival.Readings);
        Assert.Contains(reason, PayloadCase.Reason(arrival), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("#", "tankchem/in/Hollow-Weir/tank-1/ph")]
    [InlineData("#", "$SYS/uptime")]
    [InlineData("gateway/+", "gateway/7/up")]
    [InlineData("gateway", "gateway/7")]
    public void Read_TopicThatAMappingDoesNotTake_IsUnreadable(string filter, string topic) =>
        Assert.NotNull(PayloadCase.ReadMapped([new TopicMapping { Topic = filter, Series = Series }], topic, "1").Unreadable);
}
