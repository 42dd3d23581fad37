using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Service.Tests.Pipeline;

public class FarmPipelineTests
{
    private static readonly TimeSpan Soon = TimeSpan.FromSeconds(20);

    [Fact]
    public async Task StoreFullTwice_AcknowledgementIsHeldSaidAndThenGiven()
    {
        using var bench = new PipelineBench();
        int refusals = 0;
        var held = new TaskCompletionSource(TaskCreationOptions.RunContinuationsAsynchronously);
        bench.Refuse = batch =>
        {
            if (batch.Readings.Count == 0 || refusals == 2)
                return null;
            if (++refusals == 2)
                held.SetResult();
            return new JournalUnavailableException("the disk is full");
        };

        Task onDisk = await bench.OfferAsync(7.2);
        await held.Task.WaitAsync(Soon);

        Assert.False(onDisk.IsCompleted);
        Assert.Contains(bench.Farm.ServiceTroubles, t => t.Contains("the disk is full", StringComparison.Ordinal));
        await onDisk.WaitAsync(Soon);
        Assert.Equal(7.2, Assert.Single(bench.Stored).Value);
        Assert.Empty(bench.Farm.ServiceTroubles);
    }

    [Fact]
    public async Task OneRowThatCannotBeStored_TheOthersAreAndItIsKeptWithItsReason()
    {
        using var bench = new PipelineBench();
        bench.Refuse = batch => batch.Readings.Any(r => r.RawValue == 9.99) ? new JournalRowException("constraint failed") : null;
        DateTimeOffset start = TimeProvider.System.GetUtcNow().AddMinutes(-5);

        Task[] all = [.. await Task.WhenAll(Enumerable.Range(0, 20).Select(i => bench.OfferAsync(i == 13 ? 9.99 : 7 + i * 0.01, start.AddSeconds(i))))];
        await Task.WhenAll(all).WaitAsync(Soon);

        Assert.Equal(19, bench.Stored.Count);
        Assert.Contains("constraint failed", Assert.Single(bench.Unreadable).Reason, StringComparison.Ordinal);
    }

    [Fact]
    public async Task UnknownPlace_IsListedAsNotAssignedWithItsReadings()
    {
        using var bench = new PipelineBench();

        await (await bench.OfferAsync(7.2)).WaitAsync(Soon);

        PlaceSnapshot place = bench.Farm.Find(PipelineBench.Tank)!;
        Assert.False(place.Definition.Assigned);
        Assert.Equal(7.2, place.Water.Values["ph"].Value);
        Assert.Contains(PipelineBench.Tank, bench.Announced);
    }

    [Fact]
    public async Task SetUpInTheDashboard_LoopAndTank_ShareTheLoopsAlkalinity()
    {
        using var bench = new PipelineBench();
        var loop = new PlaceDefinition { Key = new PlaceKey("north-quay", "loop-a"), Kind = PlaceKind.Loop, Name = "Loop A", VolumeM3 = 40 };
        var tank = new PlaceDefinition { Key = PipelineBench.Tank, Kind = PlaceKind.Tank, Name = "Tank 1", Loop = "loop-a", VolumeM3 = 9, Stock = ["salmonid"] };
        DateTimeOffset now = TimeProvider.System.GetUtcNow();

        await bench.Pipeline.RunAsync(
            (engine, time) =>
            {
                engine.SetUp(loop);
                engine.SetUp(tank);
                engine.Take(new ParsedReading(new SeriesKey(loop.Key, "alkalinity", "main"), 2, "mmol/L", now), time, ReadingOrigin.Live);
                engine.Take(new ParsedReading(new SeriesKey(loop.Key, "temperature", "main"), 14, null, now), time, ReadingOrigin.Live);
                return true;
            },
            CancellationToken.None);
        await (await bench.OfferAsync(7.3)).WaitAsync(Soon);

        PlaceSnapshot place = bench.Farm.Find(tank.Key)!;
        Assert.Contains("Loop A", string.Join(' ', place.Water.Values["alkalinity"].Caveats), StringComparison.Ordinal);
        Assert.True(place.Water.Values["co2"].Value > 5);
        Assert.Contains(bench.Farm.Find(loop.Key)!.Limits, l => l.Quantity == "alkalinity");
    }

    [Fact]
    public async Task Stop_WhileTheStoreIsFull_TellsTheSenderToSendAgain()
    {
        var bench = new PipelineBench();
        bench.Refuse = batch => batch.Readings.Count > 0 ? new JournalUnavailableException("the disk is full") : null;
        Task onDisk = await bench.OfferAsync(7.2);

        bench.Dispose();

        await Assert.ThrowsAsync<OperationCanceledException>(() => onDisk.WaitAsync(Soon));
    }
}
