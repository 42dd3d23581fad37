namespace TankChem.Monitoring.Places;

/// <summary>A site: one address, one air, its loops and tanks.</summary>
public sealed record SiteDefinition
{
    /// <summary>Id, 1 to 64 of <c>a-z 0-9 - _</c>.</summary>
    public required string Id { get; init; }

    /// <summary>The name people use.</summary>
    public required string Name { get; init; }

    /// <summary>CO2 of the outdoor or room air, ppm dry.</summary>
    public double AirCo2Ppm { get; init; } = 425;

    /// <summary>Elevation above the sea, m; sets the barometric pressure until one is measured.</summary>
    public double ElevationM { get; init; }

    /// <summary>IANA id of the local time zone; UTC when not set.</summary>
    public string TimeZone { get; init; } = "UTC";

    /// <summary>Loops and tanks.</summary>
    public IReadOnlyList<PlaceDefinition> Places { get; init; } = [];
}
