namespace TankChem.Storage;

/// <summary>The two time series of the store and how trends see them. All texts are constants of this file.</summary>
/// <param name="Name">Table of the values.</param>
/// <param name="Id">Its column for the series.</param>
/// <param name="Counts">Which rows count in a trend.</param>
/// <param name="Rollup">Table of the hour and day figures.</param>
/// <param name="Dictionary">Table of the series.</param>
internal sealed record SeriesTable(string Name, string Id, string Counts, string Rollup, string Dictionary)
{
    /// <summary>Readings: only those of good quality count.</summary>
    public static SeriesTable Readings { get; } = new("reading", "series_id", "flag = 1 AND value IS NOT NULL", "reading_rollup", "series");

    /// <summary>Values of water states.</summary>
    public static SeriesTable States { get; } = new("state_value", "state_series_id", "value IS NOT NULL", "state_rollup", "state_series");
}
