namespace TankChem.Simulation.Demo;

/// <summary>When the demo's stories happen, counted from the end of its history.</summary>
public sealed class DemoDates
{
    private readonly DateTimeOffset _today;

    /// <summary>Dates for a history that ends at a time.</summary>
    /// <param name="historyEnd">The end, full minute, UTC.</param>
    public DemoDates(DateTimeOffset historyEnd)
    {
        HistoryEnd = historyEnd;
        _today = new DateTimeOffset(historyEnd.UtcDateTime.Date, TimeSpan.Zero);
    }

    /// <summary>End of the history.</summary>
    public DateTimeOffset HistoryEnd { get; }

    /// <summary>Water exchange of the raceway is halved: nitrification begins to use its alkalinity up.</summary>
    public DateTimeOffset RacewayExchangeHalved => Day(-21, 9, 0);

    /// <summary>It is cut further.</summary>
    public DateTimeOffset RacewayExchangeCut => Day(-9, 9, 30);

    /// <summary>The pH probe of the raceway begins to foul.</summary>
    public DateTimeOffset RacewayFoulingBegins => Day(-25, 0, 0);

    /// <summary>It is cleaned.</summary>
    public DateTimeOffset RacewayCleaned => Day(-12, 14, 30);

    /// <summary>The pH probe of the reef begins to drift.</summary>
    public DateTimeOffset ReefDriftBegins => Day(-15, 12, 0);

    /// <summary>A hand meter disagrees with it.</summary>
    public DateTimeOffset ReefCrossChecked => Day(-3, 9, 40);

    /// <summary>It is calibrated.</summary>
    public DateTimeOffset ReefCalibrated => Day(-3, 10, 30);

    /// <summary>A sample of the planted tank is drawn whose titration is typed in the wrong unit.</summary>
    public DateTimeOffset ScapeTitration => Day(-9, 10, 15);

    /// <summary>The wrong entry is corrected.</summary>
    public DateTimeOffset ScapeCorrected => Day(-9, 11, 5);

    /// <summary>The gas valve of the planted tank should close, and does not.</summary>
    public DateTimeOffset ValveStuck => Day(-6, 17, 30);

    /// <summary>Somebody closes it by hand.</summary>
    public DateTimeOffset ValveClosed => Day(-5, 7, 5);

    /// <summary>The degasser of the salmonid loop stops.</summary>
    public DateTimeOffset DegasserStops => Day(-1, 1, 40);

    /// <summary>It runs again.</summary>
    public DateTimeOffset DegasserRuns => Day(-1, 6, 25);

    /// <summary>The pH probe of the shrimp tank falls silent.</summary>
    public DateTimeOffset ShrimpSilent => HistoryEnd.AddMinutes(-55);

    /// <summary>It speaks again, in the live part.</summary>
    public DateTimeOffset ShrimpSpeaks => HistoryEnd.AddHours(3);

    /// <summary>The degasser trips in the live part, for the first time.</summary>
    public DateTimeOffset FirstTrip => HistoryEnd.AddMinutes(12);

    /// <summary>A time of day, UTC, counted in days from the day in which the history ends.</summary>
    /// <param name="days">Days; negative before it.</param>
    /// <param name="hour">Hour.</param>
    /// <param name="minute">Minute.</param>
    public DateTimeOffset Day(int days, int hour, int minute) => _today.AddDays(days).AddHours(hour).AddMinutes(minute);

    /// <summary>Days from the day in which the history ends.</summary>
    internal int DayOf(DateTimeOffset time) => (int)Math.Floor((time - _today).TotalDays);
}
