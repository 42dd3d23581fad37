using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Water;

/// <summary>Standard uncertainty of a reading by its age: u² = u0² + (d · age)². u0 and d are defaults until somebody sets them for the probe.</summary>
/// <remarks>Sources: pH, alkalinity, temperature, salinity and TAN as the project's contract fixes them; the others are common practice, no source.</remarks>
public static class ProbeUncertainty
{
    private const double PhUncalibrated = 0.1;
    private const double PhCalibrated = 0.05;
    private const double AlkalinityDriftPerDay = 0.2;
    private const double TanGrowthPerDay = 0.3;
    private const double MinutesPerDay = 1440;

    /// <summary>Standard uncertainty, canonical unit; null where none exists (a set-point, a switch, a quantity nobody described).</summary>
    /// <param name="quantity">Quantity id.</param>
    /// <param name="value">The reading, canonical unit.</param>
    /// <param name="age">Its age; negative counts as zero.</param>
    /// <param name="probe">What is known of the probe; null when nothing is.</param>
    public static double? Of(string quantity, double value, TimeSpan age, ProbeDefinition? probe)
    {
        if ((probe?.StandardUncertainty ?? Fresh(quantity, value, probe)) is not { } fresh)
            return null;

        // Whole minutes: finer steps change no digit that is shown, and let what follows from u be reused within a minute.
        double days = Math.Max(0, Math.Floor(age.TotalMinutes)) / MinutesPerDay;
        double drift = days * (probe?.DriftPerDay ?? DriftPerDay(quantity, value));
        return Math.Sqrt(fresh * fresh + drift * drift);
    }

    /// <summary>Oldest age at which a reading is used.</summary>
    public static TimeSpan OldestUsed(QuantityDefinition definition, ProbeDefinition? probe)
    {
        ArgumentNullException.ThrowIfNull(definition);
        return probe?.OldestUsed ?? definition.OldestUsed;
    }

    private static double? Fresh(string quantity, double value, ProbeDefinition? probe) => quantity switch
    {
        "ph" => probe?.CalibratedAt is null ? PhUncalibrated : PhCalibrated,
        "alkalinity" => 0.05 * Math.Abs(value),
        "temperature" => 0.2,
        "salinity" => 0.02 * value,
        "conductivity" => 0.02 * value,
        "tan" => 0.1 * value,
        "nitrite" => 0.1 * value,
        "calcium" => 0.05 * value,
        "oxygen" => Math.Max(0.1, 0.03 * value),
        "oxygen-saturation" => Math.Max(1, 0.03 * value),
        "pco2" => 0.1 * value,
        "air-co2" => Math.Max(30, 0.05 * value),
        "air-pressure" => 1,
        "gas-pressure" => 1,
        _ => null,
    };

    private static double DriftPerDay(string quantity, double value) => quantity switch
    {
        "alkalinity" => AlkalinityDriftPerDay,
        "tan" => TanGrowthPerDay * value,
        _ => 0,
    };
}
