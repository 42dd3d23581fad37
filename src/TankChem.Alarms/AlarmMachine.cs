namespace TankChem.Alarms;

/// <summary>The life of an alarm: one pure, total function of state, event and time. docs/alarms.md holds its table, and a test compares the two.</summary>
/// <remarks>
/// Two axes that do not know of each other: the phase (condition, acknowledged, latched) and the suppression. A suppressed alarm goes on living; only who is told differs.
/// Every event has one method with a row for every state and no row for "anything else", so a state or event added without a thought does not compile.
/// </remarks>
public static class AlarmMachine
{
    private const int LongestText = 500;

    /// <summary>One step. A shelf that has run out by <paramref name="now"/> ends first, whatever the event is.</summary>
    /// <param name="settings">How the alarm behaves.</param>
    /// <param name="state">What it is.</param>
    /// <param name="e">What happens.</param>
    /// <param name="now">When.</param>
    public static AlarmStep Step(AlarmSettings settings, AlarmState state, in AlarmEvent e, DateTimeOffset now)
    {
        ArgumentNullException.ThrowIfNull(settings);
        ArgumentNullException.ThrowIfNull(state);
        if (state.Suppression != AlarmSuppression.Shelved || state.ShelvedUntil > now)
            return Dispatch(settings, state, e, now);

        AlarmState shown = state with { Suppression = AlarmSuppression.None, ShelvedUntil = null, SuppressionReason = null, ChangedAt = now };
        AlarmStep step = Dispatch(settings, shown, e, now);
        return step with { Changes = [AlarmChange.ShelfExpired, .. step.Changes] };
    }

    private static AlarmStep Dispatch(AlarmSettings settings, AlarmState state, in AlarmEvent e, DateTimeOffset now) => e.Kind switch
    {
        AlarmEventKind.ConditionPresent => ConditionPresent(settings, state, now),
        AlarmEventKind.ConditionAbsent => ConditionAbsent(settings, state, now),
        AlarmEventKind.ConditionUnknown => ConditionUnknown(settings, state, now),
        AlarmEventKind.Acknowledge => FaultOfWho(e, "acknowledge") is { } fault ? AlarmStep.Refused(state, fault) : Acknowledge(state, e, now),
        AlarmEventKind.Reset => FaultOfWho(e, "reset") is { } fault ? AlarmStep.Refused(state, fault) : Reset(state, now),
        AlarmEventKind.Shelve => FaultOfShelf(settings, e, now) is { } fault ? AlarmStep.Refused(state, fault) : Shelve(state, e, now),
        AlarmEventKind.Unshelve => FaultOfWho(e, "unshelve") is { } fault ? AlarmStep.Refused(state, fault) : Unshelve(state, now),
        AlarmEventKind.TakeOutOfService => FaultOfReason(e, "take out of service") is { } fault ? AlarmStep.Refused(state, fault) : TakeOutOfService(state, e, now),
        AlarmEventKind.ReturnToService => FaultOfWho(e, "return to service") is { } fault ? AlarmStep.Refused(state, fault) : ReturnToService(state, now),
        AlarmEventKind.SuppressByDesign => SuppressByDesign(state, e, now),
        AlarmEventKind.EndSuppression => EndSuppression(state, now),
    };

    private static AlarmStep ConditionPresent(AlarmSettings settings, AlarmState state, DateTimeOffset now) => state.Phase switch
    {
        AlarmPhase.Normal => RaiseAfterDelay(settings, state, now),
        AlarmPhase.Unacknowledged => HoldActive(state),
        AlarmPhase.Acknowledged => HoldActive(state),
        AlarmPhase.ReturnedUnacknowledged => RaiseAfterDelay(settings, state, now),
        AlarmPhase.LatchedUnacknowledged => RaiseAfterDelay(settings, state, now),
        AlarmPhase.LatchedAcknowledged => RaiseAfterDelay(settings, state, now),
    };

