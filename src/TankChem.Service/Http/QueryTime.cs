using System.Globalization;

namespace TankChem.Service.Http;

/// <summary>Times in a query: RFC 3339 or Unix seconds.</summary>
internal static class QueryTime
{
    private static readonly DateTimeOffset Earliest = DateTimeOffset.UnixEpoch;
    private static readonly DateTimeOffset Latest = DateTimeOffset.UnixEpoch.AddYears(200);

    /// <summary>Reads a range; the fault says which end and what would be right.</summary>
    public static bool TryReadRange(string? from, string? to, DateTimeOffset now, out DateTimeOffset start, out DateTimeOffset end, out string? fault)
    {
        end = now;
        start = now - TimeSpan.FromHours(24);
        fault = null;
        if (to is not null && !TryRead(to, out end))
            fault = $"to: \"{to}\" is not a time; right would be RFC 3339 (2026-05-01T10:00:00Z) or Unix seconds.";
        else if (from is not null && !TryRead(from, out start))
            fault = $"from: \"{from}\" is not a time; right would be RFC 3339 (2026-05-01T10:00:00Z) or Unix seconds.";
        else if (from is null)
            start = end - TimeSpan.FromHours(24);
        if (fault is null && start >= end)
            fault = "from must be before to.";
        return fault is null;
    }

    private static bool TryRead(string text, out DateTimeOffset time)
    {
        // A plus sign in a query that was not encoded arrives as a space.
        string plain = text.Replace(' ', '+');
        if (double.TryParse(plain, NumberStyles.Float, CultureInfo.InvariantCulture, out double seconds) && seconds >= 0 && seconds < Latest.ToUnixTimeSeconds())
        {
            time = DateTimeOffset.FromUnixTimeMilliseconds((long)(seconds * 1000));
            return true;
        }

        return DateTimeOffset.TryParse(plain, CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal | DateTimeStyles.AdjustToUniversal, out time)
            && time >= Earliest && time < Latest;
    }
}
