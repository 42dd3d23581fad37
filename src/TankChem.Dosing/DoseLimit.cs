namespace TankChem.Dosing;

/// <summary>An edge that the water must not cross because of a dose.</summary>
/// <param name="Quantity">The name of the value that is limited: <c>ph</c>, <c>co2</c>, <c>nh3-n</c>, <c>alkalinity</c>.</param>
/// <param name="IsUpper">True for a highest value, false for a lowest one.</param>
/// <param name="Value">The edge, in the quantity's canonical unit (pH NBS, mg/L CO2, mg/L NH3-N, mmol/L alkalinity).</param>
/// <param name="Lethal">Crossing it kills: it is held with probability 0.999 instead of 0.95.</param>
/// <param name="Text">The edge in words, with the stock group that sets it.</param>
public sealed record DoseLimit(string Quantity, bool IsUpper, double Value, bool Lethal, string Text);
