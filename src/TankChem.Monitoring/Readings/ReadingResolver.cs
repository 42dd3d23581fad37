namespace TankChem.Monitoring.Readings;

/// <summary>Turns a parsed number into a valid reading: unit, time, physical range, quality.</summary>
public static class ReadingResolver
{
    /// <summary>Resolves one number.</summary>
    /// <param name="parsed">The number.</param>
    /// <param name="receivedAt">When it was received.</param>
    /// <param name="origin">How it came.</param>
    /// <param name="time">The time it stands under (its own, or the time of receipt made unique), UTC.</param>
    /// <param name="confirmedUnit">The unit of the probe's bare numbers as confirmed; null when nobody has.</param>
    public static Reading Resolve(in ParsedReading parsed, DateTimeOffset receivedAt, ReadingOrigin origin, DateTimeOffset time, string? confirmedUnit) => throw new NotSupportedException();

    /// <summary>Derives a kept reading anew with a unit that has been confirmed since; raw value, unit and times stay.</summary>
    public static Reading Rederive(Reading kept, string confirmedUnit) => throw new NotSupportedException();
}
