using System.Globalization;

namespace TankChem.Monitoring.Water;

/// <summary>Times and ages in words.</summary>
internal static class Moment
{
    /// <summary><c>1 May 07:10 UTC</c>; with the year when it is not this one.</summary>
    public static string Words(DateTimeOffset time, DateTimeOffset now)
    {
        DateTime utc = time.UtcDateTime;
        return utc.ToString(utc.Year == now.UtcDateTime.Year ? "d MMM HH:mm 'UTC'" : "d MMM yyyy HH:mm 'UTC'", CultureInfo.InvariantCulture);
    }

    /// <summary><c>14 min</c>, <c>3 h</c>, <c>5 days</c>.</summary>
    public static string Age(TimeSpan age) => age.TotalMinutes < 1 ? "less than a minute"
        : age.TotalMinutes < 120 ? string.Create(CultureInfo.InvariantCulture, $"{Math.Floor(age.TotalMinutes):0} min")
        : age.TotalHours < 48 ? string.Create(CultureInfo.InvariantCulture, $"{Math.Floor(age.TotalHours):0} h")
        : string.Create(CultureInfo.InvariantCulture, $"{Math.Floor(age.TotalDays):0} days");
}
