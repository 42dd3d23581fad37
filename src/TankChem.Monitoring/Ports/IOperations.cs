using TankChem.Dosing;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Ports;

/// <summary>What people do. Each call returns when it is on disk.</summary>
public interface IOperations
{
    /// <summary>Acknowledges, shelves … an alarm.</summary>
    Task<OperationResult> CommandAlarmAsync(AlarmCommand command, CancellationToken cancellationToken);

    /// <summary>Adds a logbook entry.</summary>
    Task<OperationResult> RecordAsync(LogEntry entry, CancellationToken cancellationToken);

    /// <summary>Takes a value measured by hand: a reading with the time the sample was drawn, and a logbook entry.</summary>
    /// <param name="place">Where.</param>
    /// <param name="quantity">What.</param>
    /// <param name="text">The number as typed: 7,2 and 7.2 are the same.</param>
    /// <param name="unit">The unit picked.</param>
    /// <param name="drawnAt">When the sample was drawn.</param>
    /// <param name="who">Who measured.</param>
    /// <param name="cancellationToken">Stops waiting.</param>
    Task<OperationResult> RecordMeasurementAsync(PlaceKey place, string quantity, string text, string unit, DateTimeOffset drawnAt, string who, CancellationToken cancellationToken);

    /// <summary>Records stock lost.</summary>
    /// <returns>On success the loss with its id in <see cref="OperationResult.Id"/>.</returns>
    Task<OperationResult> RecordLossAsync(LossRecord loss, CancellationToken cancellationToken);

    /// <summary>Confirms the unit of a probe's bare numbers; what was kept is then used.</summary>
    Task<OperationResult> ConfirmUnitAsync(SeriesKey series, string unit, string who, CancellationToken cancellationToken);

    /// <summary>Sets up a place, or changes it.</summary>
    Task<OperationResult> SetUpPlaceAsync(PlaceDefinition place, string who, CancellationToken cancellationToken);

    /// <summary>Makes a dose plan for a place (on its loop's water, when it is in one).</summary>
    DosePlan PlanDose(PlaceKey place, DoseTarget target, IReadOnlyList<string> reagents);

    /// <summary>What else can be done there, first safe action first.</summary>
    IReadOnlyList<Remedy> Remedies(PlaceKey place);
}

/// <summary>How an operation ended.</summary>
/// <param name="Done">Whether it is done and on disk.</param>
/// <param name="Fault">What is wrong, where, and what would be right; null when done.</param>
/// <param name="Field">The input that is at fault; null when none is.</param>
/// <param name="Id">Id of what was made; 0 when nothing has one.</param>
public sealed record OperationResult(bool Done, string? Fault, string? Field = null, long Id = 0)
{
    /// <summary>Done.</summary>
    public static OperationResult Success { get; } = new(true, null);
}
