namespace TankChem.Storage;

/// <summary>Whole hours since 1970 UTC, in which roll-ups are kept.</summary>
internal static class Hours
{
    /// <summary>Milliseconds of an hour.</summary>
    public const long Ms = 3_600_000;

    /// <summary>Hours of a day.</summary>
    public const long InADay = 24;

    /// <summary>The hour a time is in.</summary>
    public static long Of(long timeMs) => Floor(timeMs, Ms) / Ms;

    /// <summary>The first hour of the day an hour is in.</summary>
    public static long DayOf(long hour) => Floor(hour, InADay);

    /// <summary>The last whole multiple of a step that is not after a value, before 1970 too.</summary>
    public static long Floor(long value, long step) => value - (((value % step) + step) % step);

    /// <summary>The first whole multiple of a step that is not before a value.</summary>
    public static long Ceiling(long value, long step) => Floor(value + step - 1, step);
}
