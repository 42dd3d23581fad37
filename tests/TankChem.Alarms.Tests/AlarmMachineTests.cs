namespace TankChem.Alarms.Tests;

public sealed class AlarmMachineTests
{
    private static readonly DateTimeOffset Start = AlarmTables.Now;
    private static readonly AlarmSettings Settings = AlarmTables.Plain;

    [Fact]
    public void Step_EveryStateAndEvent_HasAnAnswerAndNeverThrows()
    {
        int cells = 0;
        foreach (AlarmState state in AllStates())
        {
            foreach (AlarmEventKind kind in Enum.GetValues<AlarmEventKind>())
            {
                AlarmStep step = AlarmMachine.Step(Settings, state, AlarmTables.EventOf(kind), Start);
                Assert.Equal(step.Refusal is not null, step.Refusal is { Length: > 20 });
                if (step.Refusal is not null)
                    Assert.Same(state, step.State);
                cells++;
            }
        }

        Assert.Equal(6 * 4 * 2 * 2 * 11, cells);
    }

    [Fact]
    public void Step_ConditionPresentShorterThanOnDelay_RaisesNothing()
    {
        AlarmState state = Play(AlarmState.Normal, (0, AlarmEventKind.ConditionPresent), (1.9, AlarmEventKind.ConditionPresent), (1.95, AlarmEventKind.ConditionAbsent), (4, AlarmEventKind.ConditionPresent));

        Assert.Equal(AlarmPhase.Normal, state.Phase);
        Assert.Equal(Start.AddMinutes(4), state.PendingSince);
    }

    [Fact]
    public void Step_ConditionPresentForOnDelay_Raises()
    {
        AlarmState state = Play(AlarmState.Normal, (0, AlarmEventKind.ConditionPresent), (2, AlarmEventKind.ConditionPresent));

        Assert.Equal(AlarmPhase.Unacknowledged, state.Phase);
        Assert.Equal(Start.AddMinutes(2), state.RaisedAt);
    }

    [Fact]
    public void Step_ConditionBackWithinOffDelay_StaysActiveWithoutASecondRaise()
    {
        AlarmState raised = AlarmTables.InPhase(AlarmPhase.Unacknowledged);
        var changes = new List<AlarmChange>();

        AlarmState state = Play(raised, changes, (0, AlarmEventKind.ConditionAbsent), (4, AlarmEventKind.ConditionPresent), (8, AlarmEventKind.ConditionAbsent), (12, AlarmEventKind.ConditionAbsent));

        Assert.Equal(AlarmPhase.Unacknowledged, state.Phase);
        Assert.Empty(changes);
        Assert.Equal(Start.AddMinutes(8), state.ClearSince);
    }

    [Fact]
    public void Step_ConditionUnknownWhileActive_HoldsTheAlarm()
    {
        AlarmState raised = AlarmTables.InPhase(AlarmPhase.Unacknowledged);

        AlarmState state = Play(raised, (0, AlarmEventKind.ConditionAbsent), (3, AlarmEventKind.ConditionUnknown), (60, AlarmEventKind.ConditionUnknown));

        Assert.Equal(AlarmPhase.Unacknowledged, state.Phase);
        Assert.Null(state.ClearSince);
    }

    [Fact]
    public void Step_AcknowledgedThenGoneAndBack_IsUnacknowledgedAgain()
    {
        AlarmState state = Play(
            AlarmTables.InPhase(AlarmPhase.Unacknowledged),
            (0, AlarmEventKind.Acknowledge), (1, AlarmEventKind.ConditionAbsent), (6, AlarmEventKind.ConditionAbsent), (7, AlarmEventKind.ConditionPresent), (9, AlarmEventKind.ConditionPresent));

        Assert.Equal(AlarmPhase.Unacknowledged, state.Phase);
        Assert.Null(state.AcknowledgedBy);
    }

    [Fact]
    public void Step_LatchedAndAcknowledged_IsNormalOnlyAfterReset()
    {
        AlarmState latched = AlarmMachine.Step(AlarmTables.Latching, AlarmTables.InPhase(AlarmPhase.Acknowledged) with { ClearSince = Start.AddMinutes(-5) }, new AlarmEvent(AlarmEventKind.ConditionAbsent), Start).State;
        Assert.Equal(AlarmPhase.LatchedAcknowledged, latched.Phase);

        AlarmStep reset = AlarmMachine.Step(AlarmTables.Latching, latched, new AlarmEvent(AlarmEventKind.Reset, "Ada"), Start);

        Assert.Equal(AlarmPhase.Normal, reset.State.Phase);
        Assert.Equal([AlarmChange.Reset], reset.Changes);
    }

    [Fact]
    public void Step_ShelfRunsOut_ShowsWhatHappenedMeanwhile()
    {
        AlarmState shelved = AlarmMachine.Step(Settings, AlarmState.Normal, new AlarmEvent(AlarmEventKind.Shelve, "Ada", "cleaning", Start.AddHours(1)), Start).State;
        AlarmState raised = Play(shelved, (1, AlarmEventKind.ConditionPresent), (3, AlarmEventKind.ConditionPresent));
        Assert.Equal(AlarmPhase.Unacknowledged, raised.Phase);
        Assert.Equal(AlarmSuppression.Shelved, raised.Suppression);

        AlarmStep step = AlarmMachine.Step(Settings, raised, new AlarmEvent(AlarmEventKind.ConditionPresent), Start.AddHours(1));

        Assert.Equal(AlarmSuppression.None, step.State.Suppression);
        Assert.Equal([AlarmChange.ShelfExpired], step.Changes);
        Assert.Equal(AlarmPhase.Unacknowledged, step.State.Phase);
    }

