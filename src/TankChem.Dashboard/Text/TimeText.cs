using System.Globalization;
using TankChem.Monitoring.Places;

namespace TankChem.Dashboard.Text;

/// <summary>Times for people: the site's own, and ages in words.</summary>
internal static class TimeText
{
    /// <summary>The site's zone; UTC when this machine does not know it.</summary>
    public static TimeZoneInfo Zone(SiteDefinition? site) =>
        site is not null && TimeZoneInfo.TryFindSystemTimeZoneById(site.TimeZone, out TimeZoneInfo? zone) ? zone : TimeZoneInfo.Utc;

    /// <summary>How long ago, in words.</summary>
    public static string Ago(DateTimeOffset time, DateTimeOffset now)
    {
        TimeSpan age = now - time;
        return age < TimeSpan.Zero ? "ahead of this clock" : $"{Span(age)} ago";
    }

    /// <summary>A span in words, one unit.</summary>
    public static string Span(TimeSpan span) => span switch
    {
        { TotalSeconds: < 60 } => $"{(int)span.TotalSeconds} s",
        { TotalMinutes: < 60 } => $"{(int)span.TotalMinutes} min",
        { TotalHours: < 48 } => $"{(int)span.TotalHours} h",
        _ => $"{(int)span.TotalDays} d",
    };

    /// <summary>Date and time in the site's zone; the year only when it is another.</summary>
    public static string Moment(DateTimeOffset time, SiteDefinition? site, DateTimeOffset now)
    {
        DateTimeOffset local = TimeZoneInfo.ConvertTime(time, Zone(site));
        DateTimeOffset today = TimeZoneInfo.ConvertTime(now, Zone(site));
        string format = local.Date == today.Date ? "HH:mm" : local.Year == today.Year ? "d MMM HH:mm" : "d MMM yyyy HH:mm";
        return local.ToString(format, CultureInfo.InvariantCulture);
    }

    /// <summary>The zone's name beside times.</summary>
    public static string ZoneName(SiteDefinition? site) => Zone(site).Id;

    /// <summary>For a date-and-time input field, in the site's zone.</summary>
    public static string Field(DateTimeOffset time, SiteDefinition? site) => TimeZoneInfo.ConvertTime(time, Zone(site)).ToString("yyyy-MM-dd'T'HH:mm", CultureInfo.InvariantCulture);

    /// <summary>From a date-and-time input field in the site's zone.</summary>
    public static bool TryField(string? text, SiteDefinition? site, out DateTimeOffset time)
    {
        time = default;
        if (!DateTime.TryParseExact(text, ["yyyy-MM-dd'T'HH:mm", "yyyy-MM-dd'T'HH:mm:ss"], CultureInfo.InvariantCulture, DateTimeStyles.None, out DateTime local))
            return false;
        TimeZoneInfo zone = Zone(site);
        if (zone.IsInvalidTime(local))
            local = local.AddHours(1);
        time = new DateTimeOffset(local, zone.GetUtcOffset(local)).ToUniversalTime();
        return true;
    }
}
