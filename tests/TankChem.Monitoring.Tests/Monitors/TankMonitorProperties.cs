using CsCheck;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Tests.Monitors;

/// <summary>What holds on every history of readings, drawn at random; a failure prints its seed.</summary>
public sealed class TankMonitorProperties
{
    private static readonly PlaceDefinition Place = Farm.Tank("salmonid", "planted") with { Loop = "loop-a", Co2Injection = true };

    // Values wander over the limits, quantities come and go, some readings are late, some suspect, and minutes pass in silence.
    private static readonly Gen<(double Minutes, Reading[] Readings)[]> AnyHistory = Gen.Select(
        Gen.Double[0.01, 6],
        Gen.Select(Gen.Int[0, 9], Gen.Double[0, 1], Gen.Int[0, 12], (what, share, late) => (what, share, late)).Array[0, 4],
        (minutes, draws) => (minutes, draws))
        .Array[1, 60]
        .Select(steps =>
        {
            double at = 0;
            return steps.Select(step =>
            {
                at += step.minutes;
                return (at, step.draws.Select((draw, index) => Draw(draw.what, draw.share, Watch.Minute(at - (draw.late > 9 ? draw.late : 0)).AddMilliseconds(index), Watch.Minute(at))).ToArray());
            }).ToArray();
        });

    [Fact]
    public void Restart_AtAnyStep_GivesTheSameAlarms() => Gen.Select(AnyHistory, Gen.Int[0, 59]).Sample((history, restartAt) =>
    {
        var through = new Watch(Place, Farm.Loop);
        var restarted = new Watch(Place, Farm.Loop);
        for (int i = 0; i < history.Length; i++)
        {
            if (i == restartAt)
                restarted.Restart();
            through.Take(history[i].Minutes, history[i].Readings);
            restarted.Take(history[i].Minutes, history[i].Readings);
        }

        Assert.Equal(through.Journal.Select(Told), restarted.Journal.Select(Told));
        Assert.Equal(through.ActiveRules(), restarted.ActiveRules());
        Assert.Equal(through.Snapshot.Urgency, restarted.Snapshot.Urgency);
    });

    [Fact]
    public void History_Twice_IsTheSameTwice() => AnyHistory.Sample(history =>
    {
        var one = new Watch(Place, Farm.Loop);
        var other = new Watch(Place, Farm.Loop);
        foreach ((double minutes, Reading[] readings) in history)
        {
            one.Take(minutes, readings);
            other.Take(minutes, readings);
        }

        Assert.Equal(one.Journal, other.Journal);
        Assert.Equal(one.Snapshot.Sentence, other.Snapshot.Sentence);
        Assert.Equal(one.Kept.Select(state => state.Time), other.Kept.Select(state => state.Time));
    });

    [Fact]
    public void History_EveryRule_IsNeverRaisedTwiceWithoutAReturn() => AnyHistory.Sample(history =>
    {
        var watch = new Watch(Place, Farm.Loop);
        foreach ((double minutes, Reading[] readings) in history)
            watch.Take(minutes, readings);

        foreach (IGrouping<string, AlarmJournalEntry> rule in watch.Journal.GroupBy(entry => entry.Key.Rule))
        {
            AlarmChange[] changes = [.. rule.Select(entry => entry.Change).Where(change => change is AlarmChange.Raised or AlarmChange.ReturnedToNormal)];
            for (int i = 0; i < changes.Length; i++)
                Assert.Equal(i % 2 == 0 ? AlarmChange.Raised : AlarmChange.ReturnedToNormal, changes[i]);
        }
    });

    [Fact]
    public void History_KeptStates_AreAtLeastTenSecondsApartUnlessSomethingHappened() => AnyHistory.Sample(history =>
    {
        var watch = new Watch(Place, Farm.Loop);
        foreach ((double minutes, Reading[] readings) in history)
        {
            int before = watch.Kept.Count;
            watch.Take(minutes, readings);
            if (before == 0 || watch.Kept.Count == before || watch.Last.AlarmEntries.Count > 0)
                continue;
            bool sameNames = watch.Kept[^1].Values.Keys.Order(StringComparer.Ordinal).SequenceEqual(watch.Kept[^2].Values.Keys.Order(StringComparer.Ordinal), StringComparer.Ordinal);
            bool sameStale = sameNames && watch.Kept[^1].Values.All(one => watch.Kept[^2].Values[one.Key].Stale == one.Value.Stale);
            if (sameStale && watch.Kept[^1].Status == watch.Kept[^2].Status)
                Assert.True(watch.Kept[^1].Time - watch.Kept[^2].Time >= TimeSpan.FromSeconds(10));
        }
    });

    // The number is left out: what was last known of a value that cannot be computed any more is not on disk.
    private static (AlarmKey, DateTimeOffset, AlarmChange, AlarmPriority, string) Told(AlarmJournalEntry entry) => (entry.Key, entry.At, entry.Change, entry.Priority, entry.Title);

    private static Reading Draw(int what, double share, DateTimeOffset at, DateTimeOffset receivedAt)
    {
        Reading reading = what switch
        {
            0 or 1 => Farm.Read("ph", 6 + 2.5 * share, at),
            2 => Farm.Read("alkalinity", 0.2 + 2 * share, at),
            3 => Farm.Read("temperature", 10 + 12 * share, at),
            4 => Farm.Read("tan", 2 * share, at),
            5 => Farm.Read("oxygen-saturation", 40 + 70 * share, at),
            6 => Farm.Read("alkalinity", 0.2 + 2 * share, at, Farm.LoopKey),
            7 => Farm.Read("air-co2", 400 + 8000 * share, at),
            8 => Farm.Device(share < 0.4 ? "mains" : "blower", share is > 0.2 and < 0.7, at),
            _ => Farm.Read("ph", 5, at) with { Flag = QualityFlag.Suspect, Reason = "spike" },
        };
        return reading with { ReceivedAt = receivedAt };
    }
}
