using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;
using static TankChem.Storage.Tests.StoreFixture;

namespace TankChem.Storage.Tests;

/// <summary>Trends against the same trend computed from a plain list of what counts, whatever order it came in and however often it was corrected.</summary>
public sealed class RollupTests : IDisposable
{
    private const int Days = 90;

    private readonly StoreFixture fixture = new();
    private readonly Dictionary<(string Probe, DateTimeOffset Time), Reading> readings = [];
    private readonly Dictionary<DateTimeOffset, double> states = [];

    public void Dispose() => fixture.Dispose();

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    public async Task TrendAsync_AfterAnyHistoryOfArrivals_EqualsTheValuesThatCount(int seed)
    {
        var random = new Random(seed);
        for (int i = 0; i < 60; i++)
        {
            fixture.Store.Journal.Commit(Batch(random));
            if (random.Next(10) == 0)
                fixture.Reopen();
        }

        foreach ((double start, double length, int points) in Windows(random))
        {
            DateTimeOffset from = Noon.AddMilliseconds(Math.Floor(start * 86_400_000)), to = from.AddMilliseconds(Math.Floor(length * 86_400_000));
            IEnumerable<(DateTimeOffset, double)> counting = readings.Values.Where(r => r.IsUsable).Select(r => (r.Time, r.Value!.Value));
            await CheckAsync($"seed {seed}: ph", "ph", from, to, points, counting);
            await CheckAsync($"seed {seed}: co2", "co2", from, to, points, states.Select(s => (s.Key, s.Value)));
        }
    }

    [Theory]
    [InlineData(24, 24)]
    [InlineData(24 * 7, 168)]
    [InlineData(24 * 30, 30)]
    [InlineData(24 * 30, 1)]
    [InlineData(24 * 30, 720)]
    public async Task TrendAsync_WholeHours_GivesEqualBuckets(int hours, int points)
    {
        Reading[] each = [.. Enumerable.Range(0, hours * 2).Select(i => Reading(Noon.AddMinutes(30 * i), i))];
        fixture.Store.Journal.Commit(new JournalBatch { Readings = each });

        IReadOnlyList<TrendBucket> buckets = await fixture.Store.History.TrendAsync(Tank, "ph", Noon, Noon.AddHours(hours), points, CancellationToken.None);

        Assert.Equal(points, buckets.Count);
        Assert.All(buckets, (bucket, i) => Assert.Equal((Noon.AddHours(i * hours / points), Noon.AddHours((i + 1) * hours / points)), (bucket.From, bucket.To)));
    }

    [Theory]
    [InlineData(7, 100)]
    [InlineData(30, 300)]
    [InlineData(90, 20)]
    [InlineData(90, 1_000)]
    public async Task TrendAsync_RangeThatFitsNoHours_GivesAllBucketsEachNearlyAsWideAsTheOthers(int days, int points)
    {
        DateTimeOffset from = Noon.AddMinutes(17).AddMilliseconds(3), to = from.AddDays(days);
        Reading[] each = [.. Enumerable.Range(0, days * 144).Select(i => Reading(from.AddMinutes(10 * i), i))];
        fixture.Store.Journal.Commit(new JournalBatch { Readings = each });

        IReadOnlyList<TrendBucket> buckets = await fixture.Store.History.TrendAsync(Tank, "ph", from, to, points, CancellationToken.None);

        TimeSpan equal = (to - from) / points;
        Assert.Equal(points, buckets.Count);
        Assert.All(buckets, b => Assert.InRange((b.To - b.From) / equal, 0.5, 1.5));
        Assert.All(buckets.Zip(buckets.Skip(1)), pair => Assert.Equal(pair.First.To, pair.Second.From));
        Assert.Equal((from, to, each.Length), (buckets[0].From, buckets[^1].To, (int)buckets.Sum(b => b.Count)));
    }

