namespace TankChem.Dosing;

/// <summary>What the water shall be.</summary>
/// <param name="Quantity">Today: <c>alkalinity</c>.</param>
/// <param name="Value">In canonical unit: mmol/L.</param>
public sealed record DoseTarget(string Quantity, double Value);
