using TankChem.Monitoring.Readings;

namespace TankChem.Service.Pipeline;

/// <summary>Gives readings without a time of their own the time of receipt, and successive milliseconds to those of one series that share it.</summary>
internal sealed class SeriesClock
{
    /// <summary>A reading further behind than this is not a crowd in one millisecond but a clock that was set back: it takes the clock as it is now.</summary>
    private const long CrowdMs = 1_000;

    private readonly Dictionary<SeriesKey, long> last = [];

    /// <summary>The time a reading stands under, whole milliseconds.</summary>
    public DateTimeOffset Stamp(in ParsedReading reading, DateTimeOffset receivedAt)
    {
        if (reading.OwnTime is { } own)
            return DateTimeOffset.FromUnixTimeMilliseconds(own.ToUnixTimeMilliseconds());

        long ms = receivedAt.ToUnixTimeMilliseconds();
        if (last.TryGetValue(reading.Series, out long previous) && ms <= previous && previous - ms < CrowdMs)
            ms = previous + 1;
        last[reading.Series] = ms;
        return DateTimeOffset.FromUnixTimeMilliseconds(ms);
    }
}
