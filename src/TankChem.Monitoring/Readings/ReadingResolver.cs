using System.Globalization;

namespace TankChem.Monitoring.Readings;

/// <summary>Turns a parsed number into a valid reading: unit, time, physical range, quality.</summary>
public static class ReadingResolver
{
    /// <summary>The reason of a bare number whose unit nobody has confirmed.</summary>
    public const string UnitNotConfirmed = "unit not confirmed";

    /// <summary>The reason of a reading whose own time lies ahead of the service's clock.</summary>
    public const string ClockAhead = "clock ahead";

    private static readonly TimeSpan AheadMax = TimeSpan.FromMinutes(5);
    private static readonly DateTimeOffset EarliestPlausible = new(2000, 1, 1, 0, 0, 0, TimeSpan.Zero);

    /// <summary>Resolves one number.</summary>
    /// <param name="parsed">The number.</param>
    /// <param name="receivedAt">When it was received.</param>
    /// <param name="origin">How it came.</param>
    /// <param name="time">The time it stands under (its own, or the time of receipt made unique), UTC.</param>
    /// <param name="confirmedUnit">The unit of the probe's bare numbers as confirmed; null when nobody has.</param>
    public static Reading Resolve(in ParsedReading parsed, DateTimeOffset receivedAt, ReadingOrigin origin, DateTimeOffset time, string? confirmedUnit)
    {
        (double? value, QualityFlag flag, string? reason) = Judge(parsed.Series.Quantity, parsed.RawValue, parsed.RawUnit, confirmedUnit);
        if (flag == QualityFlag.Pass)
            (flag, reason) = JudgeTime(parsed.OwnTime, receivedAt, origin);
        return new Reading
        {
            Series = parsed.Series,
            Time = time,
            ReceivedAt = receivedAt,
            RawValue = parsed.RawValue,
            RawUnit = parsed.RawUnit,
            Value = value,
            Flag = flag,
            Reason = reason,
            Origin = origin,
        };
    }

    /// <summary>Derives a kept reading anew with a unit that has been confirmed since; raw value, unit and times stay.</summary>
    public static Reading Rederive(Reading kept, string confirmedUnit)
    {
        ArgumentNullException.ThrowIfNull(kept);
        (double? value, QualityFlag flag, string? reason) = Judge(kept.Series.Quantity, kept.RawValue, kept.RawUnit, confirmedUnit);

        // Whether the time was its own is told by its being another than that of the receipt.
        if (flag == QualityFlag.Pass)
            (flag, reason) = JudgeTime(kept.Time == kept.ReceivedAt ? null : kept.Time, kept.ReceivedAt, kept.Origin);
        return kept with { Value = value, Flag = flag, Reason = reason };
    }

    private static (double? Value, QualityFlag Flag, string? Reason) Judge(string quantity, double raw, string? rawUnit, string? confirmedUnit)
    {
        QuantityDefinition definition = QuantityCatalog.Get(quantity);
        string? unit = rawUnit ?? confirmedUnit;
        if (unit is null && definition.NeedsConfirmedUnit)
            return (null, QualityFlag.NotEvaluated, UnitNotConfirmed);
        double value = raw;
        if (unit is not null && !UnitConverter.TryConvert(quantity, unit, raw, out value, out string? fault))
            return (null, QualityFlag.Fail, fault);
        if (definition.Computed)
            return (value, QualityFlag.NotEvaluated, $"{definition.Name} is computed here; what is sent under its name is kept and not used");
        return value >= definition.Min && value <= definition.Max
            ? (value, QualityFlag.Pass, null)
            : (value, QualityFlag.Fail, string.Create(CultureInfo.InvariantCulture, $"outside the physical range {definition.Min} to {definition.Max} {definition.Unit}").TrimEnd());
    }

    private static (QualityFlag Flag, string? Reason) JudgeTime(DateTimeOffset? ownTime, DateTimeOffset receivedAt, ReadingOrigin origin) => (ownTime, origin) switch
    {
        ({ } own, _) when own - receivedAt > AheadMax => (QualityFlag.Suspect, ClockAhead),
        ({ } own, _) when own < EarliestPlausible => (QualityFlag.Suspect, "its own time is before the year 2000"),
        (null, ReadingOrigin.Retained) => (QualityFlag.Suspect, "retained message without a time of its own"),
        (null, ReadingOrigin.Backlog) => (QualityFlag.Suspect, "from a backlog, without a time of its own"),
        _ => (QualityFlag.Pass, null),
    };
}
