using System.Globalization;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Water;

/// <summary>The one value of a quantity that counts, of all probes that measure it.</summary>
internal sealed class ChosenInput
{
    private ChosenInput(SeriesBook series, TimeSpan oldestUsed, ProbeDefinition? probe, string quantity, DateTimeOffset now)
    {
        Reading usable = series.Usable!;
        TimeSpan age = now > usable.Time ? now - usable.Time : TimeSpan.Zero;
        Value = usable.Value!.Value;
        U = ProbeUncertainty.Of(quantity, Value, age, probe);
        Time = usable.Time;
        UsedUntil = oldestUsed < DateTimeOffset.MaxValue - usable.Time ? usable.Time + oldestUsed : DateTimeOffset.MaxValue;
        IsStale = age > oldestUsed;
        Input = new WaterInput(quantity, series.Probe, usable.Series.Place, usable.Time, age.TotalSeconds);
        IsCalibrated = probe?.CalibratedAt is not null;
    }

    public double Value { get; }

    public double? U { get; }

    public DateTimeOffset Time { get; }

    /// <summary>The last instant at which it may be used.</summary>
    public DateTimeOffset UsedUntil { get; }

    public bool IsStale { get; }

    public bool IsCalibrated { get; }

    public WaterInput Input { get; }

    /// <summary>What to know of it; null when nothing.</summary>
    public string? Caveat { get; set; }

    /// <summary>Chooses among the probes of a quantity: the fresh <c>main</c> one, else the freshest; the newest stale one when none is fresh.</summary>
    /// <returns>Null when no probe ever gave a usable value.</returns>
    public static ChosenInput? Of(QuantityBook? book, PlaceDefinition? owner, DateTimeOffset now)
    {
        if (book is null)
            return null;
        SeriesBook? best = null;
        TimeSpan bestOldest = default;
        bool bestFresh = false;
        foreach (SeriesBook series in book.Probes)
        {
            if (series.Usable is not { } usable)
                continue;
            TimeSpan oldest = ProbeUncertainty.OldestUsed(book.Definition, WaterSetup.Probe(owner, book.Quantity, series.Probe));
            bool fresh = now - usable.Time <= oldest;
            bool better = best is null
                || (fresh && !bestFresh)
                || (fresh == bestFresh && best.Probe != SeriesKey.MainProbe && (series.Probe == SeriesKey.MainProbe || usable.Time > best.Usable!.Time))
                || (!fresh && !bestFresh && usable.Time > best.Usable!.Time);
            if (better)
                (best, bestOldest, bestFresh) = (series, oldest, fresh);
        }

        if (best is null)
            return null;
        var chosen = new ChosenInput(best, bestOldest, WaterSetup.Probe(owner, book.Quantity, best.Probe), book.Quantity, now);
        if (bestFresh && book.Probes.Count > 1)
            chosen.Caveat = Disagreement(book, owner, chosen, now);
        return chosen;
    }

    /// <summary>Two probes disagree when they differ by more than three standard uncertainties of their difference.</summary>
    private static string? Disagreement(QuantityBook book, PlaceDefinition? owner, ChosenInput chosen, DateTimeOffset now)
    {
        foreach (SeriesBook series in book.Probes)
        {
            if (series.Probe == chosen.Input.Probe || series.Usable is not { } usable)
                continue;
            ProbeDefinition? probe = WaterSetup.Probe(owner, book.Quantity, series.Probe);
            TimeSpan age = now > usable.Time ? now - usable.Time : TimeSpan.Zero;
            if (age > ProbeUncertainty.OldestUsed(book.Definition, probe) || chosen.U is not { } u || ProbeUncertainty.Of(book.Quantity, usable.Value!.Value, age, probe) is not { } other)
                continue;
            if (Math.Abs(usable.Value.Value - chosen.Value) > 3 * Math.Sqrt(u * u + other * other))
            {
                string reads = usable.Value.Value.ToString("F" + book.Definition.Digits.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
                return $"probe {series.Probe} disagrees: it reads {reads}";
            }
        }

        return null;
    }
}
