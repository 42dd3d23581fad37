namespace TankChem.Dosing;

/// <summary>Advice that is not a reagent: gas off, more air, less feed, exchange.</summary>
/// <param name="Id">Stable id: <c>gas-off</c>, <c>add-air</c> …</param>
/// <param name="Title">What to do, imperative, one line.</param>
/// <param name="Allowed">Whether it breaks no limit.</param>
/// <param name="Reasons">Why, how sure, how far to go and where to stop.</param>
/// <param name="Cautions">What to watch and what must not be done.</param>
/// <param name="Path">Predicted CO2 and NH3-N along it, first now, for the corner chart; empty when not computable.</param>
public sealed record Remedy(string Id, string Title, bool Allowed, IReadOnlyList<string> Reasons, IReadOnlyList<string> Cautions, IReadOnlyList<RemedyPoint> Path);

/// <summary>A point on a remedy's way.</summary>
/// <param name="AfterS">Seconds from now.</param>
/// <param name="Co2MgL">Dissolved CO2, mg/L.</param>
/// <param name="Nh3NMgL">Un-ionised ammonia, mg/L as N; null when TAN is not known.</param>
/// <param name="PH">pH, NBS.</param>
public sealed record RemedyPoint(double AfterS, Estimate Co2MgL, Estimate? Nh3NMgL, Estimate PH);
