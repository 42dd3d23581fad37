using TankChem.Monitoring.Readings;

namespace TankChem.Mqtt.Tests.Payloads;

public sealed class SenmlPackTests
{
    private const string Topic = "tankchem/in/hollow-weir/tank-1";

    [Fact]
    public void Read_RecordsOfSeveralSeries_AreTheirReadings()
    {
        Arrival arrival = PayloadCase.Read(Topic, """[{"n":"ph","v":7.24},{"n":"temperature/inlet","u":"Cel","v":13.5,"t":1777629600},{"n":"state/blower","vb":true},{"n":"state/feeder","vs":"off"},{"n":"injection-on","vb":false}]""", "application/senml+json");
        Assert.Null(arrival.Unreadable);
        Assert.Equal(
            [("ph", "main", 7.24, null), ("temperature", "inlet", 13.5, "Cel"), ("state", "blower", 1, null), ("state", "feeder", 0, null), ("injection-on", "main", 0, null)],
            arrival.Readings.Select(r => (r.Series.Quantity, r.Series.Probe, r.RawValue, r.RawUnit)));
        Assert.Equal(new DateTimeOffset(2026, 5, 1, 10, 0, 0, TimeSpan.Zero), arrival.Readings[1].OwnTime);
    }

    [Fact]
    public void Read_BaseFields_HoldUntilTheyAreReplaced()
    {
        Arrival arrival = PayloadCase.Read(Topic, """[{"bn":"temperature/","bt":1777629600,"bu":"Cel","bv":10,"bver":10,"n":"a","v":1},{"n":"b","v":2,"t":-60},{"bn":"ph","bv":0,"bu":"pH","v":7.2,"t":30,"ut":60},{"bn":"","n":"redox","u":"mV","v":210}]""");
        Assert.Null(arrival.Unreadable);
        Assert.Equal(
            [("temperature", "a", 11, "Cel", 0), ("temperature", "b", 12, "Cel", -60), ("ph", "main", 7.2, "pH", 30), ("redox", "main", 210, "mV", 0)],
            arrival.Readings.Select(r => (r.Series.Quantity, r.Series.Probe, r.RawValue, r.RawUnit, (int)(r.OwnTime!.Value - DateTimeOffset.FromUnixTimeSeconds(1777629600)).TotalSeconds)));
    }

    [Fact]
    public void Read_RecordOfBaseFieldsAlone_IsNoReading() =>
        Assert.Equal(7.2, Assert.Single(PayloadCase.Read(Topic, """[{"bn":"ph"},{"v":7.2}]""").Readings).RawValue);

    [Theory]
    [InlineData("-30", -30.0)]
    [InlineData("0.5", 0.5)]
    [InlineData("268435455", 268435455.0)]
    public void Read_RelativeTime_CountsFromReceipt(string t, double seconds) =>
        Assert.Equal(PayloadCase.ReceivedAt.AddSeconds(seconds), Assert.Single(PayloadCase.Read(Topic, $$"""[{"n":"ph","v":7.2,"t":{{t}}}]""").Readings).OwnTime);

    [Theory]
    [InlineData("""[{"n":"ph","v":7.2}]""")]
    [InlineData("""[{"n":"ph","v":7.2,"t":0}]""")]
    public void Read_NoTime_HasNone(string payload) => Assert.Null(Assert.Single(PayloadCase.Read(Topic, payload).Readings).OwnTime);

    [Theory]
    [InlineData(ReadingOrigin.Retained)]
    [InlineData(ReadingOrigin.Backlog)]
    public void Read_RelativeTimeThatWaited_SaysNothing(ReadingOrigin origin)
    {
        Assert.Null(Assert.Single(PayloadCase.Read(Topic, """[{"n":"ph","v":7.2,"t":-30}]""", null, origin).Readings).OwnTime);
        Assert.NotNull(Assert.Single(PayloadCase.Read(Topic, """[{"n":"ph","v":7.2,"t":1777629600}]""", null, origin).Readings).OwnTime);
    }

    [Theory]
    [InlineData("[]", "no record")]
    [InlineData("{\"n\":\"ph\",\"v\":7.2}", "no SenML pack")]
    [InlineData("7.24", "no SenML pack")]
    [InlineData("[7.24]", "record 1 is a number")]
    [InlineData("""[{"n":"ph","v":7.2,"bver":11}]""", "newer than this service understands")]
    [InlineData("""[{"n":"ph","v":7.2,"bver":9.5}]""", "a whole number")]
    [InlineData("""[{"n":"ph","v":7.2,"calib_":1}]""", "\"calib_\" must be understood")]
    [InlineData("""[{"n":"ph","v":7.2},{"n":"ph","v":7.2,"v":7.3}]""", "record 2: the field \"v\" stands twice")]
    [InlineData("""[{"n":"ph","v":7.2,"x":1,"x":2}]""", "stands twice")]
    [InlineData("""[{"n":"ph","v":"7.2"}]""", "v is a text")]
    [InlineData("""[{"n":7,"v":7.2}]""", "n is a number")]
    [InlineData("""[{"n":"ph","v":7.2}""", "no valid JSON")]
    [InlineData("""[{"n":"ph","v":7.2}] 1""", "no valid JSON")]
    public void Read_PackOfWrongForm_IsRejectedWhole(string payload, string reason)
    {
        Arrival arrival = PayloadCase.Read(Topic, payload);
        Assert.Empty(arrival.Readings);
        Assert.Contains(reason, PayloadCase.Reason(arrival), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("""{"n":"PH","v":1}""", "the character \"P\"")]
    [InlineData("""{"n":"ph/a/b","v":1}""", "the character \"/\"")]
    [InlineData("""{"n":"","v":1}""", "is empty")]
    [InlineData("""{"n":"state","vb":true}""", "names no device")]
    [InlineData("""{"n":"ph","vs":"7.2"}""", "takes a number, v")]
    [InlineData("""{"n":"ph","vb":true}""", "takes a number, v")]
    [InlineData("""{"n":"state/pump","v":1}""", "takes vb")]
    [InlineData("""{"n":"ph","vd":"aGk"}""", "takes a number, v")]
    [InlineData("""{"n":"ph","s":12}""", "only a sum")]
    [InlineData("""{"n":"ph","v":1,"vb":true}""", "more than one value")]
    [InlineData("""{"n":"ph"}""", "no value")]
    [InlineData("""{"n":"ph","v":1,"t":1777629600000}""", "not milliseconds")]
    [InlineData("""{"n":"ph","v":1,"t":-9e12}""", "before 1970")]
    [InlineData("""{"n":"ph","bv":1e308,"v":1e308}""", "larger than any number")]
    public void Read_OneRecordThatCannotBeTaken_LeavesTheOthers(string record, string reason)
    {
        Arrival arrival = PayloadCase.Read(Topic, $$"""[{"n":"temperature","v":13.5},{{record}},{"bv":0,"n":"oxygen","v":8.1}]""");
        Assert.Equal([13.5, 8.1], arrival.Readings.Select(r => r.RawValue));
        Assert.Contains("record 2: ", PayloadCase.Reason(arrival), StringComparison.Ordinal);
        Assert.Contains(reason, PayloadCase.Reason(arrival), StringComparison.Ordinal);
        Assert.Contains("2 of 3 records taken", PayloadCase.Reason(arrival), StringComparison.Ordinal);
    }
}
