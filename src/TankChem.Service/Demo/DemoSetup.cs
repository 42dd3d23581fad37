using TankChem.Monitoring.Places;
using TankChem.Simulation.Demo;

namespace TankChem.Service.Demo;

/// <summary>The demo's places as a configuration would describe them.</summary>
internal static class DemoSetup
{
    public static SiteDefinition Site(DemoScenario scenario) => new()
    {
        Id = DemoSite.Id,
        Name = DemoSite.Name,
        AirCo2Ppm = DemoSite.AirCo2Ppm,
        ElevationM = DemoSite.ElevationM,
        Places = [.. scenario.Places.Where(p => p.Assigned).Select(Place)],
    };

    private static PlaceDefinition Place(DemoPlace place) => new()
    {
        Key = new PlaceKey(DemoSite.Id, place.Id),
        Kind = place.Kind == DemoPlaceKind.Loop ? PlaceKind.Loop : PlaceKind.Tank,
        Name = place.Name,
        Loop = place.Loop,
        VolumeM3 = place.VolumeM3,
        Salinity = place.Salinity,
        Stock = place.Stock,
        Co2Injection = place.Co2Injection,
        GasHours = place.GasHours is { } gas ? new DailyHours(gas.Start, gas.End) : null,
        LightHours = place.LightHours is { } light ? new DailyHours(light.Start, light.End) : null,
        Ions = place.Ions is not { } ions ? null : new IonContent
        {
            CalciumMgL = ions.CalciumMgL,
            MagnesiumMgL = ions.MagnesiumMgL,
            SodiumMgL = ions.SodiumMgL,
            PotassiumMgL = ions.PotassiumMgL,
            ChlorideMgL = ions.ChlorideMgL,
            SulfateMgL = ions.SulfateMgL,
        },
        Probes = [.. place.Probes.Select(p => new ProbeDefinition
        {
            Quantity = p.Quantity,
            Probe = p.Probe,
            Unit = p.Unit,
            StandardUncertainty = p.StandardUncertainty,
            DriftPerDay = p.DriftPerDay,
            OldestUsed = p.OldestUsed,
            CalibratedAt = p.CalibratedAt,
        })],
    };
}
