using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Mqtt.Tests.Payloads;

public sealed class NumberTests
{
    private const string Ph = "tankchem/in/hollow-weir/tank-1/ph";

    public static TheoryData<string> Quantities =>
    [
        "ph", "alkalinity", "temperature", "salinity", "conductivity", "oxygen", "oxygen-saturation", "tan", "nitrite", "calcium", "pco2", "air-co2", "air-pressure",
        "gas-pressure", "injection", "injection-on", "light", "flow", "level", "feed", "turbidity", "redox", "chloride",
    ];

    [Theory]
    [MemberData(nameof(Quantities))]
    public void Read_BareNumberOfAnyQuantity_IsItsReading(string quantity)
    {
        Arrival arrival = PayloadCase.Read($"tankchem/in/hollow-weir/tank-1/{quantity}", "7.24");
        Assert.Null(arrival.Unreadable);
        Assert.Equal(new ParsedReading(new SeriesKey(new PlaceKey("hollow-weir", "tank-1"), quantity, "main"), 7.24, null, null), Assert.Single(arrival.Readings));
    }

    [Fact]
    public void Read_NamedProbe_IsItsSeries()
    {
        ParsedReading reading = Assert.Single(PayloadCase.Read(Ph + "/outlet_2", "7.24").Readings);
        Assert.Equal("outlet_2", reading.Series.Probe);
    }

    [Theory]
    [InlineData("0", 0)]
    [InlineData("-1.5", -1.5)]
    [InlineData("+7.24", 7.24)]
    [InlineData(".5", 0.5)]
    [InlineData("7.", 7)]
    [InlineData("1.5e3", 1500)]
    [InlineData("2E-2", 0.02)]
    [InlineData(" 7.24\r\n", 7.24)]
    [InlineData("1e308", 1e308)]
    [InlineData("7.2399999999999999999999", 7.24)]
    public void Read_PlainNumber_IsRead(string payload, double expected) =>
        Assert.Equal(expected, Assert.Single(PayloadCase.Read(Ph, payload).Readings).RawValue);

    [Theory]
    [InlineData("", "empty")]
    [InlineData("   ", "no number")]
    [InlineData("7,24", "a point, as in 7.24")]
    [InlineData("NaN", "no measured value")]
    [InlineData("nan", "no measured value")]
    [InlineData("Infinity", "no measured value")]
    [InlineData("-inf", "no measured value")]
    [InlineData("1e309", "larger than any number")]
    [InlineData("7.2 pH", "no number")]
    [InlineData("0x1F", "no number")]
    [InlineData("1_000", "no number")]
    [InlineData("7.2.1", "no number")]
    [InlineData("--7", "no number")]
    [InlineData("1e", "no number")]
    [InlineData("e5", "no number")]
    [InlineData(".", "no number")]
    [InlineData("٧", "no number")]
    [InlineData("\"7.24\"", "no number")]
    [InlineData("true", "no number")]
    [InlineData("[7.24]", "SenML pack")]
    [InlineData("\ufeff7.24", "byte order mark")]
    public void Read_NoNumber_SaysWhy(string payload, string reason)
    {
        Arrival arrival = PayloadCase.Read(Ph, payload);
        Assert.Empty(arrival.Readings);
        Assert.Contains(reason, PayloadCase.Reason(arrival), StringComparison.Ordinal);
    }

    [Fact]
    public void Read_InvalidUtf8_SaysWhere() =>
        Assert.Equal("payload: byte 3 is not UTF-8.", PayloadCase.Reason(PayloadCase.Read(Ph, [(byte)'7', (byte)'.', 0xc3, 0x28])));

    [Fact]
    public void Read_TenMegabytes_KeepsTheHeadAndTheLength()
    {
        byte[] payload = new byte[10_000_000];
        payload.AsSpan().Fill((byte)'9');
        UnreadablePayload kept = PayloadCase.Read(Ph, payload).Unreadable!;
        Assert.Equal(10_000_000, kept.Length);
        Assert.Equal(4096, kept.Head.Length);
        Assert.Equal("probe-1", kept.Client);
        Assert.Equal(PayloadCase.ReceivedAt, kept.ReceivedAt);
    }

    [Theory]
    [InlineData("on", 1)]
    [InlineData("off\n", 0)]
    public void Read_DeviceState_IsOneOrNought(string payload, double expected)
    {
        ParsedReading reading = Assert.Single(PayloadCase.Read("tankchem/in/hollow-weir/tank-1/state/blower", payload).Readings);
        Assert.Equal(new ParsedReading(new SeriesKey(new PlaceKey("hollow-weir", "tank-1"), SeriesKey.DeviceState, "blower"), expected, null, null), reading);
    }

    [Theory]
    [InlineData("ON")]
    [InlineData("1")]
    [InlineData("true")]
    [InlineData("{\"value\":\"on\"}")]
    public void Read_NoDeviceState_SaysWhatWouldBeRight(string payload) =>
        Assert.Contains("on or off would be right", PayloadCase.Reason(PayloadCase.Read("tankchem/in/hollow-weir/tank-1/state/blower", payload)), StringComparison.Ordinal);

    [Theory]
    [InlineData("text/plain", "7.24", null)]
    [InlineData("TEXT/PLAIN; charset=utf-8", "7.24", null)]
    [InlineData("application/json", "7.24", null)]
    [InlineData("application/json", "{\"value\":7.24}", null)]
    [InlineData("text/plain", "{\"value\":7.24}", "application/json would be right")]
    [InlineData("application/senml+json", "[{\"n\":\"ph\",\"v\":7.24}]", "belongs to the topic tankchem/in/<site>/<place>")]
    [InlineData("application/senml+cbor", "7.24", "is not taken")]
    public void Read_ContentType_IsHonoured(string contentType, string payload, string? reason)
    {
        Arrival arrival = PayloadCase.Read(Ph, payload, contentType);
        if (reason is null)
            Assert.Equal(7.24, Assert.Single(arrival.Readings).RawValue);
        else
            Assert.Contains(reason, PayloadCase.Reason(arrival), StringComparison.Ordinal);
    }
}
