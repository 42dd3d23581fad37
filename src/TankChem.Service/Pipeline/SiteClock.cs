using TankChem.Monitoring.Places;

namespace TankChem.Service.Pipeline;

/// <summary>A site's local time.</summary>
internal static class SiteClock
{
    /// <summary>The zone of a site; UTC when this machine does not know the one that is set.</summary>
    public static TimeZoneInfo Zone(SiteDefinition site) =>
        TimeZoneInfo.TryFindSystemTimeZoneById(site.TimeZone, out TimeZoneInfo? zone) ? zone : TimeZoneInfo.Utc;

    /// <summary>When the site's day began.</summary>
    public static DateTimeOffset StartOfDay(SiteDefinition site, DateTimeOffset now)
    {
        TimeZoneInfo zone = Zone(site);
        DateTime midnight = TimeZoneInfo.ConvertTime(now, zone).Date;
        return new DateTimeOffset(midnight, zone.GetUtcOffset(midnight)).ToUniversalTime();
    }
}
