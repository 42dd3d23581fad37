using TankChem.Monitoring.Places;

namespace TankChem.Monitoring.Alarming;

/// <summary>Names one alarm: a place and a rule that holds there.</summary>
/// <param name="Place">Where.</param>
/// <param name="Rule">Rule id, as in topics: <c>co2-high</c>, <c>ph-low-urgent</c>, <c>ph-silent</c> …</param>
public readonly record struct AlarmKey(PlaceKey Place, string Rule);
