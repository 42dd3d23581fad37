using System.Globalization;
using TankChem.Monitoring.Readings;

namespace TankChem.Mqtt.Tests.Payloads;

public sealed class JsonReadingTests
{
    private const string Topic = "tankchem/in/hollow-weir/tank-1/alkalinity";

    [Fact]
    public void Read_ValueUnitAndTime_AllCount()
    {
        ParsedReading reading = Assert.Single(PayloadCase.Read(Topic, """{"value": 7.2, "unit": "dKH", "time": "2026-05-01T12:00:00.250+02:00"}""").Readings);
        Assert.Equal(7.2, reading.RawValue);
        Assert.Equal("dKH", reading.RawUnit);
        Assert.Equal(new DateTimeOffset(2026, 5, 1, 10, 0, 0, 250, TimeSpan.Zero), reading.OwnTime);
    }

    [Theory]
    [InlineData("""{"value":7.2}""")]
    [InlineData("""{"value":7.2,"unit":null,"time":null}""")]
    [InlineData("""{"battery":{"v":3.1,"low":[false,{"a":1}]},"value":7.2,"note":"x"}""")]
    [InlineData("""{"v\u0061lue":7.2}""")]
    [InlineData(" {\"value\":7.2}\n")]
    public void Read_NothingButAValue_IsABareNumber(string payload) =>
        Assert.Equal((7.2, null, null), Parts(Assert.Single(PayloadCase.Read(Topic, payload).Readings)));

    [Theory]
    [InlineData("\"2026-05-01T10:00:00Z\"", "2026-05-01T10:00:00.000Z")]
    [InlineData("\"2026-05-01t10:00:00z\"", "2026-05-01T10:00:00.000Z")]
    [InlineData("\"2026-05-01 10:00:00.1239Z\"", "2026-05-01T10:00:00.123Z")]
    [InlineData("\"2026-04-30T23:30:00-10:30\"", "2026-05-01T10:00:00.000Z")]
    [InlineData("\"2016-12-31T23:59:60Z\"", "2017-01-01T00:00:00.000Z")]
    [InlineData("\"2024-02-29T00:00:00Z\"", "2024-02-29T00:00:00.000Z")]
    [InlineData("\"1970-01-01T00:00:00Z\"", "1970-01-01T00:00:00.000Z")]
    [InlineData("1777629600", "2026-05-01T10:00:00.000Z")]
    [InlineData("1777629600.25", "2026-05-01T10:00:00.250Z")]
    [InlineData("0", "1970-01-01T00:00:00.000Z")]
    public void Read_Time_IsRead(string time, string expected)
    {
        ParsedReading reading = Assert.Single(PayloadCase.Read(Topic, $"{{\"value\":7.2,\"time\":{time}}}").Readings);
        Assert.Equal(expected, reading.OwnTime!.Value.ToString("yyyy-MM-dd'T'HH:mm:ss.fff'Z'", CultureInfo.InvariantCulture));
    }

    [Theory]
    [InlineData("\"2026-05-01T10:00:00\"", "with its zone")]
    [InlineData("\"2026-05-01\"", "with its zone")]
    [InlineData("\"2026-13-01T10:00:00Z\"", "RFC 3339")]
    [InlineData("\"2026-02-29T10:00:00Z\"", "RFC 3339")]
    [InlineData("\"2026-05-01T24:00:00Z\"", "RFC 3339")]
    [InlineData("\"2026-05-01T10:00:00.Z\"", "RFC 3339")]
    [InlineData("\"2026-05-01T10:00:00+2:00\"", "RFC 3339")]
    [InlineData("\"0001-01-01T00:00:00+10:00\"", "RFC 3339")]
    [InlineData("\"yesterday\"", "\"yesterday\"")]
    [InlineData("1777629600000", "not milliseconds")]
    [InlineData("-1", "before 1970")]
    [InlineData("1e999", "past the year 9999")]
    [InlineData("true", "true or false")]
    public void Read_NoTime_SaysWhatWouldBeRight(string time, string reason) =>
        Assert.Contains(reason, PayloadCase.Reason(PayloadCase.Read(Topic, $"{{\"value\":7.2,\"time\":{time}}}")), StringComparison.Ordinal);

    [Theory]
    [InlineData("{}", "no member \"value\"")]
    [InlineData("""{"Value":7.2}""", "no member \"value\"")]
    [InlineData("""{"value":"7.2"}""", "without quotes")]
    [InlineData("""{"value":null}""", "null")]
    [InlineData("""{"value":[7.2]}""", "an array")]
    [InlineData("""{"value":1e400}""", "larger than any number")]
    [InlineData("""{"value":NaN}""", "no valid JSON")]
    [InlineData("""{"value":7.2,"value":7.3}""", "\"value\" stands twice")]
    [InlineData("""{"value":7.2,"v\u0061lue":7.3}""", "\"value\" stands twice")]
    [InlineData("""{"value":7.2,"unit":"pH","unit":"pH"}""", "\"unit\" stands twice")]
    [InlineData("""{"value":7.2,"time":1,"time":2}""", "\"time\" stands twice")]
    [InlineData("""{"value":7.2,"x":1,"x":2}""", "\"x\" stands twice")]
    [InlineData("""{"value":7.2,"x":{"y":1,"y":2}}""", "\"y\" stands twice")]
    [InlineData("""{"value":7.2,"unit":7}""", "the unit is a number")]
    [InlineData("""{"value":7.2,"unit":""}""", "0 characters long")]
    [InlineData("""{"value":7.2""", "no valid JSON at line 1")]
    [InlineData("""{"value":7.2,}""", "no valid JSON")]
    [InlineData("""{"value":7.2} {"value":7.3}""", "no valid JSON")]
    [InlineData("""{"value":7.2,/*x*/"unit":"pH"}""", "no valid JSON")]
    [InlineData("""{"value":07.2}""", "no valid JSON")]
    [InlineData("""{"value":7.2,"unit":"\ud800"}""", "escape")]
    [InlineData("""{"value":7.2,"x":[[[[[[[[[[[[[[[[[[1]]]]]]]]]]]]]]]]]]}""", "no valid JSON")]
    public void Read_NoReading_SaysWhy(string payload, string reason)
    {
        Arrival arrival = PayloadCase.Read(Topic, payload);
        Assert.Empty(arrival.Readings);
        Assert.Contains(reason, PayloadCase.Reason(arrival), StringComparison.Ordinal);
    }

    private static (double, string?, DateTimeOffset?) Parts(ParsedReading reading) => (reading.RawValue, reading.RawUnit, reading.OwnTime);
}
