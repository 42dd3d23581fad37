using TankChem.Monitoring.Advising;
using TankChem.Monitoring.Tests.Monitors;

namespace TankChem.Monitoring.Tests.Advising;

public sealed class AlarmAdviceTests
{
    [Theory]
    [InlineData("co2-high", AdviceSection.HighCo2)]
    [InlineData("co2-high-urgent", AdviceSection.HighCo2)]
    [InlineData("ph-low", AdviceSection.HighCo2)]
    [InlineData("alkalinity-low", AdviceSection.RaiseAlkalinity)]
    public void Of_CarbonAlarm_LeadsToItsAdvice(string rule, AdviceSection section)
    {
        var watch = new Watch(Farm.Tank("salmonid") with { VolumeM3 = 9 });
        watch.Every(0, 20, ("ph", 6.2), ("temperature", 12), ("alkalinity", 0.5), ("oxygen", 9));

        Assert.Equal(section, AlarmAdvice.Of(watch.Active(rule)));
    }

    [Fact]
    public void Of_Oxygen_LeadsToItsFirstAction()
    {
        var watch = new Watch(Farm.Tank("salmonid"));
        watch.Every(0, 20, ("ph", 7.2), ("temperature", 12), ("alkalinity", 2), ("oxygen", 3));

        Assert.Equal(AdviceSection.FirstAction, AlarmAdvice.Of(watch.Active("oxygen-low")));
    }

    [Fact]
    public void Of_SilentProbe_LeadsToMeasuring()
    {
        var watch = new Watch(Farm.Tank("salmonid"));
        watch.At(0, ("ph", 7.2), ("temperature", 12), ("alkalinity", 2));
        watch.Every(1, 120, ("temperature", 12));

        Assert.Contains(watch.Snapshot.Alarms.Where(a => a.IsActive), a => a.AboutKnowledge && AlarmAdvice.Of(a) == AdviceSection.Measure);
    }

    [Fact]
    public void Of_DangerToPeople_LeadsToPeopleFirst()
    {
        var watch = new Watch(Farm.Tank("salmonid"));
        watch.Every(0, 20, ("air-co2", 6000));

        Assert.Equal(AdviceSection.People, AlarmAdvice.Of(Assert.Single(watch.Snapshot.Alarms, a => a.DangerToPeople)));
    }
}
