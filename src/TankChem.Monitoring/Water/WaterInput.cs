using TankChem.Monitoring.Places;

namespace TankChem.Monitoring.Water;

/// <summary>A reading that a value came from.</summary>
/// <param name="Quantity">Its quantity.</param>
/// <param name="Probe">Its probe.</param>
/// <param name="Place">Where it was taken: the place itself, its loop, or its site.</param>
/// <param name="Time">When it was taken.</param>
/// <param name="AgeS">Its age at the state's time, s.</param>
public sealed record WaterInput(string Quantity, string Probe, PlaceKey Place, DateTimeOffset Time, double AgeS);
