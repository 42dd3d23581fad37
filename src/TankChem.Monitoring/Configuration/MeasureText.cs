using System.Globalization;
using TankChem.Chemistry;

namespace TankChem.Monitoring.Configuration;

/// <summary>Amounts with their unit as people write them: <c>42 m3</c>, <c>310 L</c>, <c>42 mg/L</c>, <c>120 mg/L CaCO3</c>.</summary>
public static class MeasureText
{
    private const double LitresPerGallon = 3.785411784;

    /// <summary>A volume, m³.</summary>
    public static bool TryVolume(string text, out double cubicMetres, out string? fault) => TryRead(
        text, "42 m3, 310 L or 80 gal", out cubicMetres, out fault, unit => unit switch
        {
            "m3" or "m³" => 1,
            "L" or "l" => 1e-3,
            "gal" or "[gal_us]" => LitresPerGallon * 1e-3,
            _ => null,
        });

    /// <summary>A mass of an ion per litre, mg/L.</summary>
    public static bool TryMassPerLitre(string text, out double mgL, out string? fault) => TryRead(
        text, "42 mg/L", out mgL, out fault, unit => unit switch
        {
            "mg/L" or "mg/l" => 1,
            "ug/L" or "µg/L" => 1e-3,
            "g/L" => 1e3,
            _ => null,
        });

    /// <summary>A hardness, mmol/L of Ca + Mg.</summary>
    public static bool TryHardness(string text, out double mmolL, out string? fault) => TryRead(
        text, "120 mg/L CaCO3, 6.7 dGH or 1.2 mmol/L", out mmolL, out fault, unit => unit switch
        {
            "mmol/L" => 1,
            "mg/L CaCO3" or "ppm CaCO3" => 1 / MolarMass.CalciumCarbonate,
            "dGH" or "dH" or "°dH" => 10 / 56.0774,
            _ => null,
        });

    /// <summary>A span of time: <c>10 min</c>, <c>3 d</c>.</summary>
    public static bool TryDuration(string text, out TimeSpan span, out string? fault)
    {
        bool read = TryRead(text, "10 min, 2 h or 3 d", out double seconds, out fault, unit => unit switch
        {
            "s" => 1,
            "min" => 60,
            "h" => 3600,
            "d" => 86400,
            _ => null,
        });
        span = read && seconds < TimeSpan.MaxValue.TotalSeconds ? TimeSpan.FromSeconds(seconds) : default;
        return read;
    }

    private static bool TryRead(string text, string right, out double value, out string? fault, Func<string, double?> factorOf)
    {
        string plain = text.Trim();
        int split = 0;
        while (split < plain.Length && (char.IsAsciiDigit(plain[split]) || plain[split] is '.' or '-' or '+' or 'e' or 'E'))
            split++;
        value = double.NaN;
        if (!double.TryParse(plain.AsSpan(0, split), NumberStyles.Float, CultureInfo.InvariantCulture, out double number) || !double.IsFinite(number))
        {
            fault = $"\"{text}\" does not begin with a number; right would be like {right}";
            return false;
        }

        if (factorOf(plain[split..].Trim()) is not { } factor)
        {
            fault = plain[split..].Trim().Length == 0 ? $"\"{text}\" has no unit; right would be like {right}" : $"\"{text}\": the unit \"{plain[split..].Trim()}\" is not known here; right would be like {right}";
            return false;
        }

        if (number < 0)
        {
            fault = $"\"{text}\" is negative";
            return false;
        }

        value = number * factor;
        fault = null;
        return true;
    }
}
