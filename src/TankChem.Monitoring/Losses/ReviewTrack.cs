namespace TankChem.Monitoring.Losses;

/// <summary>One quantity over the window of a loss review.</summary>
/// <param name="Quantity">Quantity id.</param>
/// <param name="IsComputed">True for a value of the water state, false for readings.</param>
/// <param name="Points">Time and value, canonical unit, oldest first.</param>
/// <param name="Gaps">Where nothing was heard for much longer than usual.</param>
public sealed record ReviewTrack(string Quantity, bool IsComputed, IReadOnlyList<(DateTimeOffset Time, double Value)> Points, IReadOnlyList<(DateTimeOffset From, DateTimeOffset To)> Gaps)
{
    /// <summary>Longer than this many usual intervals is a gap.</summary>
    private const double GapIntervals = 3;

    /// <summary>Shorter silences are no gap, whatever the probe's pace.</summary>
    private static readonly TimeSpan GapMin = TimeSpan.FromMinutes(11);

    /// <summary>A track from its points in any order.</summary>
    public static ReviewTrack Of(string quantity, bool isComputed, IEnumerable<(DateTimeOffset Time, double Value)> points)
    {
        (DateTimeOffset Time, double Value)[] sorted = [.. points.OrderBy(p => p.Time)];
        TimeSpan[] steps = [.. sorted.Skip(1).Zip(sorted, (b, a) => b.Time - a.Time).Order()];
        var gaps = new List<(DateTimeOffset, DateTimeOffset)>();
        if (steps.Length > 0)
        {
            TimeSpan longest = TimeSpan.FromTicks(Math.Max(GapMin.Ticks, (long)(steps[steps.Length / 2].Ticks * GapIntervals)));
            for (int i = 1; i < sorted.Length; i++)
            {
                if (sorted[i].Time - sorted[i - 1].Time > longest)
                    gaps.Add((sorted[i - 1].Time, sorted[i].Time));
            }
        }

        return new ReviewTrack(quantity, isComputed, sorted, gaps);
    }
}
