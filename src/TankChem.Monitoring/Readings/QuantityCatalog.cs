namespace TankChem.Monitoring.Readings;

/// <summary>All quantities with a meaning of their own; any other name is taken in, trended and may carry an alarm.</summary>
public static class QuantityCatalog
{
    /// <summary>All of them, those taken in first, then those computed.</summary>
    public static IReadOnlyList<QuantityDefinition> All => throw new NotSupportedException();

    /// <summary>The definition of an id; for an unknown one a plain definition without unit and range.</summary>
    public static QuantityDefinition Get(string id) => throw new NotSupportedException();
}