    private static AlarmStep ConditionAbsent(AlarmSettings settings, AlarmState state, DateTimeOffset now) => state.Phase switch
    {
        AlarmPhase.Normal => StopRaising(state),
        AlarmPhase.Unacknowledged => ReturnAfterDelay(settings, state, now, settings.Latching ? AlarmPhase.LatchedUnacknowledged : AlarmPhase.ReturnedUnacknowledged),
        AlarmPhase.Acknowledged => ReturnAfterDelay(settings, state, now, settings.Latching ? AlarmPhase.LatchedAcknowledged : AlarmPhase.Normal),
        AlarmPhase.ReturnedUnacknowledged => StopRaising(state),
        AlarmPhase.LatchedUnacknowledged => StopRaising(state),
        AlarmPhase.LatchedAcknowledged => StopRaising(state),
    };

    // Not knowing is never good news: an on-delay that runs goes on to the raise, an off-delay that runs is given up.
    private static AlarmStep ConditionUnknown(AlarmSettings settings, AlarmState state, DateTimeOffset now) => state.Phase switch
    {
        AlarmPhase.Normal => GoOnRaising(settings, state, now),
        AlarmPhase.Unacknowledged => HoldActive(state),
        AlarmPhase.Acknowledged => HoldActive(state),
        AlarmPhase.ReturnedUnacknowledged => GoOnRaising(settings, state, now),
        AlarmPhase.LatchedUnacknowledged => GoOnRaising(settings, state, now),
        AlarmPhase.LatchedAcknowledged => GoOnRaising(settings, state, now),
    };

    private static AlarmStep Acknowledge(AlarmState state, in AlarmEvent e, DateTimeOffset now) => state.Phase switch
    {
        AlarmPhase.Normal => AlarmStep.Refused(state, "Cannot acknowledge: this alarm is normal, there is nothing to confirm. Acknowledge an alarm that is active or waits for confirmation."),
        AlarmPhase.Unacknowledged => Acknowledged(state, e, now, AlarmPhase.Acknowledged),
        AlarmPhase.Acknowledged => AlarmStep.Refused(state, $"Cannot acknowledge: {state.AcknowledgedBy} has already done so. It comes back unacknowledged when it is raised anew."),
        AlarmPhase.ReturnedUnacknowledged => Acknowledged(state, e, now, AlarmPhase.Normal),
        AlarmPhase.LatchedUnacknowledged => Acknowledged(state, e, now, AlarmPhase.LatchedAcknowledged),
        AlarmPhase.LatchedAcknowledged => AlarmStep.Refused(state, $"Cannot acknowledge: {state.AcknowledgedBy} has already done so. Its condition is gone: reset it."),
    };

    private static AlarmStep Reset(AlarmState state, DateTimeOffset now) => state.Phase switch
    {
        AlarmPhase.Normal => AlarmStep.Refused(state, "Cannot reset: this alarm is normal. Only a latched alarm whose condition is gone can be reset."),
        AlarmPhase.Unacknowledged => AlarmStep.Refused(state, "Cannot reset: its condition still holds. Put the cause right first; only a latched alarm whose condition is gone can be reset."),
        AlarmPhase.Acknowledged => AlarmStep.Refused(state, "Cannot reset: its condition still holds. Put the cause right first; only a latched alarm whose condition is gone can be reset."),
        AlarmPhase.ReturnedUnacknowledged => AlarmStep.Refused(state, "Cannot reset: this alarm is not latched. Acknowledge it, and it is normal."),
        AlarmPhase.LatchedUnacknowledged => AlarmStep.Refused(state, "Cannot reset: nobody has acknowledged it. Acknowledge it first, then reset it."),
        AlarmPhase.LatchedAcknowledged => state.PendingSince is null
            ? AlarmStep.With(state with { Phase = AlarmPhase.Normal, ChangedAt = now }, AlarmChange.Reset)
            : AlarmStep.Refused(state, "Cannot reset: its condition is present again. Put the cause right first."),
    };

