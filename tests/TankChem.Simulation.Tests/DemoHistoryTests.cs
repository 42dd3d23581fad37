using TankChem.Monitoring.Alarming;
using TankChem.Simulation.Demo;

namespace TankChem.Simulation.Tests;

public sealed class DemoHistoryTests(DemoFixture demo) : IClassFixture<DemoFixture>
{
    private static readonly TimeSpan Aftermath = TimeSpan.FromHours(4);

    [Fact]
    public void History_ThirtyDays_IsInOrderAndNoLongerThanAsked()
    {
        Assert.True(demo.Events.Count > 150_000, $"only {demo.Events.Count} events");
        for (int i = 1; i < demo.Events.Count; i++)
            Assert.True(demo.Events[i].At >= demo.Events[i - 1].At, $"{demo.Events[i]} comes after {demo.Events[i - 1]}");
        Assert.True(demo.Events[0].At > DemoFixture.End - DemoSite.HistoryLength);
        Assert.Equal(DemoFixture.End, demo.Events[^1].At);
    }

    [Fact]
    public void History_EveryReading_IsFiniteAndPhysicalAndThereOnce()
    {
        var seen = new HashSet<(string, string, string, DateTimeOffset)>();
        foreach (SimulatedReading reading in demo.Events.OfType<SimulatedReading>())
        {
            Assert.True(seen.Add((reading.Place, reading.Quantity, reading.Probe, reading.At)), $"twice: {reading}");
            (double low, double high) = reading.Quantity switch
            {
                "ph" => (6.0, 8.6),
                "temperature" => (10, 31),
                "oxygen" => (4, 13),
                "oxygen-saturation" => (75, 140),
                "salinity" => (19, 36),
                "light" => (0, 400),
                "injection-on" => (0, 1),
                "feed" => (0.1, 3),
                "air-co2" => (380, 600),
                "air-pressure" => (980, 1030),
                _ => throw new InvalidOperationException($"The test has no range for {reading.Quantity}."),
            };
            Assert.InRange(reading.Value, low, high);
        }
    }

    [Fact]
    public void History_EveryEvent_IsAtAKnownPlace()
    {
        HashSet<string> places = [.. demo.Places.Select(place => place.Id), DemoIds.Site];
        Assert.All(demo.Events, happened => Assert.Contains(happened.Place, places));
        foreach (string place in places)
            Assert.Contains(demo.Events, happened => happened.Place == place);
    }

    [Fact]
    public void Places_SixOrMoreThatDiffer_OneNotSetUp()
    {
        Assert.True(demo.Places.Count >= 6);
        Assert.Equal(DemoIds.Bench, Assert.Single(demo.Places, place => !place.Assigned).Id);
        Assert.Equal(2, demo.Places.Count(place => place.Loop == DemoIds.Loop));
        DemoPlace loop = demo.Places.Single(place => place.Id == DemoIds.Loop);
        Assert.True(loop.VolumeM3 > demo.Places.Where(place => place.Loop == loop.Id).Sum(place => place.VolumeM3));
        Assert.All(demo.Places.SelectMany(place => place.Stock), stock => Assert.NotNull(StockLimits.Find(stock)));
    }

    [Fact]
    public void Truth_OutsideItsStories_KeepsEveryLimitOfItsStock()
    {
        foreach (DemoPlace place in demo.Places.Where(place => place.Stock.Count > 0))
        {
            IReadOnlyList<EffectiveLimit> limits = StockLimits.Strictest(place.Stock);
            foreach ((_, DateTimeOffset at, DemoTruth truth) in demo.Truths.Where(truth => truth.Place == place.Id && truth.At > DemoFixture.End.AddDays(-29) && !InStory(place.Id, truth.At)))
            {
                foreach (EffectiveLimit limit in limits)
                {
                    if (Value(truth, limit.Limit.Quantity) is { } value && !(place.Id == DemoIds.Raceway && limit.Limit.Quantity == "alkalinity"))
                        Assert.False(limit.Limit.Side == LimitSide.High ? value >= limit.Limit.Value : value <= limit.Limit.Value, $"{place.Id} {at:O}: {limit.Limit.Rule} {value}");
                }
            }
        }
    }

