namespace TankChem.Dosing;

/// <summary>What a water will be after a step.</summary>
/// <param name="Place">The tank it is about.</param>
/// <param name="PH">pH, NBS.</param>
/// <param name="Co2MgL">Dissolved CO2, mg/L.</param>
/// <param name="Nh3NMgL">Un-ionised ammonia, mg/L as N; null when TAN is not known.</param>
/// <param name="AlkalinityMmolL">Alkalinity, mmol/L.</param>
/// <param name="OmegaCalcite">Saturation state of calcite; null where calcium is not known.</param>
/// <param name="OmegaAragonite">Saturation state of aragonite; null where calcium is not known.</param>
public sealed record PredictedWater(string Place, Estimate PH, Estimate Co2MgL, Estimate? Nh3NMgL, Estimate AlkalinityMmolL, double? OmegaCalcite, double? OmegaAragonite = null);
