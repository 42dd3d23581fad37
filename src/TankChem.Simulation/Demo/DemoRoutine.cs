using TankChem.Chemistry;
using TankChem.Simulation.Probes;
using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Demo;

/// <summary>What people do on the demo site every day: feed, test, top the doser up, clean.</summary>
internal sealed class DemoRoutine
{
    private const double KitError = 0.015;
    private const double DkhPerMmolL = 2.804;
    private const double CaCO3MgPerMmol = MolarMass.CalciumCarbonate / 2;

    private static readonly TimeSpan WriteDown = TimeSpan.FromMinutes(7);
    private static readonly TimeSpan FirstWriteDown = TimeSpan.FromMinutes(2);

    private readonly DemoAgenda _agenda;
    private readonly DemoDates _dates;
    private readonly DemoWaters _waters;
    private readonly Func<string, DemoTruth> _truthOf;
    private readonly Noise _noise;
    private double _dosedMol;

    public DemoRoutine(int seed, DemoAgenda agenda, DemoDates dates, DemoWaters waters, Func<string, DemoTruth> truthOf)
    {
        _agenda = agenda;
        _dates = dates;
        _waters = waters;
        _truthOf = truthOf;
        _noise = new Noise(Noise.SeedOf(seed, "test kits"));
    }

    /// <summary>Plans the days from a midnight on, each at its own midnight.</summary>
    public void PlanFrom(DateTimeOffset midnight) => _agenda.Do(midnight, () =>
    {
        PlanDay(_dates.DayOf(midnight));
        PlanFrom(midnight.AddDays(1));
    });

    /// <summary>Plans one test of everything, so that a history does not begin in the dark.</summary>
    public void PlanFirstTests(DateTimeOffset at)
    {
        TestAt(DemoIds.Scape, "alkalinity", "dKH", at, DemoPeople.Display, FirstWriteDown);
        TestAt(DemoIds.Reef, "alkalinity", "dKH", at, DemoPeople.Display, FirstWriteDown);
        TestAt(DemoIds.Reef, "calcium", "mg/L", at, DemoPeople.Display, FirstWriteDown);
        foreach (string place in (string[])[DemoIds.Loop, DemoIds.Raceway, DemoIds.Shrimp])
        {
            TestAt(place, "alkalinity", "mg/L CaCO3", at, DemoPeople.Early, FirstWriteDown);
            TestAt(place, "tan", "mg/L", at, DemoPeople.Early, FirstWriteDown);
        }
    }

    private void PlanDay(int day)
    {
        bool odd = (day & 1) != 0;
        _agenda.Tell(new SimulatedDeviceState(DemoIds.Loop, "degasser", _waters[DemoIds.Loop].Controls.DegasserOn, _dates.Day(day, 0, 0)));
        Feeders(day);
        Test(DemoIds.Loop, "alkalinity", "mg/L CaCO3", day, 8, 10, DemoPeople.Early);
        Test(DemoIds.Loop, "tan", "mg/L", day, 8, 10, DemoPeople.Early);
        _agenda.Plan(_dates.Day(day, 17, 0), DoserRefilled);
        Feed(DemoIds.Raceway, day, 2.1);
        Feed(DemoIds.Shrimp, day, 1.3);
        if (odd)
        {
            Test(DemoIds.Raceway, "alkalinity", "mg/L CaCO3", day, 10, 40, DemoPeople.Late);
            Test(DemoIds.Raceway, "tan", "mg/L", day, 10, 40, DemoPeople.Late);
            Test(DemoIds.Reef, "alkalinity", "dKH", day, 16, 20, DemoPeople.Display);
            Test(DemoIds.Shrimp, "tan", "mg/L", day, 11, 30, DemoPeople.Late);
            Test(DemoIds.Shrimp, "alkalinity", "mg/L CaCO3", day, 11, 30, DemoPeople.Late);
        }

        if (Weekly(day, -4))
            Test(DemoIds.Reef, "calcium", "mg/L", day, 16, 30, DemoPeople.Display);
        if (Weekly(day, -2))
            Test(DemoIds.Scape, "alkalinity", "dKH", day, 10, 15, DemoPeople.Display);
        if (Weekly(day, -7))
            Cleaned(day);
    }

