using System.Threading.Channels;
using TankChem.Dosing;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Mqtt.Tests.Doubles;

/// <summary>Takes alarm commands and ends them when the test says so.</summary>
public sealed class FakeOperations : IOperations
{
    private readonly Channel<(AlarmCommand Command, TaskCompletionSource<OperationResult> Result)> commands = Channel.CreateUnbounded<(AlarmCommand, TaskCompletionSource<OperationResult>)>();

    public Task<OperationResult> CommandAlarmAsync(AlarmCommand command, CancellationToken cancellationToken)
    {
        var result = new TaskCompletionSource<OperationResult>(TaskCreationOptions.RunContinuationsAsynchronously);
        commands.Writer.TryWrite((command, result));
        return result.Task;
    }

    public async Task<(AlarmCommand Command, TaskCompletionSource<OperationResult> Result)> NextAsync() =>
        await commands.Reader.ReadAsync(TestContext.Current.CancellationToken).AsTask().WaitAsync(Wait.Long, TestContext.Current.CancellationToken);

    public Task<OperationResult> RecordAsync(LogEntry entry, CancellationToken cancellationToken) => throw new NotSupportedException();

    public Task<OperationResult> RecordMeasurementAsync(PlaceKey place, string quantity, string text, string unit, DateTimeOffset drawnAt, string who, CancellationToken cancellationToken) => throw new NotSupportedException();

    public Task<OperationResult> RecordLossAsync(LossRecord loss, CancellationToken cancellationToken) => throw new NotSupportedException();

    public Task<OperationResult> ConfirmUnitAsync(SeriesKey series, string unit, string who, CancellationToken cancellationToken) => throw new NotSupportedException();

    public Task<OperationResult> SetUpPlaceAsync(PlaceDefinition place, string who, CancellationToken cancellationToken) => throw new NotSupportedException();

    public DosePlan PlanDose(PlaceKey place, DoseTarget target, IReadOnlyList<string> reagents) => throw new NotSupportedException();

    public IReadOnlyList<Remedy> Remedies(PlaceKey place) => throw new NotSupportedException();
}
