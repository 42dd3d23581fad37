namespace TankChem.Alarms;

/// <summary>What a step of the machine gives.</summary>
/// <param name="State">The state after it; the same instance when nothing changed.</param>
/// <param name="Changes">What happened, in order: one journal line each. Empty when only a delay began or ended, or nothing did.</param>
/// <param name="Refusal">Why a command was refused: what is wrong, and what would be right; null when it was taken.</param>
public readonly record struct AlarmStep(AlarmState State, IReadOnlyList<AlarmChange> Changes, string? Refusal)
{
    /// <summary>A step that changed nothing worth a journal line.</summary>
    public static AlarmStep Silent(AlarmState state) => new(state, [], null);

    /// <summary>A step with one change.</summary>
    public static AlarmStep With(AlarmState state, AlarmChange change) => new(state, [change], null);

    /// <summary>A refused command; the state stays.</summary>
    public static AlarmStep Refused(AlarmState state, string refusal) => new(state, [], refusal);
}
