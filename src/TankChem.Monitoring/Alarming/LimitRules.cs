namespace TankChem.Monitoring.Alarming;

/// <summary>The rules behind the stock limits. Delays and deadbands are common practice, no source: longer than a probe's noise, shorter than what harms.</summary>
internal static class LimitRules
{
    /// <summary>All of them.</summary>
    public static IReadOnlyList<LimitRule> All { get; } =
    [
        new()
        {
            Quantity = "co2",
            Side = LimitSide.High,
            Name = "CO2",
            Word = "high",
            Title = "CO2 high",
            Unit = " mg/L",
            Digits = 1,
            Consequence = "Stock breathes hard, stops eating and is stunned; it can be lost within an hour, however good oxygen looks.",
            FirstAction = "Gas off, more air; no base.",
            DeadbandShare = 0.1,
        },
        new()
        {
            Quantity = "ph",
            Side = LimitSide.Low,
            Name = "pH",
            Word = "low",
            Title = "pH low",
            Unit = "",
            Digits = 2,
            Consequence = "CO2 is building up or alkalinity is used up; nitrification stops and stock is harmed.",
            FirstAction = "Gas off, more air, less feed; test alkalinity before adding anything.",
            DeadbandAbsolute = 0.1,
            GuardAbsolute = 0.15,
        },
        new()
        {
            Quantity = "ph",
            Side = LimitSide.High,
            Name = "pH",
            Word = "high",
            Title = "pH high",
            Unit = "",
            Digits = 2,
            Consequence = "Ammonia turns toxic: its un-ionised share grows tenfold with each pH unit.",
            FirstAction = "Stop dosing and feeding, test TAN; no acid by hand.",
            DeadbandAbsolute = 0.1,
            GuardAbsolute = 0.15,
        },
        new()
        {
            Quantity = "alkalinity",
            Side = LimitSide.Low,
            Name = "Alkalinity",
            Word = "low",
            Title = "Alkalinity low",
            Unit = " mmol/L",
            Digits = 2,
            Consequence = "pH loses its hold and can fall steeply within hours.",
            FirstAction = "Less feed; look at the dose plan: bicarbonate in steps, ammonia checked first.",
            DeadbandShare = 0.05,
            OnDelay = TimeSpan.Zero,
            OffDelay = TimeSpan.Zero,
        },
        new()
        {
            Quantity = "alkalinity",
            Side = LimitSide.High,
            Name = "Alkalinity",
            Word = "high",
            Title = "Alkalinity high",
            Unit = " mmol/L",
            Digits = 2,
            Consequence = "Calcium carbonate falls out and pH climbs.",
            FirstAction = "Stop dosing; test again.",
            DeadbandShare = 0.05,
            OnDelay = TimeSpan.Zero,
            OffDelay = TimeSpan.Zero,
        },
        new()
        {
            Quantity = "nh3-n",
            Side = LimitSide.High,
            Name = "Un-ionised ammonia",
            Word = "high",
            Title = "Ammonia high",
            Unit = " mg/L NH3-N",
            Digits = 4,
            Consequence = "Gills are harmed; at higher values stock dies within hours.",
            FirstAction = "Stop dosing and feeding, more oxygen; exchange with checked water; no acid by hand.",
            DeadbandShare = 0.1,
        },
        new()
        {
            Quantity = "nitrite",
            Side = LimitSide.High,
            Name = "Nitrite",
            Word = "high",
            Title = "Nitrite high",
            Unit = " mg/L N",
            Digits = 2,
            Consequence = "Blood carries less oxygen (brown blood).",
            FirstAction = "Less feed, more oxygen; in fresh water ask a competent person about salt.",
            DeadbandShare = 0.1,
            OnDelay = TimeSpan.Zero,
            OffDelay = TimeSpan.Zero,
        },
        new()
        {
            Quantity = "oxygen-saturation",
            Side = LimitSide.Low,
            Name = "Oxygen saturation",
            Word = "low",
            Title = "Oxygen saturation low",
            Unit = " %",
            Digits = 0,
            Consequence = "Stock suffocates; dense tanks are lost within minutes.",
            FirstAction = "Oxygen and air on; stop feeding.",
            OnDelay = TimeSpan.FromMinutes(1),
            DeadbandAbsolute = 3,
            GuardAbsolute = 5,
        },
        new()
        {
            Quantity = "oxygen",
            Side = LimitSide.Low,
            Name = "Oxygen",
            Word = "low",
            Title = "Oxygen low",
            Unit = " mg/L",
            Digits = 1,
            Consequence = "Stock suffocates; dense tanks are lost within minutes.",
            FirstAction = "Oxygen and air on; stop feeding.",
            OnDelay = TimeSpan.FromMinutes(1),
            DeadbandAbsolute = 0.3,
            GuardAbsolute = 0.5,
        },
        new()
        {
            Quantity = "temperature",
            Side = LimitSide.Low,
            Name = "Temperature",
            Word = "low",
            Title = "Temperature low",
            Unit = " °C",
            Digits = 1,
            Consequence = "Stock stops eating and weakens.",
            FirstAction = "Check heater and inflow; bring it back slowly.",
            OnDelay = TimeSpan.FromMinutes(10),
            OffDelay = TimeSpan.FromMinutes(10),
            DeadbandAbsolute = 0.5,
        },
        new()
        {
            Quantity = "temperature",
            Side = LimitSide.High,
            Name = "Temperature",
            Word = "high",
            Title = "Temperature high",
            Unit = " °C",
            Digits = 1,
            Consequence = "Stock needs more oxygen while the water holds less.",
            FirstAction = "More air, less feed; check chiller and inflow; bring it back slowly.",
            OnDelay = TimeSpan.FromMinutes(10),
            OffDelay = TimeSpan.FromMinutes(10),
            DeadbandAbsolute = 0.5,
        },
        new()
        {
            Quantity = "gas-pressure",
            Side = LimitSide.High,
            Name = "Total gas pressure",
            Word = "high",
            Title = "Gas pressure high",
            Unit = " %",
            Digits = 1,
            Consequence = "Gas bubble disease; losses begin within hours to days.",
            FirstAction = "Degas; look for air drawn in at a pump or a plunging inflow.",
            OnDelay = TimeSpan.FromMinutes(5),
            DeadbandAbsolute = 1,
        },
    ];

    /// <summary>The rule of a limit; a limit without one is a fault of the data file, found by a test.</summary>
    public static LimitRule For(StockLimit limit)
    {
        foreach (LimitRule rule in All)
        {
            if (rule.Quantity == limit.Quantity && rule.Side == limit.Side)
                return rule;
        }

        throw new InvalidOperationException($"stock-limits.json has a limit on \"{limit.Quantity}\" ({limit.Side}) that no rule watches. Add one to LimitRules.");
    }
}