    [Fact]
    public void StuckValve_PlantedTank_PassesTheDangerLimitInTheNightAndIsBackAfterwards()
    {
        Assert.InRange(demo.At(DemoIds.Scape, demo.Dates.ValveStuck).Co2MgL, 15, 28);
        Assert.True(demo.At(DemoIds.Scape, demo.Dates.ValveStuck.AddHours(6)).Co2MgL > 40);
        Assert.InRange(demo.At(DemoIds.Scape, demo.Dates.ValveClosed.AddDays(1)).Co2MgL, 0.5, 10);
        Assert.All(
            demo.Readings(DemoIds.Scape, "injection-on").Where(reading => reading.At > demo.Dates.ValveStuck && reading.At < demo.Dates.ValveClosed),
            reading => Assert.Equal(1, reading.Value));
        Assert.Contains(demo.Events.OfType<SimulatedLoss>(), loss => loss.Place == DemoIds.Scape && loss.Count < 10);
        Assert.Contains(demo.Events.OfType<SimulatedAcknowledgement>(), given => given.Place == DemoIds.Scape && given.At >= demo.Dates.ValveClosed);
    }

    [Fact]
    public void DegasserFailure_BothTanks_PassTheUrgentLimitWhileOxygenLooksGood()
    {
        foreach (string tank in (string[])[DemoIds.North1, DemoIds.North2])
        {
            Assert.InRange(demo.At(tank, demo.Dates.DegasserStops).Co2MgL, 5, 12);
            DemoTruth worst = demo.At(tank, demo.Dates.DegasserRuns);
            Assert.True(worst.Co2MgL > 22, $"{tank} {worst.Co2MgL} mg/L");
            Assert.True(worst.OxygenSaturationPercent > 85, $"{tank} {worst.OxygenSaturationPercent} %");
            Assert.InRange(demo.At(tank, demo.Dates.DegasserRuns.AddHours(5)).Co2MgL, 5, 12);
            Assert.Contains(demo.Events.OfType<SimulatedLoss>(), loss => loss.Place == tank && loss.FoundAt > demo.Dates.DegasserRuns);
        }

        Assert.Contains(demo.Events.OfType<SimulatedDeviceState>(), state => state is { Device: "degasser", IsOn: false } && state.At == demo.Dates.DegasserStops);
        Assert.True(demo.Events.OfType<SimulatedDeviceState>().Last().IsOn);
    }

    [Fact]
    public void AlkalinityUsedUp_Raceway_FallsBelowItsLimitAndTheTitrationsShowIt()
    {
        Assert.True(demo.At(DemoIds.Raceway, demo.Dates.RacewayExchangeHalved).AlkalinityMmolL > 2);
        Assert.InRange(demo.At(DemoIds.Raceway, DemoFixture.End).AlkalinityMmolL, 0.6, 0.93);
        SimulatedLogEntry[] titrations = [.. Titrations(DemoIds.Raceway, "alkalinity")];
        Assert.True(titrations[^1].Amount < 48, $"last titration {titrations[^1].Amount} mg/L");
        Assert.True(titrations[^1].HappenedAt > DemoFixture.End.AddDays(-3));
        Assert.True(titrations[0].Amount > 95, $"first titration {titrations[0].Amount} mg/L");
    }

    [Fact]
    public void DriftingProbe_Reef_ReadsBelowItsLimitAlthoughTheWaterIsWellUntilItIsCalibrated()
    {
        SimulatedReading[] readings = [.. demo.Readings(DemoIds.Reef, "ph")];
        Assert.Contains(readings, reading => reading.At > demo.Dates.Day(-4, 0, 0) && reading.At < demo.Dates.Day(-4, 8, 55) && reading.Value < 7.79);
        Assert.DoesNotContain(readings, reading => reading.At >= demo.Dates.ReefCalibrated && reading.Value < 8);
        Assert.All(demo.Truths.Where(truth => truth.Place == DemoIds.Reef), truth => Assert.InRange(truth.Truth.PhNbs, 8.0, 8.35));
        SimulatedLogEntry hand = Assert.Single(demo.Events.OfType<SimulatedLogEntry>(), entry => entry is { Place: DemoIds.Reef, Subject: "ph", Kind: SimulatedLogKind.Note });
        double probe = readings.Last(reading => reading.At <= hand.At).Value;
        Assert.InRange(hand.Amount.GetValueOrDefault() - probe, 0.3, 0.45);
    }

