namespace TankChem.Monitoring.Places;

/// <summary>Names one place: site id and place id, each 1 to 64 of <c>a-z 0-9 - _</c>.</summary>
/// <param name="Site">The site's id.</param>
/// <param name="Place">The tank's or loop's id, or <c>site</c> for what holds for the whole site.</param>
public readonly record struct PlaceKey(string Site, string Place)
{
    /// <summary>The reserved place id of readings that hold for a whole site.</summary>
    public const string WholeSite = "site";

    /// <summary><c>site/place</c>, as in topics and addresses.</summary>
    public override string ToString() => $"{Site}/{Place}";
}
