using TankChem.Simulation.Tanks;

namespace TankChem.Simulation.Demo;

/// <summary>What went wrong on the demo site: stories for a person to find on the screen.</summary>
internal static class DemoStories
{
    /// <summary>How fast the reef's pH probe drifts, pH a day.</summary>
    public const double ReefDriftPerDay = -0.031;

    private const double StuckValveFlow = 1.75;
    private const double RacewayExchangeHalf = 0.5;
    private const double RacewayExchangeLeft = 0.22;
    private const double WrongTitration = 4.2;

    private static readonly TimeSpan TripLasts = TimeSpan.FromMinutes(33);
    private static readonly TimeSpan BetweenTrips = TimeSpan.FromHours(8);

    public static void Plan(DemoAgenda agenda, DemoDates dates, DemoWaters waters)
    {
        StuckValve(agenda, dates, waters[DemoIds.Scape].Controls);
        DegasserFailure(agenda, dates, waters[DemoIds.Loop].Controls);
        LiveTrip(agenda, dates.FirstTrip, waters[DemoIds.Loop].Controls);
        AlkalinityUsedUp(agenda, dates, waters[DemoIds.Raceway].Controls);
        DriftingProbe(agenda, dates, waters);
        WrongUnit(agenda, dates);
        SilentProbe(agenda, dates);
    }

    private static void StuckValve(DemoAgenda agenda, DemoDates dates, TankControls scape)
    {
        agenda.Do(dates.ValveStuck, () =>
        {
            scape.ValveStuck = true;
            scape.InjectionShare = StuckValveFlow;
        });
        agenda.Do(dates.ValveClosed, () =>
        {
            scape.ValveStuck = null;
            scape.InjectionShare = 1;
        });
        DateTimeOffset closed = dates.ValveClosed;
        agenda.Tell(new SimulatedAcknowledgement(DemoIds.Scape, "co2-high", closed.AddMinutes(1), DemoPeople.Display, "Gas shut at the bottle, air stone in, valve taken out for a look."));
        agenda.Tell(new SimulatedLogEntry(DemoIds.Scape, SimulatedLogKind.Note, closed, closed.AddMinutes(6), "Came in to fish at the surface. Gas was still bubbling: the valve had not closed at 17:30. Shut the bottle by hand.", DemoPeople.Display));
        agenda.Tell(new SimulatedLoss(DemoIds.Scape, closed.AddMinutes(10), closed.AddMinutes(16), 4, "shrimps", "On their backs at the front glass. Fish recovered within the hour.", DemoPeople.Display));
        agenda.Tell(new SimulatedLogEntry(DemoIds.Scape, SimulatedLogKind.Note, closed.AddMinutes(25), closed.AddMinutes(25), "Grit in the seat of the valve. Cleaned, tested ten times, back on its timer.", DemoPeople.Display));
    }

    private static void DegasserFailure(DemoAgenda agenda, DemoDates dates, TankControls treatment)
    {
        DateTimeOffset stops = dates.DegasserStops;
        DateTimeOffset runs = dates.DegasserRuns;
        agenda.Do(stops, () => treatment.DegasserOn = false);
        agenda.Tell(new SimulatedDeviceState(DemoIds.Loop, "degasser", false, stops));
        agenda.Do(runs, () => treatment.DegasserOn = true);
        agenda.Tell(new SimulatedDeviceState(DemoIds.Loop, "degasser", true, runs));
        agenda.Tell(new SimulatedAcknowledgement(DemoIds.Loop, "state-degasser", runs.AddMinutes(1), DemoPeople.Early, "Motor protection had tripped, reset, running."));
        agenda.Tell(new SimulatedAcknowledgement(DemoIds.North1, "co2-high", runs.AddMinutes(2), DemoPeople.Early, "Degasser was off, runs again."));
        agenda.Tell(new SimulatedAcknowledgement(DemoIds.North2, "co2-high", runs.AddMinutes(2), DemoPeople.Early, "Degasser was off, runs again."));
        agenda.Tell(new SimulatedLogEntry(DemoIds.Loop, SimulatedLogKind.Note, runs, runs.AddMinutes(9), "Degasser fan stood still, motor protection tripped. Reset. Oxygen had looked good all night. Morning feed left out.", DemoPeople.Early));
        agenda.Tell(new SimulatedLoss(DemoIds.North2, runs.AddMinutes(20), runs.AddMinutes(35), 23, "salmonids", "At the outlet screen; the rest slow, gills wide.", DemoPeople.Early));
        agenda.Tell(new SimulatedLoss(DemoIds.North1, runs.AddMinutes(28), runs.AddMinutes(37), 6, "salmonids", "Dead since some hours by the look.", DemoPeople.Early));
    }

