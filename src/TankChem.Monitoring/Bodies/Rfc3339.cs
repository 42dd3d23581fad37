using System.Globalization;

namespace TankChem.Monitoring.Bodies;

/// <summary>Times as bodies write them.</summary>
public static class Rfc3339
{
    /// <summary>UTC with <c>Z</c>, milliseconds only where there are some.</summary>
    public static string Text(DateTimeOffset time) => time.UtcDateTime.ToString("yyyy-MM-dd'T'HH:mm:ss.FFF'Z'", CultureInfo.InvariantCulture);
}
