namespace TankChem.Monitoring.Places;

/// <summary>What a place is.</summary>
public enum PlaceKind
{
    /// <summary>Holds stock: raceway, pond, display.</summary>
    Tank,

    /// <summary>Recirculating water shared by tanks.</summary>
    Loop,

    /// <summary>The whole site: room air, barometer, mains.</summary>
    Site,
}
