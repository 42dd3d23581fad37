using System.Globalization;
using TankChem.Dashboard.Text;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Dashboard.Live;

/// <summary>Buckets to what a chart draws.</summary>
internal static class TrendMaker
{
    /// <summary>At least this many usual distances without a reading are shown as a gap.</summary>
    private const double GapInBuckets = 3.5;

    /// <summary>A limit further away than this many spans of the data would flatten the trend; it is named in words only.</summary>
    private const double LimitReach = 1.5;

    public static TrendSpec? Make(PlaceSnapshot place, string quantity, IReadOnlyList<TrendBucket> buckets, DateTimeOffset from, DateTimeOffset to)
    {
        if (buckets.Count == 0)
            return null;
        TimeZoneInfo zone = TimeText.Zone(place.Site);
        double[] points = new double[buckets.Count * 4];
        double low = double.MaxValue, high = double.MinValue;
        var steps = new List<double>(buckets.Count);
        for (int i = 0; i < buckets.Count; i++)
        {
            TrendBucket bucket = buckets[i];
            points[i * 4] = Local(bucket.From + (bucket.To - bucket.From) / 2, zone);
            points[i * 4 + 1] = bucket.Min;
            points[i * 4 + 2] = bucket.Mean;
            points[i * 4 + 3] = bucket.Max;
            low = Math.Min(low, bucket.Min);
            high = Math.Max(high, bucket.Max);
            if (i > 0)
                steps.Add(points[i * 4] - points[i * 4 - 4]);
        }

        steps.Sort();
        double usual = steps.Count == 0 ? (to - from).TotalMilliseconds : steps[steps.Count / 2];
        double span = Math.Max(high - low, Math.Max(Math.Abs(high) * 0.02, 1e-6));
        PlaceLimit[] limits = [.. place.Limits.Where(l => l.Quantity == quantity && l.Value > low - LimitReach * span && l.Value < high + LimitReach * span)];
        double bottom = Math.Min(low, limits.Select(l => l.Value).DefaultIfEmpty(low).Min()), top = Math.Max(high, limits.Select(l => l.Value).DefaultIfEmpty(high).Max());
        double margin = Math.Max((top - bottom) * 0.08, span * 0.05);
        QuantityDefinition definition = QuantityCatalog.Get(quantity);
        return new TrendSpec(
            quantity, points, Local(from, zone), Local(to, zone), usual * GapInBuckets, low >= 0 ? Math.Max(0, bottom - margin) : bottom - margin, top + margin, definition.Digits, NumberText.Unit(quantity), limits, InWords(quantity, buckets, place));
    }

    private static string InWords(string quantity, IReadOnlyList<TrendBucket> buckets, PlaceSnapshot place)
    {
        double first = buckets[0].Mean, last = buckets[^1].Mean;
        string limits = string.Join("; ", place.Limits.Where(l => l.Quantity == quantity).Select(l => l.Text));
        string sentence = string.Create(
            CultureInfo.InvariantCulture,
            $"From {NumberText.Plain(quantity, first)} to {NumberText.WithUnit(quantity, last)}; lowest {NumberText.Plain(quantity, buckets.Min(b => b.Min))}, highest {NumberText.Plain(quantity, buckets.Max(b => b.Max))}.");
        return limits.Length == 0 ? sentence : $"{sentence} {limits}.";
    }

    /// <summary>The chart's axis knows only UTC, so the site's clock is written into the number.</summary>
    private static double Local(DateTimeOffset time, TimeZoneInfo zone) => time.ToUnixTimeMilliseconds() + zone.GetUtcOffset(time).TotalMilliseconds;
}
