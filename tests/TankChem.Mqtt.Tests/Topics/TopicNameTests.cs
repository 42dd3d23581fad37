using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;
using TankChem.Mqtt.Topics;

namespace TankChem.Mqtt.Tests.Topics;

public sealed class TopicNameTests
{
    private static readonly string Longest = new('x', 64);

    [Fact]
    public void TryParse_LongestIds_AreTaken()
    {
        Assert.True(TopicName.TryParse($"tankchem/in/{Longest}/{Longest}/{Longest}/{Longest}", out TopicName? name, out _));
        Assert.Equal(new SeriesKey(new PlaceKey(Longest, Longest), Longest, Longest), name.Series);
    }

    [Theory]
    [InlineData("tankchem/in/s/p", TopicKind.Pack)]
    [InlineData("tankchem/in/s/site/air-co2", TopicKind.Reading)]
    [InlineData("tankchem/in/s/p/ph/main", TopicKind.Reading)]
    [InlineData("tankchem/in/s/p/state/mains", TopicKind.DeviceState)]
    [InlineData("tankchem/cmd/s/p/alarm/ph-silent", TopicKind.AlarmCommand)]
    public void TryParse_RightTopic_IsOfItsKind(string topic, TopicKind kind)
    {
        Assert.True(TopicName.TryParse(topic, out TopicName? name, out _));
        Assert.Equal(kind, name.Kind);
        Assert.Equal("s", name.Place.Site);
    }

    [Theory]
    [InlineData("", "empty")]
    [InlineData("tankchem/in/s", "3 levels")]
    [InlineData("tankchem/in/s/p/ph/main/x", "7 levels")]
    [InlineData("tankchem/in/", "3 levels")]
    [InlineData("tankchem/in//p/ph", "level 3, <site>, is empty")]
    [InlineData("tankchem/in/s/p/", "level 5, <quantity>, is empty")]
    [InlineData("tankchem/in/s/p/ph/", "level 6, <probe>, is empty")]
    [InlineData("tankchem/in/s/p/state", "names no device")]
    [InlineData("tankchem/in/s/p/state/Pump", "level 6, <device>")]
    [InlineData("tankchem/in/s/tank 1/ph", "has the character \" \"")]
    [InlineData("tankchem/in/s/tänk/ph", "has the character \"ä\"")]
    [InlineData("tankchem/in/s/+/ph", "wildcard +")]
    [InlineData("tankchem/in/#", "wildcard #")]
    [InlineData("tankchem/in/s/p/p\0h", "control character U+0000")]
    [InlineData("tankchem/in/s/\ufffd/ph", "not UTF-8")]
    [InlineData("tankchem/cmd/s/p/alarm", "not a command")]
    [InlineData("tankchem/cmd/s/p/dose/x", "not a command")]
    [InlineData("tankchem/cmd/s/p/alarm/CO2", "level 6, <rule>")]
    [InlineData("/tankchem/in/s/p/ph", "no mapping")]
    [InlineData("tankchem", "not one of this service's")]
    public void TryParse_WrongTopic_SaysWhatAndWhere(string topic, string reason)
    {
        Assert.False(TopicName.TryParse(topic, out _, out string? fault));
        Assert.Contains(reason, fault, StringComparison.Ordinal);
    }

    [Fact]
    public void TryParse_ThreeHundredCharacters_SaysHowLongItMayBe()
    {
        string topic = "tankchem/in/s/p/" + new string('x', 284);
        Assert.False(TopicName.TryParse(topic, out _, out string? fault));
        Assert.Contains("300 characters long", fault, StringComparison.Ordinal);
    }
}