    [Fact]
    public void WrongUnit_PlantedTank_IsTypedAndCorrectedForTheSameSample()
    {
        SimulatedLogEntry[] entries = [.. Titrations(DemoIds.Scape, "alkalinity").Where(entry => entry.HappenedAt == demo.Dates.ScapeTitration)];
        Assert.Equal(2, entries.Length);
        Assert.Equal("mmol/L", entries[0].Unit);
        Assert.Equal("dKH", entries[1].Unit);
        Assert.Equal(entries[0].Amount, entries[1].Amount);
        Assert.Equal(entries[1].Amount.GetValueOrDefault() / 2.804, demo.At(DemoIds.Scape, entries[0].HappenedAt).AlkalinityMmolL, 0.05);
    }

    [Fact]
    public void SilentProbe_Shrimp_IsMissingAtTheEndOfTheHistoryWhileOxygenSpeaks()
    {
        SimulatedReading last = demo.Readings(DemoIds.Shrimp, "ph").Last();
        Assert.InRange((DemoFixture.End - last.At).TotalMinutes, 50, 65);
        Assert.Equal(DemoFixture.End, demo.Readings(DemoIds.Shrimp, "oxygen").Last().At);
    }

    [Fact]
    public void Titrations_AllButTheWrongOne_AreNearTheTruth()
    {
        int compared = 0;
        foreach (SimulatedLogEntry entry in demo.Events.OfType<SimulatedLogEntry>().Where(entry => entry.Kind == SimulatedLogKind.Titration && entry.HappenedAt > DemoFixture.End.AddDays(-29)))
        {
            if (entry.Unit == "mmol/L")
                continue;
            DemoTruth truth = demo.At(entry.Place, entry.HappenedAt);
            (double expected, double step) = (entry.Subject, entry.Unit) switch
            {
                ("alkalinity", "dKH") => (truth.AlkalinityMmolL * 2.804, 0.1),
                ("alkalinity", "mg/L CaCO3") => (truth.AlkalinityMmolL * 50.043, 1.0),
                ("tan", "mg/L") => (truth.TanMgL, 0.01),
                ("calcium", "mg/L") => (truth.CalciumMgL, 5),
                _ => throw new InvalidOperationException($"The test does not know {entry}."),
            };
            Assert.Equal(expected, entry.Amount.GetValueOrDefault(), 0.07 * expected + step);
            compared++;
        }

        Assert.True(compared > 80, $"only {compared} titrations");
    }

    [Fact]
    public void DoseEntries_Loop_TellWhatTheLedgerTook()
    {
        SimulatedLogEntry[] doses = [.. demo.Events.OfType<SimulatedLogEntry>().Where(entry => entry.Kind == SimulatedLogKind.Dose).Skip(2)];
        Assert.True(doses.Length > 20);
        Assert.All(doses, dose => Assert.InRange(dose.Amount.GetValueOrDefault(), 500, 6000));
    }

    private IEnumerable<SimulatedLogEntry> Titrations(string place, string quantity) =>
        demo.Events.OfType<SimulatedLogEntry>().Where(entry => entry.Kind == SimulatedLogKind.Titration && entry.Place == place && entry.Subject == quantity);

    private bool InStory(string place, DateTimeOffset at) => place switch
    {
        DemoIds.Scape => at > demo.Dates.ValveStuck && at < demo.Dates.ValveClosed + Aftermath,
        DemoIds.North1 or DemoIds.North2 => at > demo.Dates.DegasserStops && at < demo.Dates.DegasserRuns + Aftermath,
        _ => false,
    };

    private static double? Value(DemoTruth truth, string quantity) => quantity switch
    {
        "co2" => truth.Co2MgL,
        "ph" => truth.PhNbs,
        "alkalinity" => truth.AlkalinityMmolL,
        "nh3-n" => truth.Nh3MgL,
        "oxygen" => truth.OxygenMgL,
        "oxygen-saturation" => truth.OxygenSaturationPercent,
        "temperature" => truth.TemperatureC,
        _ => null,
    };
}
