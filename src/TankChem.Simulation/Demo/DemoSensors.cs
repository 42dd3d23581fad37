using TankChem.Simulation.Probes;
using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Demo;

/// <summary>The probes of the demo and what they say.</summary>
internal sealed class DemoSensors
{
    private const string Main = "main";
    private const double HpaPerAtm = 1013.25;
    private const int LoopEveryMinutes = 15;

    private readonly List<Sensor> _sensors = [];
    private readonly int _seed;

    public DemoSensors(int seed, DemoDates dates)
    {
        _seed = seed;
        Tank(DemoIds.Scape, oxygen: false, light: true);
        Add(DemoIds.Scape, "injection-on", "1", 0, 0, truth => truth.InjectionOn ? 1 : 0);
        Tank(DemoIds.Reef, oxygen: false, light: true, new ProbeDrift(dates.ReefDriftBegins, dates.ReefCalibrated, DemoStories.ReefDriftPerDay));
        Salinity(DemoIds.Reef, DemoWaters.ReefSalinity);
        Add(DemoIds.Loop, "temperature", "Cel", 0.03, 2, truth => truth.TemperatureC, LoopEveryMinutes);
        Tank(DemoIds.North1, oxygen: true, light: false);
        Tank(DemoIds.North2, oxygen: true, light: false);
        Tank(DemoIds.Raceway, oxygen: true, light: false, new ProbeFouling(dates.RacewayFoulingBegins, dates.RacewayCleaned, 0.06, 4));
        Tank(DemoIds.Shrimp, oxygen: true, light: false, new ProbeSilent(dates.ShrimpSilent, dates.ShrimpSpeaks));
        Add(DemoIds.Shrimp, "oxygen-saturation", "%", 0.6, 1, truth => truth.OxygenSaturationPercent);
        Salinity(DemoIds.Shrimp, DemoWaters.ShrimpSalinity);
        Tank(DemoIds.Bench, oxygen: false, light: false);
    }

    /// <summary>What all probes say at a time.</summary>
    public IEnumerable<SimulatedReading> Read(DateTimeOffset time, Func<string, DemoTruth> truthOf)
    {
        string place = "";
        DemoTruth truth = default;
        foreach (Sensor sensor in _sensors)
        {
            if (time.ToUnixTimeSeconds() / 60 % sensor.EveryMinutes != 0)
                continue;
            if (sensor.Place != place)
            {
                place = sensor.Place;
                truth = truthOf(place);
            }

            if (sensor.Probe.Read(sensor.Value(truth), time) is { } value)
                yield return new SimulatedReading(place, sensor.Quantity, Main, time, value, sensor.Unit);
        }

        Air air = DemoAir.At(time);
        yield return new SimulatedReading(DemoIds.Site, "air-co2", Main, time, Math.Round(air.Co2Ppm), "ppm");
        if (time.Minute % 15 == 0)
            yield return new SimulatedReading(DemoIds.Site, "air-pressure", Main, time, Math.Round(air.PressureAtm * HpaPerAtm, 1), "hPa");
    }

    private void Tank(string place, bool oxygen, bool light, params IReadOnlyList<ProbeFault> phFaults)
    {
        Add(place, "ph", "pH", 0.008, 2, truth => truth.PhNbs, 1, phFaults);
        Add(place, "temperature", "Cel", 0.03, 2, truth => truth.TemperatureC);
        if (oxygen)
            Add(place, "oxygen", "mg/L", 0.05, 2, truth => truth.OxygenMgL);
        if (light)
            Add(place, "light", "umol/m2/s", 0, 0, truth => truth.Light);
    }

    private void Salinity(string place, double salinity) => Add(place, "salinity", "1", 0.05, 2, _ => salinity, 30);

    private void Add(string place, string quantity, string unit, double noise, int digits, Func<DemoTruth, double> value, int everyMinutes = 1, params IReadOnlyList<ProbeFault> faults) =>
        _sensors.Add(new Sensor(place, quantity, unit, new VirtualProbe(noise, digits, Noise.SeedOf(_seed, $"{place}/{quantity}"), faults), value, everyMinutes));

    private sealed record Sensor(string Place, string Quantity, string Unit, VirtualProbe Probe, Func<DemoTruth, double> Value, int EveryMinutes);
}
