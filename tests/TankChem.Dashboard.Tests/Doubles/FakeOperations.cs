using TankChem.Dosing;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Dashboard.Tests.Doubles;

/// <summary>Remembers what was asked, answers what a test says.</summary>
internal sealed class FakeOperations : IOperations
{
    public List<object> Asked { get; } = [];

    public OperationResult Answer { get; set; } = OperationResult.Success;

    public DosePlan? Plan { get; set; }

    public Task<OperationResult> CommandAlarmAsync(AlarmCommand command, CancellationToken cancellationToken) => Take(command);

    public Task<OperationResult> RecordAsync(LogEntry entry, CancellationToken cancellationToken) => Take(entry);

    public Task<OperationResult> RecordMeasurementAsync(PlaceKey place, string quantity, string text, string unit, DateTimeOffset drawnAt, string who, CancellationToken cancellationToken) =>
        Take((quantity, text, unit, drawnAt, who));

    public Task<OperationResult> RecordLossAsync(LossRecord loss, CancellationToken cancellationToken) => Take(loss);

    public Task<OperationResult> ConfirmUnitAsync(SeriesKey series, string unit, string who, CancellationToken cancellationToken) => Take((series, unit, who));

    public Task<OperationResult> SetUpPlaceAsync(PlaceDefinition place, string who, CancellationToken cancellationToken) => Take(place);

    public DosePlan PlanDose(PlaceKey place, DoseTarget target, IReadOnlyList<string> reagents)
    {
        Asked.Add(target);
        return Plan ?? throw new InvalidOperationException("No plan was arranged.");
    }

    public IReadOnlyList<Remedy> Remedies(PlaceKey place) => [];

    private Task<OperationResult> Take(object asked)
    {
        Asked.Add(asked);
        return Task.FromResult(Answer);
    }
}
