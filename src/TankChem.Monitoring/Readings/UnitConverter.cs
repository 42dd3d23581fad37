using System.Collections.Frozen;
using TankChem.Chemistry;

namespace TankChem.Monitoring.Readings;

/// <summary>Converts what the trade writes (UCUM codes and the trade's own) to canonical units.</summary>
/// <remarks>Factors: 1 dKH is 10 mg/L CaO, 0.35663 mmol/L of alkalinity (definition of the German degree); CaCO3 carries two equivalents.
/// Amounts per kilogram are taken at 1 kg/L for want of a density here, which is within 3 % even in sea water and below any titration's uncertainty; the caller that knows the density converts by itself.</remarks>
public static class UnitConverter
{
    private const double DegreeKH = 2 * 10 / 56.0774;
    private const double Caco3 = 2 / MolarMass.CalciumCarbonate;
    private const double MassOfHydrogen = 1.008;
    private const double MassOfOxygen = 15.999;

    private static readonly FrozenDictionary<string, Scale[]> Units = new Dictionary<string, Scale[]>(StringComparer.Ordinal)
    {
        ["ph"] = [new("pH", 1), new("[pH]", 1)],
        ["alkalinity"] =
        [
            new("mmol/L", 1), new("meq/L", 1), new("dKH", DegreeKH), new("{dKH}", DegreeKH), new("mg/L CaCO3", Caco3), new("mg{CaCO3}/L", Caco3), new("ppm CaCO3", Caco3),
            new("umol/L", 1e-3), new("ueq/L", 1e-3), new("umol/kg", 1e-3), new("mmol/kg", 1), new("mol/L", 1000), new("eq/L", 1000),
        ],
        ["temperature"] = [new("Cel", 1), new("°C", 1), new("C", 1), new("K", 1, -273.15), new("degF", 5.0 / 9, -160.0 / 9), new("[degF]", 5.0 / 9, -160.0 / 9), new("°F", 5.0 / 9, -160.0 / 9)],
        ["salinity"] = [new("1", 1), new("{PSU}", 1), new("PSU", 1), new("psu", 1), new("[ppth]", 1), new("ppt", 1), new("g/kg", 1), new("g/L", 1), new("/", 1000)],
        ["conductivity"] = [new("uS/cm", 1), new("µS/cm", 1), new("mS/cm", 1000), new("S/m", 10000), new("mS/m", 10)],
        ["oxygen"] = [new("mg/L", 1), new("mg/l", 1), new("ug/L", 1e-3), new("mmol/L", 2 * MassOfOxygen), new("umol/L", 2e-3 * MassOfOxygen), new("g/m3", 1), new("kg/m3", 1000)],
        ["oxygen-saturation"] = [new("%", 1), new("/", 100)],
        ["tan"] = Nitrogen("NH4", MolarMass.Nitrogen + 4 * MassOfHydrogen, "NH3", MolarMass.Nitrogen + 3 * MassOfHydrogen),
        ["nitrite"] = Nitrogen("NO2", MolarMass.Nitrogen + 2 * MassOfOxygen, null, 0),
        ["calcium"] = [new("mg/L", 1), new("mg/l", 1), new("mmol/L", MolarMass.Calcium), new("mg/L CaCO3", MolarMass.Calcium / MolarMass.CalciumCarbonate), new("kg/m3", 1000)],
        ["pco2"] = [new("µatm", 1), new("uatm", 1), new("Pa", 1e6 / 101325), new("hPa", 1e8 / 101325), new("kPa", 1e9 / 101325), new("mm[Hg]", 1e6 / 760), new("mmHg", 1e6 / 760)],
        ["air-co2"] = [new("ppm", 1), new("[ppm]", 1), new("%", 1e4), new("/", 1e6)],
        ["air-pressure"] = [new("hPa", 1), new("Pa", 0.01), new("kPa", 10), new("mbar", 1), new("bar", 1000), new("mm[Hg]", 1013.25 / 760), new("mmHg", 1013.25 / 760), new("atm", 1013.25)],
        ["gas-pressure"] = [new("%", 1), new("/", 100)],
        ["injection"] = [new("g/h", 1), new("kg/h", 1000), new("g/d", 1.0 / 24)],
        ["injection-on"] = [new("1", 1)],
        ["light"] = [new("µmol/(m² s)", 1), new("umol/m2/s", 1), new("umol/(m2.s)", 1)],
        ["flow"] = [new("L/min", 1), new("L/s", 60), new("m3/h", 1000.0 / 60), new("m3/s", 60000), new("L/h", 1.0 / 60), new("gal/min", 3.785411784)],
        ["level"] = [new("m", 1), new("cm", 0.01), new("mm", 0.001)],
        ["feed"] = [new("kg", 1), new("g", 0.001), new("lb", 0.45359237)],
        [SeriesKey.DeviceState] = [new("1", 1)],
    }.ToFrozenDictionary(StringComparer.Ordinal);

    /// <summary>Converts to the canonical unit of a quantity.</summary>
    /// <param name="quantity">Quantity id.</param>
    /// <param name="unit">Unit as written: UCUM, or <c>dKH</c>, <c>mg/L CaCO3</c>, <c>meq/L</c>, <c>degF</c> …</param>
    /// <param name="raw">The number.</param>
    /// <param name="canonical">The number in canonical unit.</param>
    /// <param name="fault">What is wrong and which units would be right; null when converted.</param>
    public static bool TryConvert(string quantity, string unit, double raw, out double canonical, out string? fault)
    {
        ArgumentNullException.ThrowIfNull(unit);
        fault = null;
        if (!Units.TryGetValue(quantity, out Scale[]? scales))
        {
            // A quantity that has no meaning of its own keeps its number; its unit is kept beside it.
            canonical = raw;
            return true;
        }

        foreach (Scale scale in scales)
        {
            if (scale.Unit == unit)
            {
                canonical = raw * scale.Factor + scale.Offset;
                return true;
            }
        }

        canonical = double.NaN;
        fault = $"the unit \"{unit}\" does not fit {QuantityCatalog.Get(quantity).Name}; right would be {string.Join(", ", scales.Select(s => s.Unit))}";
        return false;
    }

    /// <summary>Converts back from the canonical unit, for showing in a tank's own unit.</summary>
    /// <param name="quantity">Quantity id.</param>
    /// <param name="unit">The unit to show.</param>
    /// <param name="canonical">The number in canonical unit.</param>
    /// <param name="raw">The number in that unit.</param>
    public static bool TryConvertBack(string quantity, string unit, double canonical, out double raw)
    {
        raw = canonical;
        if (!Units.TryGetValue(quantity, out Scale[]? scales))
            return true;
        foreach (Scale scale in scales)
        {
            if (scale.Unit == unit)
            {
                raw = (canonical - scale.Offset) / scale.Factor;
                return true;
            }
        }

        raw = double.NaN;
        return false;
    }

    private static Scale[] Nitrogen(string first, double firstMass, string? second, double secondMass)
    {
        List<Scale> scales =
        [
            new("mg/L", 1), new("mg/l", 1), new("mg/L N", 1), new("mg{N}/L", 1), new("ug/L", 1e-3), new("umol/L", MolarMass.Nitrogen * 1e-3), new("mmol/L", MolarMass.Nitrogen), new("kg/m3", 1000),
            new($"mg/L {first}", MolarMass.Nitrogen / firstMass),
        ];
        if (second is not null)
            scales.Add(new($"mg/L {second}", MolarMass.Nitrogen / secondMass));
        return [.. scales];
    }

    private sealed record Scale(string Unit, double Factor, double Offset = 0);
}
