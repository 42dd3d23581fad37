using System.Collections.Frozen;

namespace TankChem.Monitoring.Readings;

/// <summary>All quantities with a meaning of their own; any other name is taken in, trended and may carry an alarm.</summary>
/// <remarks>Ranges are what is physically possible in a water that holds animals, wide enough for any stock (common practice, no source).</remarks>
public static class QuantityCatalog
{
    private static readonly QuantityDefinition[] Definitions =
    [
        new("ph", "pH", "pH", 2) { Min = 0, Max = 14, OldestUsed = TimeSpan.FromMinutes(10) },
        new("alkalinity", "alkalinity", "mmol/L", 2) { Min = 0, Max = 100, NeedsConfirmedUnit = true, OldestUsed = TimeSpan.FromDays(14), UnitChoices = ["mmol/L", "meq/L", "dKH", "mg/L CaCO3"] },
        new("temperature", "temperature", "°C", 1) { Min = -5, Max = 60, OldestUsed = TimeSpan.FromHours(1), UnitChoices = ["Cel", "degF"] },
        new("salinity", "salinity", "", 2) { Min = 0, Max = 60, OldestUsed = TimeSpan.FromDays(14) },
        new("conductivity", "conductivity", "µS/cm", 0) { Min = 0, Max = 100_000, OldestUsed = TimeSpan.FromDays(1), UnitChoices = ["uS/cm", "mS/cm"] },
        new("oxygen", "oxygen", "mg/L", 2) { Min = 0, Max = 60, NeedsConfirmedUnit = true, OldestUsed = TimeSpan.FromMinutes(10), UnitChoices = ["mg/L"] },
        new("oxygen-saturation", "oxygen saturation", "%", 0) { Min = 0, Max = 500, OldestUsed = TimeSpan.FromMinutes(10) },
        new("tan", "total ammonia nitrogen", "mg/L", 3) { Min = 0, Max = 200, NeedsConfirmedUnit = true, OldestUsed = TimeSpan.FromDays(3), UnitChoices = ["mg/L", "mg/L NH4", "mg/L NH3", "ug/L"] },
        new("nitrite", "nitrite nitrogen", "mg/L", 3) { Min = 0, Max = 200, NeedsConfirmedUnit = true, OldestUsed = TimeSpan.FromDays(3), UnitChoices = ["mg/L", "mg/L NO2", "ug/L"] },
        new("calcium", "calcium", "mg/L", 0) { Min = 0, Max = 5_000, NeedsConfirmedUnit = true, OldestUsed = TimeSpan.FromDays(30), UnitChoices = ["mg/L", "mmol/L", "mg/L CaCO3"] },
        new("pco2", "pCO2", "µatm", 0) { Min = 0, Max = 1_000_000, OldestUsed = TimeSpan.FromMinutes(30) },
        new("air-co2", "CO2 of the air", "ppm", 0) { Min = 0, Max = 1_000_000, OldestUsed = TimeSpan.FromMinutes(30) },
        new("air-pressure", "air pressure", "hPa", 0) { Min = 400, Max = 1_200, OldestUsed = TimeSpan.FromHours(3), UnitChoices = ["hPa", "mm[Hg]"] },
        new("gas-pressure", "total gas pressure", "%", 1) { Min = 20, Max = 300, OldestUsed = TimeSpan.FromMinutes(30) },
        new("injection", "CO2 injected", "g/h", 1) { Min = 0, Max = 1_000_000, OldestUsed = TimeSpan.FromMinutes(10) },
        new("injection-on", "CO2 injection", "", 0) { Min = 0, Max = 1, OldestUsed = TimeSpan.FromMinutes(10) },
        new("light", "light", "µmol/(m² s)", 0) { Min = 0, Max = 5_000, OldestUsed = TimeSpan.FromMinutes(30) },
        new("flow", "flow", "L/min", 1) { Min = 0, Max = 10_000_000, OldestUsed = TimeSpan.FromMinutes(30), UnitChoices = ["L/min", "L/s", "m3/h"] },
        new("level", "level", "m", 2) { Min = -10, Max = 100, OldestUsed = TimeSpan.FromMinutes(30), UnitChoices = ["m", "cm"] },
        new("feed", "feed", "kg", 2) { Min = 0, Max = 100_000, OldestUsed = TimeSpan.FromDays(1), UnitChoices = ["kg", "g"] },
        new(SeriesKey.DeviceState, "device state", "", 0) { Min = 0, Max = 1, OldestUsed = TimeSpan.FromDays(365) },
        Computed("co2", "dissolved CO2", "mg/L", 1),
        Computed("hco3", "bicarbonate", "mmol/L", 3),
        Computed("co3", "carbonate", "mmol/L", 4),
        Computed("dic", "dissolved inorganic carbon", "mmol/L", 3),
        new("pco2-measured", "measured pCO2", "µatm", 0) { Computed = true },
        Computed("ph-air", "pH in equilibrium with this air", "pH", 2),
        Computed("co2-air", "CO2 in equilibrium with this air", "mg/L", 2),
        Computed("ph-injected", "pH in equilibrium with the CO2 supply", "pH", 2),
        Computed("buffer-closed", "buffer intensity, closed", "mmol/L per pH", 3),
        Computed("buffer-open", "buffer intensity, open to the air", "mmol/L per pH", 3),
        Computed("nh3-n", "un-ionised ammonia", "mg/L", 4),
        Computed("omega-calcite", "saturation state of calcite", "", 2),
        Computed("omega-aragonite", "saturation state of aragonite", "", 2),
    ];

    private static readonly FrozenDictionary<string, QuantityDefinition> ById = Definitions.ToFrozenDictionary(d => d.Id, StringComparer.Ordinal);

    /// <summary>All of them, those taken in first, then those computed.</summary>
    public static IReadOnlyList<QuantityDefinition> All => Definitions;

    /// <summary>The definition of an id; for an unknown one a plain definition without unit and range.</summary>
    public static QuantityDefinition Get(string id) => ById.GetValueOrDefault(id) ?? new QuantityDefinition(id, id.Replace('-', ' '), "", 2);

    private static QuantityDefinition Computed(string id, string name, string unit, int digits) => new(id, name, unit, digits) { Computed = true };
}
