using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Ports;
using TankChem.Simulation.Demo;

namespace TankChem.Simulation.Tests;

/// <summary>The demo as the real monitors see it: each story raises its alarms, and nothing else raises any.</summary>
public sealed class DemoAlarmTests
{
    [Fact]
    public void History_WatchedByTheMonitors_AlarmsTellTheStoriesAndNothingElse()
    {
        DemoScenario scenario = DemoSite.Create(DemoFixture.End, DemoFixture.Seed);
        var watched = new WatchedDemo(scenario.Places);
        watched.Take(scenario.History(DemoSite.HistoryLength));
        DemoDates dates = scenario.Dates;
        var unexpected = new List<string>();
        var told = new HashSet<string>(StringComparer.Ordinal);
        foreach (AlarmJournalEntry entry in watched.Journal.Where(entry => entry.Change == AlarmChange.Raised))
        {
            string? story = (entry.Key.Place.Place, entry.Key.Rule) switch
            {
                (DemoIds.Scape, "co2-high" or "co2-high-urgent" or "co2-high-danger") when Within(entry, dates.ScapeTitration, dates.ScapeCorrected) => "wrong unit",
                (DemoIds.Scape, "co2-high" or "co2-high-urgent" or "co2-high-danger") when Within(entry, dates.ValveStuck, dates.ValveClosed) => "stuck valve",
                (DemoIds.Reef, "ph-low") when Within(entry, dates.ReefDriftBegins, dates.ReefCalibrated) => "drifting probe",
                (DemoIds.Loop, "state-degasser-off") when Within(entry, dates.DegasserStops, dates.DegasserRuns) => "degasser",
                (DemoIds.North1, "co2-high" or "co2-high-urgent") when Within(entry, dates.DegasserStops, dates.DegasserRuns) => "degasser, North 1",
                (DemoIds.North2, "co2-high" or "co2-high-urgent") when Within(entry, dates.DegasserStops, dates.DegasserRuns) => "degasser, North 2",
                (DemoIds.Raceway, "alkalinity-low") when Within(entry, dates.RacewayExchangeCut, dates.HistoryEnd) => "alkalinity used up",
                (DemoIds.Shrimp, "ph-silent") when Within(entry, dates.ShrimpSilent, dates.HistoryEnd) => "silent probe",
                _ => null,
            };
            if (story is null)
                unexpected.Add($"{entry.At:O} {entry.Key.Place} {entry.Key.Rule}: {entry.Sentence}");
            else
                told.Add(story);
        }

        Assert.Empty(unexpected);
        Assert.Equal(8, told.Count);
        Assert.Equal(PlaceUrgency.Warning, watched[DemoIds.Raceway].Snapshot.Urgency);
        Assert.Equal(PlaceUrgency.Doubt, watched[DemoIds.Shrimp].Snapshot.Urgency);
        foreach (string calm in (string[])[DemoIds.Scape, DemoIds.Reef, DemoIds.Loop, DemoIds.North1, DemoIds.North2])
        {
            Assert.Equal(PlaceUrgency.Calm, watched[calm].Snapshot.Urgency);
            Assert.DoesNotContain(watched[calm].Snapshot.Alarms, alarm => alarm.NeedsAcknowledgement);
        }
    }

    private static bool Within(AlarmJournalEntry entry, DateTimeOffset from, DateTimeOffset until) => entry.At >= from && entry.At <= until.AddMinutes(10);
}
