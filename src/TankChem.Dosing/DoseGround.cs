namespace TankChem.Dosing;

/// <summary>Why a plan is not allowed.</summary>
/// <param name="Kind"><c>limit</c> (an edge would be crossed) or <c>input</c> (something is missing, old, or of unconfirmed unit).</param>
/// <param name="Quantity">The quantity it is about.</param>
/// <param name="Text">In words, with what would be right.</param>
/// <param name="Probability">Probability of crossing the limit, 0…1; null for an input.</param>
public sealed record DoseGround(string Kind, string Quantity, string Text, double? Probability);
