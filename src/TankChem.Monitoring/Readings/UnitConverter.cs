namespace TankChem.Monitoring.Readings;

/// <summary>Converts what the trade writes (UCUM codes and the trade's own) to canonical units.</summary>
public static class UnitConverter
{
    /// <summary>Converts to the canonical unit of a quantity.</summary>
    /// <param name="quantity">Quantity id.</param>
    /// <param name="unit">Unit as written: UCUM, or <c>dKH</c>, <c>mg/L CaCO3</c>, <c>meq/L</c>, <c>degF</c> …</param>
    /// <param name="raw">The number.</param>
    /// <param name="canonical">The number in canonical unit.</param>
    /// <param name="fault">What is wrong and which units would be right; null when converted.</param>
    public static bool TryConvert(string quantity, string unit, double raw, out double canonical, out string? fault) => throw new NotSupportedException();

    /// <summary>Converts back from the canonical unit, for showing in a tank's own unit.</summary>
    public static bool TryConvertBack(string quantity, string unit, double canonical, out double raw) => throw new NotSupportedException();
}
