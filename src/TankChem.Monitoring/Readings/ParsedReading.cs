namespace TankChem.Monitoring.Readings;

/// <summary>A number as it stood in a payload, before its unit is resolved and its quality judged.</summary>
/// <param name="Series">Which series.</param>
/// <param name="RawValue">The number, finite.</param>
/// <param name="RawUnit">The unit that came with it; null for a bare number.</param>
/// <param name="OwnTime">The time that came with it, UTC; null when it has none.</param>
public readonly record struct ParsedReading(SeriesKey Series, double RawValue, string? RawUnit, DateTimeOffset? OwnTime);
