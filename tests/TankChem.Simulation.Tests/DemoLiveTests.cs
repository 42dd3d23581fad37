using TankChem.Simulation.Demo;

namespace TankChem.Simulation.Tests;

public sealed class DemoLiveTests
{
    private static readonly TimeSpan Short = TimeSpan.FromHours(6);

    [Fact]
    public void History_SameSeed_SameEvents()
    {
        Assert.Equal([.. DemoSite.Create(DemoFixture.End, 5).History(Short)], (List<SimulatedEvent>)[.. DemoSite.Create(DemoFixture.End, 5).History(Short)]);
    }

    [Fact]
    public void History_OtherSeed_OtherNoise()
    {
        List<SimulatedEvent> first = [.. DemoSite.Create(DemoFixture.End, 5).History(Short)];
        List<SimulatedEvent> second = [.. DemoSite.Create(DemoFixture.End, 6).History(Short)];
        Assert.NotEqual(first, second);
        Assert.Equal(first.Select(happened => (happened.Place, happened.At)), second.Select(happened => (happened.Place, happened.At)));
    }

    [Fact]
    public void History_Twice_IsRefused()
    {
        DemoScenario scenario = DemoSite.Create(DemoFixture.End, 5);
        scenario.History(TimeSpan.Zero);
        Assert.Throws<InvalidOperationException>(() => scenario.History(TimeSpan.Zero));
        Assert.Throws<ArgumentOutOfRangeException>(() => scenario.History(TimeSpan.FromDays(31)));
    }

    [Fact]
    public void Advance_AfterTheHistory_GoesOnWithoutASeam()
    {
        DemoScenario scenario = DemoSite.Create(DemoFixture.End.AddSeconds(31), 5);
        Assert.Equal(DemoFixture.End, scenario.HistoryEnd);
        var last = new Dictionary<(string, string), SimulatedReading>();
        foreach (SimulatedReading reading in scenario.History(Short).OfType<SimulatedReading>())
            last[(reading.Place, reading.Quantity)] = reading;
        Assert.Empty(scenario.Advance(DemoFixture.End.AddSeconds(59)));
        SimulatedReading[] next = [.. scenario.Advance(DemoFixture.End.AddMinutes(1)).OfType<SimulatedReading>()];
        Assert.True(next.Length > 15, $"only {next.Length} readings");
        foreach (SimulatedReading reading in next)
        {
            Assert.Equal(DemoFixture.End.AddMinutes(1), reading.At);
            double step = Math.Abs(reading.Value - last[(reading.Place, reading.Quantity)].Value);
            double most = reading.Quantity switch { "ph" => 0.06, "oxygen" => 0.4, "temperature" => 0.2, "salinity" => 0.3, "oxygen-saturation" => 4, _ => 10 };
            Assert.True(step <= most, $"{reading} jumps by {step}");
        }
    }

    [Fact]
    public void Advance_InOneStepOrMany_TellsTheSame()
    {
        DateTimeOffset until = DemoFixture.End.AddHours(4);
        List<SimulatedEvent> whole = [.. DemoSite.Create(DemoFixture.End, 5).Advance(until)];
        DemoScenario scenario = DemoSite.Create(DemoFixture.End, 5);
        var parts = new List<SimulatedEvent>();
        for (DateTimeOffset now = DemoFixture.End; now <= until; now = now.AddSeconds(73))
        {
            parts.AddRange(scenario.Advance(now));
            scenario.Truth(DemoIds.North1);
        }

        parts.AddRange(scenario.Advance(until));
        Assert.Equal(whole, parts);
        for (int i = 1; i < whole.Count; i++)
            Assert.True(whole[i].At >= whole[i - 1].At, $"{whole[i]} comes after {whole[i - 1]}");
    }

    [Fact]
    public void Advance_FirstHours_DegasserTripsShortlyAndTheSilentProbeSpeaksAgain()
    {
        DemoScenario scenario = DemoSite.Create(DemoFixture.End, 5);
        var events = new List<SimulatedEvent>();
        double worst = 0;
        for (int minute = 1; minute <= 4 * 60; minute++)
        {
            events.AddRange(scenario.Advance(DemoFixture.End.AddMinutes(minute)));
            worst = Math.Max(worst, scenario.Truth(DemoIds.North2).Co2MgL);
        }

        Assert.Equal([false, true], events.OfType<SimulatedDeviceState>().Where(state => state.Device == "degasser").Select(state => state.IsOn));
        Assert.InRange(worst, 11, 15);
        Assert.Equal(scenario.Dates.ShrimpSpeaks, events.OfType<SimulatedReading>().First(reading => reading is { Place: DemoIds.Shrimp, Quantity: "ph" }).At);
    }

    [Fact]
    public void Advance_AWeek_StaysPhysicalAndInOrder()
    {
        DemoScenario scenario = DemoSite.Create(DemoFixture.End, 5);
        DateTimeOffset last = DemoFixture.End;
        for (int day = 1; day <= 7; day++)
        {
            foreach (SimulatedEvent happened in scenario.Advance(DemoFixture.End.AddDays(day)))
            {
                Assert.True(happened.At >= last);
                last = happened.At;
                if (happened is SimulatedReading { Quantity: "ph" } ph)
                    Assert.InRange(ph.Value, 6.5, 8.5);
            }
        }

        Assert.InRange(scenario.Truth(DemoIds.Raceway).AlkalinityMmolL, 0.45, 1);
    }

    // The stories keep their distance from the end of the history whatever the time of day; near midnight the days' counting is easily off by one.
    [Theory]
    [InlineData(0, 0)]
    [InlineData(0, 30)]
    [InlineData(6, 10)]
    [InlineData(23, 59)]
    public void Create_AnyTimeOfDay_HistoryHoldsAllStories(int hour, int minute)
    {
        var end = new DateTimeOffset(2026, 5, 14, hour, minute, 0, TimeSpan.Zero);
        List<SimulatedEvent> events = [.. DemoSite.Create(end, 3).History(TimeSpan.FromDays(14))];
        Assert.Equal(3, events.OfType<SimulatedLoss>().Count());
        SimulatedLogEntry raceway = events.OfType<SimulatedLogEntry>().Last(entry => entry is { Place: DemoIds.Raceway, Subject: "alkalinity" });
        Assert.True(raceway.Amount < 50, $"{raceway}");
        Assert.InRange((end - events.OfType<SimulatedReading>().Last(reading => reading is { Place: DemoIds.Shrimp, Quantity: "ph" }).At).TotalMinutes, 50, 65);
        Assert.Equal(2, events.OfType<SimulatedDeviceState>().Count(state => state.At.TimeOfDay != TimeSpan.Zero));
    }
}