    [Theory]
    [InlineData("", "cleaning", 60, "\"who\" is missing")]
    [InlineData("  ", "cleaning", 60, "\"who\" is missing")]
    [InlineData("Ada", "", 60, "\"reason\" is missing")]
    [InlineData("Ada", "cleaning", null, "\"until\" is missing")]
    [InlineData("Ada", "cleaning", 0, "not in the future")]
    [InlineData("Ada", "cleaning", -5, "not in the future")]
    [InlineData("Ada", "cleaning", 721, "12 h at a time")]
    public void Step_ShelveWithFault_IsRefusedAndSaysWhatWouldBeRight(string who, string reason, int? minutes, string expected)
    {
        DateTimeOffset? until = minutes is { } given ? Start.AddMinutes(given) : null;

        AlarmStep step = AlarmMachine.Step(Settings, AlarmState.Normal, new AlarmEvent(AlarmEventKind.Shelve, who, reason, until), Start);

        Assert.Contains(expected, step.Refusal, StringComparison.Ordinal);
        Assert.Same(AlarmState.Normal, step.State);
    }

    [Fact]
    public void Step_ShelveCriticalAlarmForTwoHours_IsRefused()
    {
        AlarmSettings critical = Settings with { LongestShelf = AlarmSettings.CriticalLongestShelf };

        AlarmStep refused = AlarmMachine.Step(critical, AlarmState.Normal, new AlarmEvent(AlarmEventKind.Shelve, "Ada", "cleaning", Start.AddHours(2)), Start);
        AlarmStep taken = AlarmMachine.Step(critical, AlarmState.Normal, new AlarmEvent(AlarmEventKind.Shelve, "Ada", "cleaning", Start.AddHours(1)), Start);

        Assert.Contains("1 h at a time", refused.Refusal, StringComparison.Ordinal);
        Assert.Null(taken.Refusal);
        Assert.Equal("Ada: cleaning", taken.State.SuppressionReason);
    }

    [Theory]
    [InlineData(AlarmEventKind.Acknowledge)]
    [InlineData(AlarmEventKind.Reset)]
    [InlineData(AlarmEventKind.Unshelve)]
    [InlineData(AlarmEventKind.TakeOutOfService)]
    [InlineData(AlarmEventKind.ReturnToService)]
    public void Step_CommandOfNobody_IsRefused(AlarmEventKind kind)
    {
        foreach (AlarmState state in AllStates())
        {
            AlarmStep step = AlarmMachine.Step(Settings, state, new AlarmEvent(kind, " ", "why"), Start);

            Assert.Contains("\"who\" is missing", step.Refusal, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void Step_ClockSetBackDuringOnDelay_DelaysByAtMostTheOnDelay()
    {
        AlarmState pending = Play(AlarmState.Normal, (60, AlarmEventKind.ConditionPresent));

        AlarmState state = Play(pending, (0, AlarmEventKind.ConditionPresent), (2, AlarmEventKind.ConditionPresent));

        Assert.Equal(AlarmPhase.Unacknowledged, state.Phase);
    }

    [Fact]
    public void Step_SuppressedByDesign_IsRaisedAndRecordedButKeptBack()
    {
        AlarmState kept = AlarmMachine.Step(Settings, AlarmState.Normal, new AlarmEvent(AlarmEventKind.SuppressByDesign, Reason: "the mains is off"), Start).State;
        var changes = new List<AlarmChange>();

        AlarmState state = Play(kept, changes, (0, AlarmEventKind.ConditionPresent), (2, AlarmEventKind.ConditionPresent));

        Assert.Equal([AlarmChange.Raised], changes);
        Assert.Equal(AlarmSuppression.ByDesign, state.Suppression);
        Assert.Equal("the mains is off", state.SuppressionReason);
    }

    private static IEnumerable<AlarmState> AllStates()
    {
        foreach (AlarmPhase phase in Enum.GetValues<AlarmPhase>())
        {
            foreach (AlarmSuppression suppression in Enum.GetValues<AlarmSuppression>())
            {
                foreach (DateTimeOffset? pending in new DateTimeOffset?[] { null, Start.AddMinutes(-3) })
                {
                    foreach (DateTimeOffset? clear in new DateTimeOffset?[] { null, Start.AddMinutes(-6) })
                    {
                        yield return AlarmTables.InPhase(phase) with
                        {
                            Suppression = suppression,
                            ShelvedUntil = suppression == AlarmSuppression.Shelved ? Start.AddHours(1) : null,
                            PendingSince = pending,
                            ClearSince = clear,
                        };
                    }
                }
            }
        }
    }

    private static AlarmState Play(AlarmState state, params (double Minutes, AlarmEventKind Kind)[] events) => Play(state, [], events);

    private static AlarmState Play(AlarmState state, List<AlarmChange> changes, params (double Minutes, AlarmEventKind Kind)[] events)
    {
        foreach ((double minutes, AlarmEventKind kind) in events)
        {
            AlarmStep step = AlarmMachine.Step(Settings, state, AlarmTables.EventOf(kind), Start.AddMinutes(minutes));
            Assert.Null(step.Refusal);
            changes.AddRange(step.Changes);
            state = step.State;
        }

        return state;
    }
}
