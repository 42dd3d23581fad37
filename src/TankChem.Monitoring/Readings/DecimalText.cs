using System.Globalization;

namespace TankChem.Monitoring.Readings;

/// <summary>Numbers as people type them: 7,2 and 7.2 are the same.</summary>
public static class DecimalText
{
    /// <summary>Reads a number.</summary>
    /// <param name="text">As typed.</param>
    /// <param name="value">The number, finite.</param>
    /// <param name="fault">What is wrong and what would be right; null when read.</param>
    public static bool TryParse(string? text, out double value, out string? fault)
    {
        value = double.NaN;
        string plain = text?.Trim() ?? "";
        if (plain.Length == 0)
        {
            fault = "A number is needed, like 7.2 or 7,2.";
            return false;
        }

        if (plain.Count(c => c is ',' or '.') > 1)
        {
            fault = $"\"{plain}\" has more than one decimal mark; write it without thousands marks, like 1234.5.";
            return false;
        }

        if (!double.TryParse(plain.Replace(',', '.'), NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out value) || !double.IsFinite(value))
        {
            fault = $"\"{plain}\" is not a number; right would be like 7.2 or 7,2.";
            return false;
        }

        fault = null;
        return true;
    }
}
