using TankChem.Simulation.Demo;

namespace TankChem.Simulation.Tests;

/// <summary>The demo's whole history, made once for the tests that only look at it, with the truth beside it.</summary>
public sealed class DemoFixture
{
    public DemoFixture()
    {
        DemoScenario scenario = DemoSite.Create(End, Seed);
        Dates = scenario.Dates;
        Places = scenario.Places;
        var events = new List<SimulatedEvent>();
        var truths = new List<(string Place, DateTimeOffset At, DemoTruth Truth)>();
        DateTimeOffset last = default;
        foreach (SimulatedEvent happened in scenario.History(DemoSite.HistoryLength))
        {
            events.Add(happened);
            if (scenario.Time == last)
                continue;
            last = scenario.Time;
            foreach (DemoPlace place in Places)
                truths.Add((place.Id, last, scenario.Truth(place.Id)));
        }

        Events = events;
        Truths = truths;
    }

    public static DateTimeOffset End { get; } = new(2026, 3, 31, 13, 7, 0, TimeSpan.Zero);

    public static int Seed => 42;

    public DemoDates Dates { get; }

    public IReadOnlyList<DemoPlace> Places { get; }

    public IReadOnlyList<SimulatedEvent> Events { get; }

    public IReadOnlyList<(string Place, DateTimeOffset At, DemoTruth Truth)> Truths { get; }

    public IEnumerable<SimulatedReading> Readings(string place, string quantity) =>
        Events.OfType<SimulatedReading>().Where(reading => reading.Place == place && reading.Quantity == quantity);

    public DemoTruth At(string place, DateTimeOffset at) => Truths.Last(truth => truth.Place == place && truth.At <= at).Truth;
}