    // The titration of nine days ago is told by its own story.
    private static bool Weekly(int day, int of) => (day - of) % 7 == 0 && !(of == -2 && day == -9);

    private void Feeders(int day)
    {
        foreach (int hour in (int[])[7, 10, 13, 16, 19])
        {
            _agenda.Tell(new SimulatedReading(DemoIds.North1, "feed", "main", _dates.Day(day, hour, 0), 0.9, "kg"));
            _agenda.Tell(new SimulatedReading(DemoIds.North2, "feed", "main", _dates.Day(day, hour, 0), 1.1, "kg"));
        }
    }

    private void Feed(string place, int day, double kg)
    {
        foreach (int hour in (int[])[8, 15])
        {
            DateTimeOffset at = _dates.Day(day, hour, 20);
            _agenda.Tell(new SimulatedLogEntry(place, SimulatedLogKind.Feed, at, at, hour < 12 ? "Morning feed" : "Afternoon feed", hour < 12 ? DemoPeople.Early : DemoPeople.Late, kg, "kg", "feed"));
        }
    }

    private void Cleaned(int day)
    {
        DateTimeOffset at = _dates.Day(day, 13, 15);
        _agenda.Tell(new SimulatedLogEntry(DemoIds.North1, SimulatedLogKind.Cleaning, at, at, "Probes wiped, pH within 0.02 of buffer 7.", DemoPeople.Early, Subject: "ph"));
        _agenda.Tell(new SimulatedLogEntry(DemoIds.North2, SimulatedLogKind.Cleaning, at.AddMinutes(10), at.AddMinutes(10), "Probes wiped, pH within 0.03 of buffer 7.", DemoPeople.Early, Subject: "ph"));
        _agenda.Tell(new SimulatedLogEntry(DemoIds.Scape, SimulatedLogKind.Cleaning, at.AddHours(2), at.AddHours(2), "Glass and drop counter cleaned, stems cut.", DemoPeople.Display));
    }

    private void Test(string place, string quantity, string unit, int day, int hour, int minute, string who) =>
        TestAt(place, quantity, unit, _dates.Day(day, hour, minute), who, WriteDown);

    private void TestAt(string place, string quantity, string unit, DateTimeOffset drawn, string who, TimeSpan writeDown) =>
        _agenda.Plan(drawn, () =>
        {
            DemoTruth truth = _truthOf(place);
            double error = 1 + KitError * _noise.Next();
            (double typed, string what) = quantity switch
            {
                "alkalinity" => (Typed(truth.AlkalinityMmolL * error, unit), "Alkalinity"),
                "tan" => (Math.Round(truth.TanMgL * error, 2), "Total ammonia"),
                "calcium" => (Math.Round(truth.CalciumMgL * error / 5) * 5, "Calcium"),
                _ => throw new InvalidOperationException($"The demo has no test kit for {quantity}."),
            };
            _agenda.Tell(new SimulatedLogEntry(place, SimulatedLogKind.Titration, drawn, drawn + writeDown, what, who, typed, unit, quantity));
            return [];
        });

    private static double Typed(double mmolL, string unit) => unit switch
    {
        "dKH" => Math.Round(mmolL * DkhPerMmolL, 1),
        "mg/L CaCO3" => Math.Round(mmolL * CaCO3MgPerMmol),
        _ => throw new InvalidOperationException($"Nobody in the demo titrates in {unit}."),
    };

    private IEnumerable<SimulatedEvent> DoserRefilled()
    {
        double dosed = _waters[DemoIds.Loop].Water.Ledger[WaterProcess.Dosing].Alkalinity;
        double grams = Math.Round((dosed - _dosedMol) * MolarMass.SodiumBicarbonate / 10) * 10;
        _dosedMol = dosed;
        return [new SimulatedLogEntry(DemoIds.Loop, SimulatedLogKind.Dose, _waters.Time, _waters.Time, "Bicarbonate doser refilled: what went in since yesterday.", DemoPeople.Late, grams, "g", "sodium-bicarbonate")];
    }
}