    private static AlarmStep Shelve(AlarmState state, in AlarmEvent e, DateTimeOffset now) => state.Suppression switch
    {
        AlarmSuppression.None => Shelved(state, e, now),
        AlarmSuppression.Shelved => Shelved(state, e, now),
        AlarmSuppression.ByDesign => Shelved(state, e, now),
        AlarmSuppression.OutOfService => AlarmStep.Refused(state, "Cannot shelve: this alarm is out of service. Return it to service first."),
    };

    private static AlarmStep Unshelve(AlarmState state, DateTimeOffset now) => state.Suppression switch
    {
        AlarmSuppression.None => AlarmStep.Refused(state, "Cannot unshelve: this alarm is not shelved."),
        AlarmSuppression.Shelved => Shown(state, now, AlarmChange.Unshelved),
        AlarmSuppression.ByDesign => AlarmStep.Refused(state, "Cannot unshelve: this alarm is not shelved but suppressed by design; it shows again when the cause is gone."),
        AlarmSuppression.OutOfService => AlarmStep.Refused(state, "Cannot unshelve: this alarm is not shelved but out of service. Return it to service."),
    };

    private static AlarmStep TakeOutOfService(AlarmState state, in AlarmEvent e, DateTimeOffset now) => state.Suppression switch
    {
        AlarmSuppression.None => TakenOut(state, e, now),
        AlarmSuppression.Shelved => TakenOut(state, e, now),
        AlarmSuppression.ByDesign => TakenOut(state, e, now),
        AlarmSuppression.OutOfService => AlarmStep.Refused(state, "Cannot take out of service: this alarm already is."),
    };

    private static AlarmStep ReturnToService(AlarmState state, DateTimeOffset now) => state.Suppression switch
    {
        AlarmSuppression.None => AlarmStep.Refused(state, "Cannot return to service: this alarm is in service."),
        AlarmSuppression.Shelved => AlarmStep.Refused(state, "Cannot return to service: this alarm is in service, it is shelved. Unshelve it."),
        AlarmSuppression.ByDesign => AlarmStep.Refused(state, "Cannot return to service: this alarm is in service, it is suppressed by design; it shows again when the cause is gone."),
        AlarmSuppression.OutOfService => Shown(state, now, AlarmChange.ReturnedToService),
    };

    // What a person decided stands over logic: the monitor asks again at every step, so nothing is lost when the person's decision ends.
    private static AlarmStep SuppressByDesign(AlarmState state, in AlarmEvent e, DateTimeOffset now) => state.Suppression switch
    {
        AlarmSuppression.None => AlarmStep.With(
            state with { Suppression = AlarmSuppression.ByDesign, SuppressionReason = e.Reason, ShelvedUntil = null, ChangedAt = now },
            AlarmChange.SuppressedByDesign),
        AlarmSuppression.Shelved => AlarmStep.Silent(state),
        AlarmSuppression.ByDesign => AlarmStep.Silent(state),
        AlarmSuppression.OutOfService => AlarmStep.Silent(state),
    };

    private static AlarmStep EndSuppression(AlarmState state, DateTimeOffset now) => state.Suppression switch
    {
        AlarmSuppression.None => AlarmStep.Silent(state),
        AlarmSuppression.Shelved => AlarmStep.Silent(state),
        AlarmSuppression.ByDesign => Shown(state, now, AlarmChange.SuppressionEnded),
        AlarmSuppression.OutOfService => AlarmStep.Silent(state),
    };

    private static AlarmStep RaiseAfterDelay(AlarmSettings settings, AlarmState state, DateTimeOffset now)
    {
        // A clock that was set back would stretch a delay; it then begins anew and lasts at most its own length.
        DateTimeOffset since = state.PendingSince is { } began && began <= now ? began : now;
        if (now - since >= settings.OnDelay)
        {
            AlarmState raised = state with
            {
                Phase = AlarmPhase.Unacknowledged,
                PendingSince = null,
                ClearSince = null,
                RaisedAt = now,
                ChangedAt = now,
                AcknowledgedAt = null,
                AcknowledgedBy = null,
                AcknowledgedReason = null,
            };
            return AlarmStep.With(raised, AlarmChange.Raised);
        }

        return AlarmStep.Silent(state.PendingSince == since ? state : state with { PendingSince = since });
    }

