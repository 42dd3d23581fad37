using TankChem.Chemistry;
using TankChem.Simulation.Tanks;
using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Demo;

/// <summary>The demo site between its past and now: first <see cref="History"/>, then <see cref="Advance"/>, again and again.</summary>
/// <remarks>Not safe for several threads. The same end of history and the same seed give the same events.</remarks>
public sealed class DemoScenario
{
    /// <summary>Time between a probe's readings in the history.</summary>
    public static readonly TimeSpan HistoryStep = TimeSpan.FromMinutes(5);

    /// <summary>Time between a probe's readings in the live part.</summary>
    public static readonly TimeSpan LiveStep = TimeSpan.FromMinutes(1);

    // Two days in which the waters settle before the history begins.
    private static readonly TimeSpan Settling = TimeSpan.FromDays(2);

    private readonly DemoAgenda _agenda = new();
    private readonly DemoWaters _waters;
    private readonly DemoSensors _sensors;
    private readonly DemoRoutine _routine;
    private DateTimeOffset _told;
    private bool _historyBegun;

    internal DemoScenario(DateTimeOffset historyEnd, int seed)
    {
        HistoryEnd = FullMinute(historyEnd);
        Dates = new DemoDates(HistoryEnd);
        Places = DemoPlaces.Of(Dates);
        DateTimeOffset start = Dates.Day(-(int)DemoSite.HistoryLength.TotalDays - 1, 0, 0) - Settling;
        _waters = new DemoWaters(start);
        _sensors = new DemoSensors(seed, Dates);
        DemoStories.Plan(_agenda, Dates, _waters);
        _routine = new DemoRoutine(seed, _agenda, Dates, _waters, Truth);
        _routine.PlanFrom(start);
        _told = start;
    }

    /// <summary>When the history ends; UTC, full minute.</summary>
    public DateTimeOffset HistoryEnd { get; }

    /// <summary>When its stories happen.</summary>
    public DemoDates Dates { get; }

    /// <summary>The places.</summary>
    public IReadOnlyList<DemoPlace> Places { get; }

    /// <summary>How far the site has got.</summary>
    public DateTimeOffset Time => _waters.Time;

    /// <summary>The site's past, in order of time, made while it is read; once.</summary>
    /// <param name="length">How far back, at most <see cref="DemoSite.HistoryLength"/>.</param>
    public IEnumerable<SimulatedEvent> History(TimeSpan length)
    {
        if (length < TimeSpan.Zero || length > DemoSite.HistoryLength)
            throw new ArgumentOutOfRangeException(nameof(length), length, $"The history is from nothing to {DemoSite.HistoryLength.TotalDays} days long.");
        if (_historyBegun)
            throw new InvalidOperationException("The history was made already; make a new scenario to make it again.");
        _historyBegun = true;
        if (length > TimeSpan.Zero)
            _routine.PlanFirstTests(HistoryEnd - length);
        return MakeHistory(HistoryEnd - length);
    }

    /// <summary>What happens from where the site has got to now: the readings of every full minute, and what people do.</summary>
    /// <remarks>A history not asked for, or not read to its end, is lived through first, unheard.</remarks>
    /// <param name="now">Until when.</param>
    public IReadOnlyList<SimulatedEvent> Advance(DateTimeOffset now)
    {
        if (Time < HistoryEnd)
        {
            _historyBegun = true;
            foreach (SimulatedEvent past in MakeHistory(HistoryEnd))
                _ = past;
        }

        var events = new List<SimulatedEvent>();
        DateTimeOffset until = FullMinute(now);
        while (_told < until)
            events.AddRange(Live(_told + LiveStep, tellReadings: true));
        return events;
    }

    /// <summary>What a place's water truly is where the site has got to; of the loop, its treatment's.</summary>
    /// <param name="place">Id of the place.</param>
    public DemoTruth Truth(string place)
    {
        VirtualTank tank = _waters[place];
        CarbonateState state = tank.Solve();
        WaterAmounts amounts = tank.Water.Amounts;
        double tan = amounts.Tan * MolarMass.Nitrogen;
        return new DemoTruth(
            state.Co2MgL,
            state.PhNbs,
            amounts.Alkalinity,
            tan,
            tan * state.Nh3Fraction,
            amounts.Oxygen * Molar.Oxygen,
            amounts.Oxygen / tank.Water.SaturatedOxygenMmolL * 100,
            tank.Water.TemperatureC,
            amounts.Calcium * MolarMass.Calcium,
            tank.Light,
            tank.InjectionOn);
    }

    private IEnumerable<SimulatedEvent> MakeHistory(DateTimeOffset begin)
    {
        while (_told < HistoryEnd)
        {
            DateTimeOffset next = _told + HistoryStep;
            foreach (SimulatedEvent happened in Live(next < HistoryEnd ? next : HistoryEnd, tellReadings: next > begin))
            {
                if (happened.At > begin)
                    yield return happened;
            }
        }
    }

    private IEnumerable<SimulatedEvent> Live(DateTimeOffset until, bool tellReadings)
    {
        while (_agenda.Next is { } at && at <= until)
        {
            _waters.Advance(at);
            foreach (SimulatedEvent happened in _agenda.Happen())
                yield return happened;
        }

        _waters.Advance(until);
        _told = until;
        if (!tellReadings)
            yield break;
        foreach (SimulatedReading reading in _sensors.Read(until, Truth))
            yield return reading;
    }

    private static DateTimeOffset FullMinute(DateTimeOffset time) => new(time.UtcTicks - time.UtcTicks % TimeSpan.TicksPerMinute, TimeSpan.Zero);
}
