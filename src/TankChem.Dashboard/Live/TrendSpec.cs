using TankChem.Monitoring.Ports;

namespace TankChem.Dashboard.Live;

/// <summary>What a chart draws; neutral to the library that draws it.</summary>
/// <param name="Quantity">The quantity.</param>
/// <param name="Points">Time (ms, site's clock), lowest, mean, highest of each bucket, one after the other.</param>
/// <param name="From">Start of the axis, ms.</param>
/// <param name="To">End of the axis, ms.</param>
/// <param name="GapMs">Two buckets further apart than this have a gap between them.</param>
/// <param name="Low">Bottom of the axis.</param>
/// <param name="High">Top of the axis.</param>
/// <param name="Digits">Decimals.</param>
/// <param name="Unit">Unit; empty when there is none.</param>
/// <param name="Limits">Limits that fit on the axis.</param>
/// <param name="InWords">The trend in a sentence, for those who cannot see it.</param>
public sealed record TrendSpec(string Quantity, double[] Points, double From, double To, double GapMs, double Low, double High, int Digits, string Unit, IReadOnlyList<PlaceLimit> Limits, string InWords);
