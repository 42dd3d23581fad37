using System.Globalization;

namespace TankChem.Mqtt.Payloads;

/// <summary>Reads times: RFC 3339 and Unix seconds.</summary>
internal static class TimeText
{
    private const double LastUnixSecond = 253_402_300_799;

    /// <summary>Reads a date and time with its zone (RFC 3339, section 5.6); fractions of a second count to the millisecond.</summary>
    public static bool TryRfc3339(ReadOnlySpan<byte> text, out DateTimeOffset time)
    {
        time = default;
        if (text.Length < 20
            || !Number(text, 0, 4, out int year) || text[4] != '-'
            || !Number(text, 5, 2, out int month) || text[7] != '-'
            || !Number(text, 8, 2, out int day) || text[10] is not ((byte)'T' or (byte)'t' or (byte)' ')
            || !Number(text, 11, 2, out int hour) || text[13] != ':'
            || !Number(text, 14, 2, out int minute) || text[16] != ':'
            || !Number(text, 17, 2, out int second))
            return false;
        int at = 19;
        int ms = 0;
        if (text[at] == '.' && !Fraction(text, ref at, out ms))
            return false;
        if (!Zone(text[at..], out int offsetMinutes))
            return false;
        if (year < 1 || month is < 1 or > 12 || day < 1 || day > DateTime.DaysInMonth(year, month) || hour > 23 || minute > 59 || second > 60)
            return false;

        // Second 60, a leap second, is the first of the next minute; a time whose zone takes it out of the calendar is none.
        long ticks = new DateTime(year, month, day, hour, minute, 0, DateTimeKind.Utc).Ticks + second * TimeSpan.TicksPerSecond + ms * TimeSpan.TicksPerMillisecond - offsetMinutes * TimeSpan.TicksPerMinute;
        if (ticks < DateTime.MinValue.Ticks || ticks > DateTime.MaxValue.Ticks)
            return false;
        time = new DateTimeOffset(ticks, TimeSpan.Zero);
        return true;
    }

    /// <summary>Reads seconds since 1970-01-01T00:00Z, fractions allowed.</summary>
    /// <param name="seconds">The seconds.</param>
    /// <param name="time">The time, to the millisecond.</param>
    /// <param name="fault">What is wrong and what would be right.</param>
    public static bool TryUnix(double seconds, out DateTimeOffset time, out string? fault)
    {
        time = default;
        if (seconds is >= 0 and <= LastUnixSecond)
        {
            time = DateTimeOffset.FromUnixTimeMilliseconds((long)Math.Round(seconds * 1000));
            fault = null;
            return true;
        }

        string number = seconds.ToString("R", CultureInfo.InvariantCulture);
        fault = seconds > LastUnixSecond
            ? $"{number} is past the year 9999; seconds since 1970, not milliseconds, would be right"
            : $"{number} is before 1970; seconds since 1970 or RFC 3339 would be right";
        return false;
    }

    private static bool Fraction(ReadOnlySpan<byte> text, ref int at, out int ms)
    {
        ms = 0;
        int weight = 100;
        int start = ++at;
        while (at < text.Length && text[at] is >= (byte)'0' and <= (byte)'9')
        {
            ms += (text[at] - '0') * weight;
            weight /= 10;
            at++;
        }

        return at > start;
    }

    private static bool Zone(ReadOnlySpan<byte> text, out int offsetMinutes)
    {
        offsetMinutes = 0;
        if (text.Length == 1)
            return text[0] is (byte)'Z' or (byte)'z';
        if (text.Length != 6 || text[0] is not ((byte)'+' or (byte)'-') || text[3] != ':' || !Number(text, 1, 2, out int hours) || !Number(text, 4, 2, out int minutes) || hours > 23 || minutes > 59)
            return false;
        offsetMinutes = (hours * 60 + minutes) * (text[0] == '-' ? -1 : 1);
        return true;
    }

    private static bool Number(ReadOnlySpan<byte> text, int from, int length, out int value)
    {
        value = 0;
        foreach (byte digit in text.Slice(from, length))
        {
            if (digit is < (byte)'0' or > (byte)'9')
                return false;
            value = value * 10 + digit - '0';
        }

        return true;
    }
}
