using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;
using static TankChem.Storage.Tests.StoreFixture;

namespace TankChem.Storage.Tests;

public sealed class HistoryTests : IDisposable
{
    private readonly StoreFixture fixture = new();

    private IHistory History => fixture.Store.History;

    public void Dispose() => fixture.Dispose();

    [Theory]
    [InlineData(7)]
    [InlineData(60)]
    [InlineData(1000)]
    public async Task TrendAsync_AnyNumberOfPoints_EqualsTheBucketsMadeByHand(int points)
    {
        var random = new Random(4711);
        Reading[] readings = [.. Enumerable.Range(0, 500).Select(i => Reading(Noon.AddMilliseconds(random.Next(0, 3_600_000)), 7 + random.NextDouble())).DistinctBy(r => r.Time)];
        fixture.Store.Journal.Commit(new JournalBatch { Readings = readings });

        IReadOnlyList<TrendBucket> buckets = await History.TrendAsync(Tank, "ph", Noon, Noon.AddHours(1), points, CancellationToken.None);

        Assert.True(buckets.Count <= points);
        Assert.Equal(readings.Length, buckets.Sum(b => b.Count));
        foreach (TrendBucket bucket in buckets)
        {
            double[] inside = [.. readings.Where(r => r.Time >= bucket.From && r.Time < bucket.To).Select(r => r.Value!.Value)];
            Assert.Equal(inside.Length, bucket.Count);
            Assert.Equal(inside.Min(), bucket.Min);
            Assert.Equal(inside.Max(), bucket.Max);
            Assert.Equal(inside.Average(), bucket.Mean, 1e-12);
        }
    }

    [Fact]
    public async Task TrendAsync_OnlyReadingsOfGoodQualityCount()
    {
        fixture.Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon, 7), Reading(Noon.AddSeconds(1), 13, flag: QualityFlag.Suspect)] });

        Assert.Equal(7, Assert.Single(await History.TrendAsync(Tank, "ph", Noon, Noon.AddHours(1), 1, CancellationToken.None)).Max);
    }

    [Fact]
    public async Task TrendAsync_ComputedQuantity_ComesFromTheWaterStates()
    {
        fixture.Store.Journal.Commit(new JournalBatch { States = [State(Noon, 10), State(Noon.AddMinutes(1), 12), State(Noon.AddMinutes(2), 99, stale: true)] });

        TrendBucket bucket = Assert.Single(await History.TrendAsync(Tank, "co2", Noon, Noon.AddHours(1), 1, CancellationToken.None));

        Assert.Equal((10.0, 11.0, 12.0, 2L), (bucket.Min, bucket.Mean, bucket.Max, bucket.Count));
        Assert.Equal([10.0, 12.0], (await History.StateValuesAsync(Tank, Noon, Noon.AddHours(1), CancellationToken.None)).Select(v => v.Value));
    }

    [Fact]
    public async Task ReadingsAsync_Pages_GiveEveryReadingOnceAndInOrder()
    {
        Reading[] all = [.. Enumerable.Range(0, 25).SelectMany(i => new[] { Reading(Noon.AddSeconds(i), i, probe: "a"), Reading(Noon.AddSeconds(i), i + 0.5, probe: "b") })];
        fixture.Store.Journal.Commit(new JournalBatch { Readings = [.. all.Reverse()] });

        var seen = new List<Reading>();
        ReadingCursor? after = null;
        IReadOnlyList<Reading> page;
        while ((page = await History.ReadingsAsync(Tank, "ph", Noon, Noon.AddHours(1), after, 7, CancellationToken.None)).Count > 0)
        {
            seen.AddRange(page);
            after = new ReadingCursor(page[^1].Time, page[^1].Series.Probe);
        }

        Assert.Equal(all, seen);
    }

    [Fact]
    public async Task Pco2_OfAProbe_IsTrendedAsMeasuredAndNeverAsComputed()
    {
        WaterState water = State(Noon, 12) with { Values = new Dictionary<string, WaterValue>(StringComparer.Ordinal) { ["pco2"] = new() { Value = 2_000, Unit = "µatm", U = 50, Time = Noon } } };
        fixture.Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon, 3_000, "pco2")], States = [water] });

        Assert.Equal(2_000, Assert.Single(await History.TrendAsync(Tank, "pco2", Noon, Noon.AddHours(1), 10, CancellationToken.None)).Mean);
        Assert.Equal(3_000, Assert.Single(await History.TrendAsync(Tank, "pco2-measured", Noon, Noon.AddHours(1), 10, CancellationToken.None)).Mean);
        Assert.Equal(3_000, Assert.Single(await History.ReadingsAsync(Tank, "pco2-measured", Noon, Noon.AddHours(1), null, 10, CancellationToken.None)).Value);
    }

    [Fact]
    public async Task TrendAsync_ReadAndComputed_PrefersTheReadings()
    {
        WaterState water = State(Noon, 12) with { Values = new Dictionary<string, WaterValue>(StringComparer.Ordinal) { ["oxygen-saturation"] = new() { Value = 80, Unit = "%", U = 2, Time = Noon } } };
        fixture.Store.Journal.Commit(new JournalBatch { States = [water] });
        Assert.Equal(80, Assert.Single(await History.TrendAsync(Tank, "oxygen-saturation", Noon, Noon.AddHours(1), 10, CancellationToken.None)).Mean);

        fixture.Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon, 90, "oxygen-saturation")] });

        Assert.Equal(90, Assert.Single(await History.TrendAsync(Tank, "oxygen-saturation", Noon, Noon.AddHours(1), 10, CancellationToken.None)).Mean);
    }

    [Fact]
    public async Task Range_WithPartsOfAMillisecond_HoldsExactlyWhatIsInIt()
    {
        Reading[] all = [Reading(Noon, 1), Reading(Noon.AddMilliseconds(1), 2), Reading(Noon.AddMilliseconds(2), 3)];
        fixture.Store.Journal.Commit(new JournalBatch { Readings = all });
        DateTimeOffset from = Noon.AddTicks(1), to = Noon.AddMilliseconds(2).AddTicks(1);

        Assert.Equal(all[1..], await History.ReadingsAsync(Tank, "ph", from, to, null, 10, CancellationToken.None));
        Assert.Equal(2, Assert.Single(await History.TrendAsync(Tank, "ph", from, to, 1, CancellationToken.None)).Count);
        Assert.Empty(await History.TrendAsync(Tank, "ph", Noon.AddTicks(1), Noon.AddTicks(2), 10, CancellationToken.None));
    }

    [Fact]
    public async Task AllReadingsAsync_IsInOrderAndStopsAtTheLimit()
    {
        Reading[] all = [.. Enumerable.Range(0, 5).SelectMany(i => new[] { Reading(Noon.AddSeconds(i), i), Reading(Noon.AddSeconds(i), 15, "temperature") })];
        fixture.Store.Journal.Commit(new JournalBatch { Readings = [.. all.Reverse()] });

        Assert.Equal(all, await History.AllReadingsAsync(Tank, Noon, Noon.AddHours(1), 100, CancellationToken.None));
        Assert.Equal(all[..7], await History.AllReadingsAsync(Tank, Noon, Noon.AddHours(1), 7, CancellationToken.None));
    }
}
