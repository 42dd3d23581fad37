namespace TankChem.Dosing;

/// <summary>A dose plan (advice) or its refusal.</summary>
public sealed record DosePlan
{
    /// <summary>Whether the plan breaks nothing; false also when an input is missing.</summary>
    public required bool Allowed { get; init; }

    /// <summary>Why not; empty when allowed.</summary>
    public required IReadOnlyList<DoseGround> Grounds { get; init; }

    /// <summary>The steps; those of a refused plan show what would have happened, and are empty when an input is missing.</summary>
    public required IReadOnlyList<DoseStep> Steps { get; init; }

    /// <summary>Why this reagent, amount and pace, one sentence each.</summary>
    public required IReadOnlyList<string> Reasons { get; init; }

    /// <summary>Cautions: handling, what to watch, who must decide.</summary>
    public required IReadOnlyList<string> Cautions { get; init; }

    /// <summary>The nearest thing that is allowed, in words; null when there is none or the plan is allowed.</summary>
    public string? Nearest { get; init; }

    /// <summary>Alkalinity that the plan reaches, mmol/L; null without steps.</summary>
    public double? ReachesMmolL { get; init; }
}
