namespace TankChem.Dosing;

/// <summary>How a rise of alkalinity is spread over portions and days.</summary>
internal static class DoseSchedule
{
    private const double HourS = 3600;
    private const double DayS = 24 * HourS;

    /// <summary>Time for a portion to mix in and for the gas to settle before the next (common practice, no source: one to two turnovers).</summary>
    private const double BetweenStepsS = 2 * HourS;

    /// <summary>Portions, mmol/L each, with the seconds after the start.</summary>
    /// <param name="rise">Whole rise, mmol/L.</param>
    /// <param name="stepMax">Largest portion, mmol/L.</param>
    /// <param name="dayMax">Largest rise a day, mmol/L.</param>
    /// <param name="dosedToday">What the day has had already, mmol/L.</param>
    /// <param name="stepsMax">More portions than this are not planned.</param>
    /// <returns>Empty when it takes more than <paramref name="stepsMax"/> portions.</returns>
    public static IReadOnlyList<(double AfterS, double MmolL)> Of(double rise, double stepMax, double dayMax, double dosedToday, int stepsMax)
    {
        var portions = new List<(double, double)>();
        double left = rise, today = dosedToday, at = 0;
        int day = 0;
        while (left > 1e-9)
        {
            double room = dayMax - today;
            if (room <= 1e-9)
            {
                day++;
                today = 0;
                at = day * DayS;
                continue;
            }

            // Equal portions within what is left of the day, so that none is a remainder of a few grams.
            double thisDay = Math.Min(left, room);
            int count = (int)Math.Ceiling(thisDay / stepMax - 1e-9);
            double portion = thisDay / count;
            for (int i = 0; i < count; i++)
            {
                if (portions.Count == stepsMax)
                    return [];
                portions.Add((at, portion));
                at += BetweenStepsS;
            }

            left -= thisDay;
            today += thisDay;
        }

        return portions;
    }
}