    private static AlarmStep GoOnRaising(AlarmSettings settings, AlarmState state, DateTimeOffset now) =>
        state.PendingSince is null ? AlarmStep.Silent(state) : RaiseAfterDelay(settings, state, now);

    private static AlarmStep StopRaising(AlarmState state) => AlarmStep.Silent(state.PendingSince is null ? state : state with { PendingSince = null });

    private static AlarmStep HoldActive(AlarmState state) => AlarmStep.Silent(state.ClearSince is null ? state : state with { ClearSince = null });

    private static AlarmStep ReturnAfterDelay(AlarmSettings settings, AlarmState state, DateTimeOffset now, AlarmPhase target)
    {
        DateTimeOffset since = state.ClearSince is { } began && began <= now ? began : now;
        if (now - since >= settings.OffDelay)
        {
            return AlarmStep.With(
                state with { Phase = target, PendingSince = null, ClearSince = null, ChangedAt = now },
                settings.Latching ? AlarmChange.Latched : AlarmChange.ReturnedToNormal);
        }

        return AlarmStep.Silent(state.ClearSince == since ? state : state with { ClearSince = since });
    }

    private static AlarmStep Acknowledged(AlarmState state, in AlarmEvent e, DateTimeOffset now, AlarmPhase target) => AlarmStep.With(
        state with { Phase = target, ChangedAt = now, AcknowledgedAt = now, AcknowledgedBy = e.Who, AcknowledgedReason = e.Reason },
        AlarmChange.Acknowledged);

    private static AlarmStep Shelved(AlarmState state, in AlarmEvent e, DateTimeOffset now) => AlarmStep.With(
        state with { Suppression = AlarmSuppression.Shelved, ShelvedUntil = e.Until, SuppressionReason = $"{e.Who}: {e.Reason}", ChangedAt = now },
        AlarmChange.Shelved);

    private static AlarmStep TakenOut(AlarmState state, in AlarmEvent e, DateTimeOffset now) => AlarmStep.With(
        state with { Suppression = AlarmSuppression.OutOfService, ShelvedUntil = null, SuppressionReason = $"{e.Who}: {e.Reason}", ChangedAt = now },
        AlarmChange.TakenOutOfService);

    private static AlarmStep Shown(AlarmState state, DateTimeOffset now, AlarmChange change) => AlarmStep.With(
        state with { Suppression = AlarmSuppression.None, ShelvedUntil = null, SuppressionReason = null, ChangedAt = now },
        change);

    private static string? FaultOfWho(in AlarmEvent e, string action)
    {
        if (string.IsNullOrWhiteSpace(e.Who))
            return $"Cannot {action}: \"who\" is missing. Give the name of the person who asks.";
        if (e.Who.Length > LongestText || e.Reason?.Length > LongestText)
            return $"Cannot {action}: \"who\" and \"reason\" may have at most {LongestText} characters each. Shorten them.";
        return null;
    }

    private static string? FaultOfReason(in AlarmEvent e, string action) => FaultOfWho(e, action)
        ?? (string.IsNullOrWhiteSpace(e.Reason) ? $"Cannot {action}: \"reason\" is missing. Say in a few words why." : null);

    private static string? FaultOfShelf(AlarmSettings settings, in AlarmEvent e, DateTimeOffset now)
    {
        if (FaultOfReason(e, "shelve") is { } fault)
            return fault;
        if (e.Until is not { } until)
            return $"Cannot shelve: \"until\" is missing. Give its end, at most {Words(settings.LongestShelf)} from now.";
        if (until <= now)
            return $"Cannot shelve: \"until\" is not in the future. Give an end at most {Words(settings.LongestShelf)} from now.";
        if (until - now > settings.LongestShelf)
            return $"Cannot shelve for so long: this alarm may be shelved for {Words(settings.LongestShelf)} at a time. Give an earlier end.";
        return null;
    }

    private static string Words(TimeSpan span) => span.TotalHours >= 1 ? string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{span.TotalHours:0.##} h") : string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{span.TotalMinutes:0.##} min");
}
