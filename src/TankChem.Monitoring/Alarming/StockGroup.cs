namespace TankChem.Monitoring.Alarming;

/// <summary>A group of stock with common limits.</summary>
/// <param name="Id">Its id, as in configurations.</param>
/// <param name="Name">Its name on its own.</param>
/// <param name="InSentence">Its name inside a sentence: "limit 15 for salmonids".</param>
/// <param name="TanIsMeasured">Whether total ammonia is normally measured with this stock; plants and corals use it up.</param>
/// <param name="Limits">Its limits.</param>
public sealed record StockGroup(string Id, string Name, string InSentence, bool TanIsMeasured, IReadOnlyList<StockLimit> Limits);

/// <summary>One limit of a stock group, with the evidence it stands on. A default: sites know their stock better.</summary>
/// <param name="Quantity">The quantity.</param>
/// <param name="Side">Highest or lowest value.</param>
/// <param name="Level">How much crossing it matters.</param>
/// <param name="Value">The limit, canonical unit of the quantity.</param>
/// <param name="RaiseAt">Probability of being past it that raises the alarm: 0.1 where crossing it kills, else 0.5.</param>
/// <param name="Evidence">What is known to happen there.</param>
/// <param name="Source">Who found it; empty when nobody in particular.</param>
/// <param name="Mark">How well it is founded: "cited", "cited, second hand", "from memory" or "common practice, no source".</param>
public sealed record StockLimit(string Quantity, LimitSide Side, LimitLevel Level, double Value, double RaiseAt, string Evidence, string Source, string Mark)
{
    /// <summary>Id of the alarm rule that watches it: <c>co2-high</c>, <c>ph-low-urgent</c>, <c>nh3-n-high-danger</c> …</summary>
    public string Rule { get; } = string.Concat(
        Quantity,
        Side switch { LimitSide.High => "-high", LimitSide.Low => "-low" },
        Level switch { LimitLevel.Warn => "", LimitLevel.Urgent => "-urgent", LimitLevel.Danger => "-danger" });
}

/// <summary>Which way a limit is crossed.</summary>
public enum LimitSide
{
    /// <summary>A highest value.</summary>
    High,

    /// <summary>A lowest value.</summary>
    Low,
}

/// <summary>How much crossing a limit matters.</summary>
public enum LimitLevel
{
    /// <summary>Act today.</summary>
    Warn,

    /// <summary>Stock is in danger within hours.</summary>
    Urgent,

    /// <summary>Stock is being lost.</summary>
    Danger,
}
