namespace TankChem.Monitoring.Water;

/// <summary>Why a value of a place cannot be computed.</summary>
/// <param name="Value">The value that is missing, as in a sentence: "CO2".</param>
/// <param name="Quantity">The input at fault.</param>
/// <param name="Kind">What is wrong with it.</param>
/// <param name="Text">In words: "alkalinity last known 1 May 07:10 UTC".</param>
public sealed record KnowledgeGap(string Value, string Quantity, KnowledgeGapKind Kind, string Text);

/// <summary>What is wrong with an input.</summary>
public enum KnowledgeGapKind
{
    /// <summary>It was never heard of.</summary>
    NeverKnown,

    /// <summary>It is older than is used.</summary>
    TooOld,

    /// <summary>It is there but may not be used (unit not confirmed, suspect).</summary>
    NotUsable,

    /// <summary>No water has these values together.</summary>
    Impossible,
}

/// <summary>A water state, and what is missing in it.</summary>
/// <param name="State">The state.</param>
/// <param name="Gaps">What is missing and why.</param>
/// <param name="StaysUntil">The next instant at which an input becomes too old; <see cref="DateTimeOffset.MaxValue"/> when none will.</param>
public sealed record WaterAssessment(WaterState State, IReadOnlyList<KnowledgeGap> Gaps, DateTimeOffset StaysUntil);