    // The same fan trips again while somebody watches, and is reset before CO2 passes a limit.
    private static void LiveTrip(DemoAgenda agenda, DateTimeOffset at, TankControls treatment)
    {
        agenda.Plan(at, () =>
        {
            treatment.DegasserOn = false;
            return [new SimulatedDeviceState(DemoIds.Loop, "degasser", false, at)];
        });
        DateTimeOffset reset = at + TripLasts;
        agenda.Plan(reset, () =>
        {
            treatment.DegasserOn = true;
            LiveTrip(agenda, at + BetweenTrips, treatment);
            return
            [
                new SimulatedDeviceState(DemoIds.Loop, "degasser", true, reset),
                new SimulatedLogEntry(DemoIds.Loop, SimulatedLogKind.Note, reset, reset, "Degasser fan had tripped again, reset. Electrician is called.", DemoPeople.Late),
            ];
        });
    }

    private static void AlkalinityUsedUp(DemoAgenda agenda, DemoDates dates, TankControls raceway)
    {
        DateTimeOffset halved = dates.RacewayExchangeHalved;
        agenda.Do(halved, () => raceway.ExchangeShare = RacewayExchangeHalf);
        agenda.Tell(new SimulatedLogEntry(DemoIds.Raceway, SimulatedLogKind.Note, halved, halved.AddMinutes(4), "Make-up water halved to save heat while the heat exchanger is repaired.", DemoPeople.Late));
        DateTimeOffset cut = dates.RacewayExchangeCut;
        agenda.Do(cut, () => raceway.ExchangeShare = RacewayExchangeLeft);
        agenda.Tell(new SimulatedLogEntry(DemoIds.Raceway, SimulatedLogKind.Note, cut, cut.AddMinutes(4), "Cold night: make-up water throttled to less than half again.", DemoPeople.Late));
        DateTimeOffset cleaned = dates.RacewayCleaned;
        agenda.Tell(new SimulatedLogEntry(DemoIds.Raceway, SimulatedLogKind.Cleaning, cleaned, cleaned.AddMinutes(5), "pH probe had slime on it, wiped and rinsed.", DemoPeople.Late, Subject: "ph"));
    }

    private static void DriftingProbe(DemoAgenda agenda, DemoDates dates, DemoWaters waters)
    {
        DateTimeOffset check = dates.ReefCrossChecked;
        agenda.Tell(new SimulatedAcknowledgement(DemoIds.Reef, "ph-low", dates.Day(-4, 8, 55), DemoPeople.Display, "Corals look well, do not believe it. Hand meter comes tomorrow."));
        agenda.Plan(check, () =>
        {
            double hand = Math.Round(waters[DemoIds.Reef].Solve().PhNbs, 2);
            string probe = (hand + ReefDriftPerDay * (check - dates.ReefDriftBegins).TotalDays).ToString("0.00", System.Globalization.CultureInfo.InvariantCulture);
            return [new SimulatedLogEntry(DemoIds.Reef, SimulatedLogKind.Note, check, check, $"Hand meter, fresh from its buffers, beside the probe; the probe says {probe}.", DemoPeople.Display, hand, "pH", "ph")];
        });
        DateTimeOffset calibrated = dates.ReefCalibrated;
        agenda.Tell(new SimulatedLogEntry(DemoIds.Reef, SimulatedLogKind.Calibration, calibrated, calibrated.AddMinutes(3), "Cleaned, two buffers, slope 94 %. Reads with the hand meter again.", DemoPeople.Display, Subject: "ph"));
        agenda.Tell(new SimulatedAcknowledgement(DemoIds.Reef, "ph-low", calibrated.AddMinutes(4), DemoPeople.Display, "The probe had drifted, the water was well."));
    }

    private static void WrongUnit(DemoAgenda agenda, DemoDates dates)
    {
        DateTimeOffset drawn = dates.ScapeTitration;
        DateTimeOffset corrected = dates.ScapeCorrected;
        agenda.Tell(new SimulatedLogEntry(DemoIds.Scape, SimulatedLogKind.Titration, drawn, drawn.AddMinutes(8), "Alkalinity", DemoPeople.Late, WrongTitration, "mmol/L", "alkalinity"));
        agenda.Tell(new SimulatedLogEntry(DemoIds.Scape, SimulatedLogKind.Titration, drawn, corrected, "The drops count dKH, not mmol/L: entry of this morning corrected.", DemoPeople.Display, WrongTitration, "dKH", "alkalinity"));
        agenda.Tell(new SimulatedAcknowledgement(DemoIds.Scape, "co2-high", corrected.AddMinutes(1), DemoPeople.Display, "No gas too much: a titration was typed in the wrong unit."));
    }

    private static void SilentProbe(DemoAgenda agenda, DemoDates dates)
    {
        DateTimeOffset speaks = dates.ShrimpSpeaks;
        agenda.Tell(new SimulatedLogEntry(DemoIds.Shrimp, SimulatedLogKind.Note, speaks, speaks.AddMinutes(2), "Plug of the pH probe was loose at the box, pushed home.", DemoPeople.Late, Subject: "ph"));
    }
}
