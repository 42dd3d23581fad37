using System.Text;

namespace TankChem.Alarms.Tests;

/// <summary>Writes the state × event tables of docs/alarms.md by asking the machine about every cell.</summary>
internal static class AlarmTables
{
    public static readonly DateTimeOffset Now = new(2026, 5, 1, 10, 0, 0, TimeSpan.Zero);

    public static AlarmSettings Plain { get; } = new() { OnDelay = TimeSpan.FromMinutes(2), OffDelay = TimeSpan.FromMinutes(5) };

    public static AlarmSettings Latching { get; } = Plain with { Latching = true };

    public static AlarmState InPhase(AlarmPhase phase) => AlarmState.Normal with
    {
        Phase = phase,
        RaisedAt = phase == AlarmPhase.Normal ? null : Now.AddHours(-1),
        AcknowledgedBy = phase is AlarmPhase.Acknowledged or AlarmPhase.LatchedAcknowledged ? "Ada" : null,
    };

    public static AlarmState Suppressed(AlarmSuppression suppression) => AlarmState.Normal with
    {
        Suppression = suppression,
        ShelvedUntil = suppression == AlarmSuppression.Shelved ? Now.AddHours(1) : null,
    };

    public static AlarmEvent EventOf(AlarmEventKind kind) => kind switch
    {
        AlarmEventKind.Shelve => new AlarmEvent(kind, "Ada", "probe is in the buffer", Now.AddHours(1)),
        AlarmEventKind.SuppressByDesign => new AlarmEvent(kind, Reason: "the mains is off"),
        AlarmEventKind.ConditionPresent or AlarmEventKind.ConditionAbsent or AlarmEventKind.ConditionUnknown or AlarmEventKind.EndSuppression => new AlarmEvent(kind),
        AlarmEventKind.Acknowledge or AlarmEventKind.Reset or AlarmEventKind.Unshelve or AlarmEventKind.TakeOutOfService or AlarmEventKind.ReturnToService => new AlarmEvent(kind, "Ada", "seen"),
    };

    private static readonly (string Name, AlarmEventKind Kind, AlarmSettings Settings, Func<AlarmState, AlarmState> Prepare)[] LifeRows =
    [
        ("condition present, on-delay runs", AlarmEventKind.ConditionPresent, Plain, state => state),
        ("condition present, on-delay over", AlarmEventKind.ConditionPresent, Plain, state => state with { PendingSince = Now.AddMinutes(-2) }),
        ("condition absent, off-delay runs", AlarmEventKind.ConditionAbsent, Plain, state => state),
        ("condition absent, off-delay over", AlarmEventKind.ConditionAbsent, Plain, state => state with { ClearSince = Now.AddMinutes(-5) }),
        ("condition absent, off-delay over, latching", AlarmEventKind.ConditionAbsent, Latching, state => state with { ClearSince = Now.AddMinutes(-5) }),
        ("condition unknown, no delay runs", AlarmEventKind.ConditionUnknown, Plain, state => state),
        ("condition unknown, on-delay over", AlarmEventKind.ConditionUnknown, Plain, state => state with { PendingSince = Now.AddMinutes(-2) }),
        ("condition unknown, off-delay over", AlarmEventKind.ConditionUnknown, Plain, state => state with { ClearSince = Now.AddMinutes(-5) }),
        ("acknowledge", AlarmEventKind.Acknowledge, Plain, state => state),
        ("reset", AlarmEventKind.Reset, Plain, state => state),
    ];

    private static readonly AlarmEventKind[] SuppressionRows =
    [
        AlarmEventKind.Shelve,
        AlarmEventKind.Unshelve,
        AlarmEventKind.TakeOutOfService,
        AlarmEventKind.ReturnToService,
        AlarmEventKind.SuppressByDesign,
        AlarmEventKind.EndSuppression,
    ];

    public static string Life()
    {
        AlarmPhase[] phases = Enum.GetValues<AlarmPhase>();
        var table = new StringBuilder("| event | ").AppendJoin(" | ", phases.Select(phase => Words(phase.ToString()))).Append(" |\n| --- ");
        table.Insert(table.Length, "| --- ", phases.Length).Append("|\n");
        foreach ((string name, AlarmEventKind kind, AlarmSettings settings, Func<AlarmState, AlarmState> prepare) in LifeRows)
        {
            table.Append("| ").Append(name);
            foreach (AlarmPhase phase in phases)
            {
                AlarmState before = prepare(InPhase(phase));
                AlarmStep step = AlarmMachine.Step(settings, before, EventOf(kind), Now);
                table.Append(" | ").Append(Cell(before, step, step.State.Phase == before.Phase ? null : Words(step.State.Phase.ToString())));
            }

            table.Append(" |\n");
        }

        return table.ToString();
    }

    public static string Suppression()
    {
        AlarmSuppression[] suppressions = Enum.GetValues<AlarmSuppression>();
        var table = new StringBuilder("| event | ").AppendJoin(" | ", suppressions.Select(one => Words(one.ToString()))).Append(" |\n| --- ");
        table.Insert(table.Length, "| --- ", suppressions.Length).Append("|\n");
        foreach (AlarmEventKind kind in SuppressionRows)
        {
            table.Append("| ").Append(Words(kind.ToString()));
            foreach (AlarmSuppression suppression in suppressions)
            {
                AlarmState before = Suppressed(suppression);
                AlarmStep step = AlarmMachine.Step(Plain, before, EventOf(kind), Now);
                table.Append(" | ").Append(Cell(before, step, step.State.Suppression == before.Suppression ? null : Words(step.State.Suppression.ToString())));
            }

            table.Append(" |\n");
        }

        return table.ToString();
    }

    private static string Cell(AlarmState before, AlarmStep step, string? target)
    {
        if (step.Refusal is not null)
            return "refused";
        string changes = string.Join(", ", step.Changes.Select(change => Words(change.ToString())));
        if (target is not null)
            return $"→ {target} ({changes})";
        if (changes.Length > 0)
            return $"stays ({changes})";
        return (before.PendingSince, step.State.PendingSince, before.ClearSince, step.State.ClearSince) switch
        {
            (null, not null, _, _) => "on-delay begins",
            (not null, null, _, _) => "on-delay ends",
            (_, _, null, not null) => "off-delay begins",
            (_, _, not null, null) => "off-delay ends",
            _ => "–",
        };
    }

    private static string Words(string name)
    {
        var words = new StringBuilder();
        foreach (char letter in name)
        {
            if (char.IsUpper(letter) && words.Length > 0)
                words.Append(' ');
            words.Append(char.ToLowerInvariant(letter));
        }

        return words.ToString();
    }
}
