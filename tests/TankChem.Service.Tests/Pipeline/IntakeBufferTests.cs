using TankChem.Monitoring.Readings;
using TankChem.Service.Pipeline;

namespace TankChem.Service.Tests.Pipeline;

public class IntakeBufferTests
{
    [Fact]
    public async Task OfferAsync_MessageTakenButNotCommitted_IsNotDone()
    {
        using var buffer = new IntakeBuffer(10);
        Task onDisk = await buffer.OfferAsync(Message(), CancellationToken.None);

        (IReadOnlyList<Arrival> taken, TaskCompletionSource committed) = buffer.Take();

        Assert.Single(taken);
        Assert.False(onDisk.IsCompleted);
        committed.SetResult();
        await onDisk.WaitAsync(TimeSpan.FromSeconds(5), CancellationToken.None);
    }

    [Fact]
    public async Task OfferAsync_FullBuffer_WaitsForRoomAndCountsIt()
    {
        using var buffer = new IntakeBuffer(1);
        await buffer.OfferAsync(Message(), CancellationToken.None);

        Task<Task> second = buffer.OfferAsync(Message(), CancellationToken.None).AsTask();
        Assert.False(second.IsCompleted);
        buffer.Take();

        await second.WaitAsync(TimeSpan.FromSeconds(5), CancellationToken.None);
        Assert.Equal(1, buffer.Delayed);
        Assert.Equal(1, buffer.Length);
    }

    [Fact]
    public async Task OfferAsync_AfterClose_TellsTheSenderToSendAgain()
    {
        using var buffer = new IntakeBuffer(10);
        Task waiting = await buffer.OfferAsync(Message(), CancellationToken.None);

        buffer.Close();

        await Assert.ThrowsAsync<OperationCanceledException>(() => waiting);
        await Assert.ThrowsAsync<OperationCanceledException>(async () => await await buffer.OfferAsync(Message(), CancellationToken.None));
    }

    [Fact]
    public async Task OfferAsync_ManySenders_EachMessageIsTakenOnce()
    {
        using var buffer = new IntakeBuffer(16);
        const int senders = 8, each = 500;
        int taken = 0;
        Task[] all = [.. Enumerable.Range(0, senders).Select(_ => Task.Run(async () =>
        {
            for (int i = 0; i < each; i++)
                await await buffer.OfferAsync(Message(), CancellationToken.None);
        }))];
        var writer = Task.Run(() =>
        {
            while (taken < senders * each)
            {
                buffer.Wait();
                (IReadOnlyList<Arrival> batch, TaskCompletionSource committed) = buffer.Take();
                taken += batch.Count;
                committed.SetResult();
            }
        });

        await Task.WhenAll([.. all, writer]).WaitAsync(TimeSpan.FromSeconds(30), CancellationToken.None);

        Assert.Equal(senders * each, taken);
    }

    private static Arrival Message() => new() { ReceivedAt = DateTimeOffset.UnixEpoch, Origin = ReadingOrigin.Live };
}
