using CsCheck;

namespace TankChem.Alarms.Tests;

/// <summary>What holds on every history, drawn at random; a failure prints its seed.</summary>
public sealed class AlarmMachineProperties
{
    private static readonly DateTimeOffset Start = AlarmTables.Now;

    private static readonly Gen<AlarmSettings> AnySettings = Gen.Select(Gen.Int[0, 5], Gen.Int[0, 5], Gen.Bool, (on, off, latching) => new AlarmSettings
    {
        OnDelay = TimeSpan.FromMinutes(on),
        OffDelay = TimeSpan.FromMinutes(off),
        Latching = latching,
    });

    private static readonly Gen<(double Minutes, AlarmEventKind Kind)[]> AnyHistory =
        Gen.Select(Gen.Double[0, 4], Gen.Enum<AlarmEventKind>(), (minutes, kind) => (minutes, kind)).Array[1, 60];

    [Fact]
    public void History_Raised_IsNeverRaisedAgainWithoutAReturn() => Check((_, steps) =>
    {
        bool up = false;
        foreach (AlarmChange change in steps.SelectMany(step => step.Step.Changes))
        {
            if (change == AlarmChange.Raised)
            {
                Assert.False(up);
                up = true;
            }
            else if (change is AlarmChange.ReturnedToNormal or AlarmChange.Latched)
            {
                Assert.True(up);
                up = false;
            }
        }
    });

    [Fact]
    public void History_EveryRaise_WaitsForAnAcknowledgementOfItsOwn() => Check((_, steps) =>
    {
        foreach (Taken taken in steps)
        {
            if (taken.Step.Changes.Contains(AlarmChange.Raised))
            {
                Assert.Equal(AlarmPhase.Unacknowledged, taken.Step.State.Phase);
                Assert.Null(taken.Step.State.AcknowledgedBy);
            }
        }
    });

    [Fact]
    public void History_UnacknowledgedAlarm_DisappearsOnlyByAnAcknowledgement() => Check((_, steps) =>
    {
        foreach (Taken taken in steps)
        {
            bool waited = taken.Before.Phase is AlarmPhase.Unacknowledged or AlarmPhase.ReturnedUnacknowledged or AlarmPhase.LatchedUnacknowledged;
            bool waits = taken.Step.State.Phase is AlarmPhase.Unacknowledged or AlarmPhase.ReturnedUnacknowledged or AlarmPhase.LatchedUnacknowledged;
            if (waited && !waits)
                Assert.Contains(AlarmChange.Acknowledged, taken.Step.Changes);
        }
    });

    [Fact]
    public void History_LatchingAlarm_IsNormalAgainOnlyByReset() => Check((settings, steps) =>
    {
        foreach (Taken taken in steps)
        {
            if (settings.Latching && taken.Before.Phase != AlarmPhase.Normal && taken.Step.State.Phase == AlarmPhase.Normal)
                Assert.Equal([AlarmChange.Reset], taken.Step.Changes.Where(change => change != AlarmChange.ShelfExpired));
        }
    });

    [Fact]
    public void History_Suppression_NeverChangesThePhase() => Check((settings, steps) =>
    {
        AlarmState bare = AlarmState.Normal;
        foreach (Taken taken in steps)
        {
            bool isOfLife = taken.Event.Kind is AlarmEventKind.ConditionPresent or AlarmEventKind.ConditionAbsent or AlarmEventKind.ConditionUnknown or AlarmEventKind.Acknowledge or AlarmEventKind.Reset;
            if (isOfLife)
                bare = AlarmMachine.Step(settings, bare, taken.Event, taken.At).State;
            Assert.Equal(bare.Phase, taken.Step.State.Phase);
            Assert.Equal(bare.PendingSince, taken.Step.State.PendingSince);
            Assert.Equal(bare.ClearSince, taken.Step.State.ClearSince);
        }
    });

    [Fact]
    public void History_Shelf_NeverOutlastsItsEnd() => Check((_, steps) =>
    {
        foreach (Taken taken in steps)
        {
            if (taken.Step.State.Suppression == AlarmSuppression.Shelved)
                Assert.True(taken.Step.State.ShelvedUntil > taken.At);
        }
    });

    [Fact]
    public void History_Refusal_ChangesNothingButAShelfThatRanOut() => Check((_, steps) =>
    {
        foreach (Taken taken in steps)
        {
            if (taken.Step.Refusal is null)
                continue;
            Assert.DoesNotContain(taken.Step.Changes, change => change != AlarmChange.ShelfExpired);
            Assert.Equal(taken.Before.Phase, taken.Step.State.Phase);
        }
    });

    [Fact]
    public void History_ConditionThatHoldsLongEnough_IsAlwaysRaised() => Check((settings, steps) =>
    {
        AlarmState last = steps[^1].Step.State;
        DateTimeOffset at = steps[^1].At;
        last = AlarmMachine.Step(settings, last, new AlarmEvent(AlarmEventKind.ConditionPresent), at).State;
        last = AlarmMachine.Step(settings, last, new AlarmEvent(AlarmEventKind.ConditionPresent), at + settings.OnDelay).State;
        Assert.True(last.Phase is AlarmPhase.Unacknowledged or AlarmPhase.Acknowledged);
    });

    private sealed record Taken(DateTimeOffset At, AlarmEvent Event, AlarmState Before, AlarmStep Step);

    private static void Check(Action<AlarmSettings, List<Taken>> holds) => Gen.Select(AnySettings, AnyHistory).Sample((settings, history) =>
    {
        var steps = new List<Taken>();
        AlarmState state = AlarmState.Normal;
        DateTimeOffset at = Start;
        foreach ((double minutes, AlarmEventKind kind) in history)
        {
            at = at.AddMinutes(minutes);
            AlarmEvent e = kind == AlarmEventKind.Shelve ? new AlarmEvent(kind, "Ada", "cleaning", at.AddMinutes(10 * minutes + 0.1)) : AlarmTables.EventOf(kind);
            AlarmStep step = AlarmMachine.Step(settings, state, e, at);
            steps.Add(new Taken(at, e, state, step));
            state = step.State;
        }

        holds(settings, steps);
    });
}
