using System.Globalization;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Dashboard.Text;

/// <summary>Numbers for people: the unit and the uncertainty beside them, no more digits than make sense.</summary>
internal static class NumberText
{
    /// <summary>A value without its unit.</summary>
    public static string Plain(string quantity, double value) => value.ToString(Format(QuantityCatalog.Get(quantity).Digits), CultureInfo.InvariantCulture);

    /// <summary>A value with its unit.</summary>
    public static string WithUnit(string quantity, double value) => Join(Plain(quantity, value), Unit(quantity));

    /// <summary>A water value: <c>11.8 ± 1.6 mg/L</c>.</summary>
    public static string Full(string quantity, WaterValue value)
    {
        QuantityDefinition definition = QuantityCatalog.Get(quantity);
        int digits = definition.Digits;
        string number = value.Value.ToString(Format(digits), CultureInfo.InvariantCulture);
        if (value.U is { } u)
        {
            // An uncertainty that rounds to nothing would say that there is none.
            string spread = u.ToString(Format(digits), CultureInfo.InvariantCulture);
            if (u > 0 && double.Parse(spread, CultureInfo.InvariantCulture) == 0)
                spread = u.ToString("0.#######", CultureInfo.InvariantCulture)[..Math.Min(7, u.ToString("0.#######", CultureInfo.InvariantCulture).Length)];
            number = $"{number} ± {spread}";
        }

        return Join(number, value.Unit == "pH" ? "" : value.Unit);
    }

    /// <summary>The unit on screens; pH is its own word.</summary>
    public static string Unit(string quantity) => QuantityCatalog.Get(quantity).Unit is var unit && unit == "pH" ? "" : unit;

    /// <summary>The name as a heading.</summary>
    public static string Heading(string quantity)
    {
        string name = QuantityCatalog.Get(quantity).Name;
        return name.StartsWith("pH", StringComparison.Ordinal) || name.StartsWith("pCO2", StringComparison.Ordinal) ? name : char.ToUpperInvariant(name[0]) + name[1..];
    }

    /// <summary>A unit code as people read it.</summary>
    public static string UnitName(string code) => code switch
    {
        "Cel" => "°C",
        "degF" => "°F",
        "uS/cm" => "µS/cm",
        "ug/L" => "µg/L",
        "mm[Hg]" => "mmHg",
        "mg/L" => "mg/L",
        _ => code,
    };

    private static string Format(int digits) => digits <= 0 ? "0" : "0." + new string('0', digits);

    private static string Join(string number, string unit) => unit.Length == 0 ? number : $"{number} {unit}";
}
