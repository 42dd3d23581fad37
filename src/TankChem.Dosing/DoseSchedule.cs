namespace TankChem.Dosing;

/// <summary>A portion of a schedule.</summary>
/// <param name="AfterS">Seconds after the start.</param>
/// <param name="MmolL">Rise of alkalinity, mmol/L.</param>
internal readonly record struct Portion(double AfterS, double MmolL);

/// <summary>How a rise of alkalinity is spread over portions and days.</summary>
internal static class DoseSchedule
{
    /// <summary>Portions that a person weighs out for one plan.</summary>
    public const int PortionsMax = 24;

    /// <summary>Days that one titration carries: the water uses up alkalinity meanwhile.</summary>
    public const int DaysMax = 7;

    private const double HourS = 3600;
    private const double DayS = 24 * HourS;

    /// <summary>Time for a portion to mix in and for the gas to settle before the next (common practice, no source: one to two turnovers).</summary>
    public const double BetweenPortionsS = 2 * HourS;

    private const double PerDayMax = DayS / BetweenPortionsS;

    private const double Nothing = 1e-9;

    /// <summary>Portions that bring the whole rise; empty when it takes too many portions or days.</summary>
    /// <param name="rise">Whole rise, mmol/L.</param>
    /// <param name="dayMax">Largest rise a day, mmol/L.</param>
    /// <param name="dosedToday">What the day has had already, mmol/L.</param>
    /// <param name="day">Largest amount of a day: what has settled, what is wanted.</param>
    /// <param name="portion">Largest portion: what has settled, what is wanted.</param>
    public static IReadOnlyList<Portion> Of(double rise, double dayMax, double dosedToday, Func<double, double, double> day, Func<double, double, double> portion)
    {
        var portions = new List<Portion>();
        double done = 0, room = dayMax - Math.Max(0, dosedToday), at = 0;
        for (int today = 0; today < DaysMax && rise - done > Nothing; today++, room = dayMax)
        {
            double amount = room > Nothing ? day(done, Share(rise - done, room, dayMax)) : 0;
            if (amount <= Nothing)
                continue;

            // Equal portions within a day, so that none is a remainder of a few grams; the first is the one that lifts pH most.
            double largest = portion(done, amount);
            amount = Math.Min(amount, PerDayMax * largest);
            double count = largest > 0 ? Math.Ceiling(amount / largest - Nothing) : double.PositiveInfinity;
            if (portions.Count + count > PortionsMax)
                return [];
            at = Math.Max(at, today * DayS);
            for (int i = 0; i < count; i++, at += BetweenPortionsS)
                portions.Add(new Portion(at, amount / count));
            done += amount;
        }

        return rise - done > Nothing ? [] : portions;
    }

    /// <summary>Today's share of what is left: all of it, or the same as each of the days that it takes, so that no day is left with a crumb.</summary>
    private static double Share(double left, double room, double dayMax)
    {
        double furtherDays = Math.Max(0, Math.Ceiling((left - room) / dayMax - Nothing));
        return Math.Min(room, left / (1 + furtherDays));
    }
}
