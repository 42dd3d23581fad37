namespace TankChem.Simulation.Demo;

/// <summary>The demo's places as their owner would set them up.</summary>
internal static class DemoPlaces
{
    public static IReadOnlyList<DemoPlace> Of(DemoDates dates) =>
    [
        new DemoPlace
        {
            Id = DemoIds.Scape,
            Name = "Foyer scape",
            VolumeM3 = DemoWaters.ScapeVolumeM3,
            Stock = ["planted"],
            Co2Injection = true,
            GasHours = DemoWaters.ScapeGas,
            LightHours = DemoWaters.ScapeLight,
            Ions = DemoWaters.TapIons,
            Probes = [Ph(dates.Day(-12, 15, 0)), Temperature, new DemoProbe("alkalinity", "main", "dKH", DriftPerDay: 0.02)],
        },
        new DemoPlace
        {
            Id = DemoIds.Reef,
            Name = "Reef hall",
            VolumeM3 = DemoWaters.ReefVolumeM3,
            Salinity = DemoWaters.ReefSalinity,
            Stock = ["reef"],
            LightHours = DemoWaters.ReefLight,
            Probes = [Ph(dates.ReefCalibrated), Temperature, new DemoProbe("alkalinity", "main", "dKH", DriftPerDay: 0.03), new DemoProbe("calcium", "main", "mg/L")],
        },
        new DemoPlace
        {
            Id = DemoIds.Loop,
            Name = "North loop",
            Kind = DemoPlaceKind.Loop,
            VolumeM3 = DemoWaters.TreatmentVolumeM3 + 2 * DemoWaters.NorthVolumeM3,
            Ions = DemoWaters.WellIons,
            Probes = [Temperature, Alkalinity, Tan],
        },
        North(DemoIds.North1, "North 1", dates),
        North(DemoIds.North2, "North 2", dates),
        new DemoPlace
        {
            Id = DemoIds.Raceway,
            Name = "Warm raceway",
            VolumeM3 = DemoWaters.RacewayVolumeM3,
            Stock = ["warm-water"],
            Ions = DemoWaters.WellIons,
            Probes = [Ph(dates.RacewayCleaned), Temperature, Oxygen, Alkalinity, Tan],
        },
        new DemoPlace
        {
            Id = DemoIds.Shrimp,
            Name = "Shrimp 4",
            VolumeM3 = DemoWaters.ShrimpVolumeM3,
            Salinity = DemoWaters.ShrimpSalinity,
            Stock = ["shrimp"],
            Probes = [Ph(dates.Day(-8, 13, 0)), Temperature, Oxygen, new DemoProbe("oxygen-saturation", "main", "%"), Alkalinity, Tan],
        },
        new DemoPlace
        {
            Id = DemoIds.Bench,
            Name = "Bench trial",
            Assigned = false,
            VolumeM3 = DemoWaters.BenchVolumeM3,
        },
    ];

    private static DemoProbe Temperature { get; } = new("temperature", "main", "Cel");

    private static DemoProbe Oxygen { get; } = new("oxygen", "main", "mg/L");

    private static DemoProbe Alkalinity { get; } = new("alkalinity", "main", "mg/L CaCO3", DriftPerDay: 0.06);

    private static DemoProbe Tan { get; } = new("tan", "main", "mg/L");

    private static DemoProbe Ph(DateTimeOffset calibrated) => new("ph", "main", "pH", CalibratedAt: calibrated);

    private static DemoPlace North(string id, string name, DemoDates dates) => new()
    {
        Id = id,
        Name = name,
        Loop = DemoIds.Loop,
        VolumeM3 = DemoWaters.NorthVolumeM3,
        Stock = ["salmonid"],
        Ions = DemoWaters.WellIons,
        Probes = [Ph(dates.Day(-7, 13, 15)), Temperature, Oxygen],
    };
}