    [Fact]
    public async Task TrendAsync_LateReadingAndCorrection_ChangeAnHourThatWasOver()
    {
        Task<IReadOnlyList<TrendBucket>> TrendAsync() => fixture.Store.History.TrendAsync(Tank, "ph", Noon, Noon.AddDays(30), 720, CancellationToken.None);
        fixture.Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon.AddMinutes(5), 9.5), Reading(Noon.AddMinutes(6), 7), Reading(Noon.AddDays(2), 7)] });

        fixture.Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon.AddMinutes(5), 7.5), Reading(Noon.AddMinutes(50), 8)] });

        TrendBucket first = (await TrendAsync())[0];
        Assert.Equal((7.0, 7.5, 8.0, 3L), (first.Min, first.Mean, first.Max, first.Count));
    }

    private async Task CheckAsync(string what, string quantity, DateTimeOffset from, DateTimeOffset to, int points, IEnumerable<(DateTimeOffset Time, double Value)> counting)
    {
        IReadOnlyList<TrendBucket> buckets = await fixture.Store.History.TrendAsync(Tank, quantity, from, to, points, CancellationToken.None);

        what = $"{what}, {from:O} to {to:O} in {points}";
        (DateTimeOffset Time, double Value)[] expected = [.. counting.Where(c => c.Time >= from && c.Time < to)];
        Assert.True(buckets.Count <= points, what);
        Assert.True(expected.Length == buckets.Sum(b => b.Count), what);
        DateTimeOffset end = from;
        foreach (TrendBucket bucket in buckets)
        {
            Assert.True(bucket.From >= end && bucket.To > bucket.From && bucket.To <= to, what);
            end = bucket.To;
            double[] inside = [.. expected.Where(c => c.Time >= bucket.From && c.Time < bucket.To).Select(c => c.Value)];
            Assert.True((inside.Length, inside.Min(), inside.Max()) == (bucket.Count, bucket.Min, bucket.Max), what);
            Assert.True(Math.Abs(inside.Average() - bucket.Mean) < 1e-9, what);
        }
    }

    private static IEnumerable<(double Start, double Length, int Points)> Windows(Random random)
    {
        yield return (0, Days, 10);
        yield return (0, Days, Days);
        yield return (0.5, Days - 1, Days - 1);
        yield return (0.37, Days - 1, 5);
        yield return (-1, Days + 2, 1);
        yield return (3, 1, 24);
        yield return (3, 1.0 / 24, 1);
        for (int i = 0; i < 25; i++)
            yield return (random.NextDouble() * Days * 0.8, 0.01 + (random.NextDouble() * random.NextDouble() * Days), 1 + random.Next(400));
    }

    private JournalBatch Batch(Random random)
    {
        var arrived = new List<Reading>();
        for (int i = random.Next(80); i > 0; i--)
        {
            // Few enough instants that some come twice, with the same value or another.
            DateTimeOffset time = Noon.AddMinutes(Math.Floor(random.NextDouble() * Days * 48) * 30);
            QualityFlag flag = random.Next(5) == 0 ? QualityFlag.Suspect : QualityFlag.Pass;
            Reading reading = Reading(time, 6 + random.Next(30) / 10.0, probe: random.Next(2) == 0 ? "a" : "b", flag: flag);
            arrived.Add(reading);
            if (!readings.TryGetValue((reading.Series.Probe, time), out Reading? known) || known.RawValue != reading.RawValue)
                readings[(reading.Series.Probe, time)] = reading;
        }

        var derived = new List<Reading>();
        foreach (Reading kept in readings.Values.Where(_ => random.Next(200) == 0).ToArray())
        {
            Reading anew = kept with { Value = 6.5, Flag = kept.Flag == QualityFlag.Pass ? QualityFlag.Fail : QualityFlag.Pass };
            derived.Add(anew);
            readings[(kept.Series.Probe, kept.Time)] = anew;
        }

        var water = new List<WaterState>();
        for (int i = random.Next(40); i > 0; i--)
        {
            DateTimeOffset time = Noon.AddMinutes(Math.Floor(random.NextDouble() * Days * 48) * 30);
            water.Add(State(time, states[time] = random.Next(400) / 10.0));
        }

        return new JournalBatch { Readings = arrived, Rederived = derived, States = water };
    }
}
