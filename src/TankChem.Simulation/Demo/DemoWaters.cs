using TankChem.Chemistry;
using TankChem.Simulation.Tanks;
using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Demo;

/// <summary>The virtual waters of the demo. Sizes and rates are invented, and tuned so that an ordinary day stays inside the limits of its stock.</summary>
internal sealed class DemoWaters
{
    private readonly Dictionary<string, VirtualTank> _tanks = new(StringComparer.Ordinal);
    private readonly VirtualLoop _loop;

    public DemoWaters(DateTimeOffset start)
    {
        Air air = DemoAir.At(start);
        _tanks[DemoIds.Scape] = new VirtualTank(Scape, start, air);
        _tanks[DemoIds.Reef] = new VirtualTank(Reef, start, air);
        _tanks[DemoIds.Loop] = new VirtualTank(Treatment, start, air);
        _tanks[DemoIds.North1] = new VirtualTank(North(0.52), start, air);
        _tanks[DemoIds.North2] = new VirtualTank(North(0.6), start, air);
        _tanks[DemoIds.Raceway] = new VirtualTank(Raceway, start, air);
        _tanks[DemoIds.Shrimp] = new VirtualTank(Shrimp, start, air);
        _tanks[DemoIds.Bench] = new VirtualTank(Bench, start, air);
        _loop = new VirtualLoop(_tanks[DemoIds.Loop]);
        _loop.Add(_tanks[DemoIds.North1], NorthFlowM3PerHour);
        _loop.Add(_tanks[DemoIds.North2], NorthFlowM3PerHour);
        Time = start;
    }

    public const double ScapeVolumeM3 = 0.31;
    public const double ReefVolumeM3 = 2.4;
    public const double NorthVolumeM3 = 14;
    public const double TreatmentVolumeM3 = 18;
    public const double RacewayVolumeM3 = 30;
    public const double ShrimpVolumeM3 = 18;
    public const double BenchVolumeM3 = 0.2;
    public const double ReefSalinity = 35;
    public const double ShrimpSalinity = 20;

    private const double NorthFlowM3PerHour = 26;

    public static Hours ScapeGas { get; } = new(new TimeOnly(8, 30), new TimeOnly(17, 30));

    public static Hours ScapeLight { get; } = new(new TimeOnly(10, 0), new TimeOnly(18, 30));

    public static Hours ReefLight { get; } = new(new TimeOnly(9, 0), new TimeOnly(20, 0));

    public static DemoIons TapIons { get; } = new(30, 6, 14, 2, 20, 25);

    public static DemoIons WellIons { get; } = new(42, 7, 12, 1.5, 18, 22);

    /// <summary>How far the waters have got.</summary>
    public DateTimeOffset Time { get; private set; }

    /// <summary>The water of a place; of the loop, its treatment's.</summary>
    public VirtualTank this[string place] => _tanks[place];

    public void Advance(DateTimeOffset until)
    {
        while (Time < until)
        {
            DateTimeOffset next = until - Time < VirtualTank.LongestStep ? until : Time + VirtualTank.LongestStep;
            Air air = DemoAir.At(Time);
            _loop.Advance(next, air);
            foreach ((string place, VirtualTank tank) in _tanks)
            {
                if (place is not (DemoIds.Loop or DemoIds.North1 or DemoIds.North2))
                    tank.Advance(next, air);
            }

            Time = next;
        }
    }

    private static IonComposition Composition(DemoIons ions) => new()
    {
        CalciumMmolKg = ions.CalciumMgL / MolarMass.Calcium,
        MagnesiumMmolKg = ions.MagnesiumMgL / MolarMass.Magnesium,
        SodiumMmolKg = ions.SodiumMgL / Molar.Sodium,
        PotassiumMmolKg = ions.PotassiumMgL / Molar.Potassium,
        ChlorideMmolKg = ions.ChlorideMgL / Molar.Chloride,
        SulfateMmolKg = ions.SulfateMgL / Molar.Sulfate,
    };

    private static WaterRecipe Tap { get; } = new() { AlkalinityMmolL = 1.5, CalciumMmolL = 0.75, Co2OverAir = 3, Ions = Composition(TapIons) };

    private static WaterRecipe Well { get; } = new() { AlkalinityMmolL = 2.2, CalciumMmolL = 1.05, Co2OverAir = 6, Ions = Composition(WellIons) };

    private static TankSettings Scape => new()
    {
        VolumeM3 = ScapeVolumeM3,
        Water = Tap,
        Temperature = new DailyTemperature(24.4, 0.35, 17, 0.15),
        Kla20PerHour = 0.5,
        Plants = new Plants { PhotosynthesisMmolLH = 0.115, RespirationMmolLH = 0.022 },
        Lamp = new Lamp(ScapeLight, 120),
        Injector = new Injector(4.2, ScapeGas),
        SourceWater = Tap,
        ExchangePerDay = 0.04,
    };

    private static TankSettings Reef => new()
    {
        VolumeM3 = ReefVolumeM3,
        Water = new WaterRecipe { AlkalinityMmolL = 2.88, Salinity = ReefSalinity, CalciumMmolL = 10.6 },
        Temperature = new DailyTemperature(25.3, 0.25, 18, 0.1),
        Kla20PerHour = 1.6,
        Plants = new Plants { PhotosynthesisMmolLH = 0.05, RespirationMmolLH = 0.016, HalfSaturationCo2MmolL = 0.002 },
        Lamp = new Lamp(ReefLight, 250, 1.5),
        Calcification = new Calcification { DarkMmolLH = 0.003, LightMmolLH = 0.009 },
        Doser = new AlkalinityDoser(2.95, 0.2, 0.5, 0.5),
    };

    private static TankSettings Treatment => new()
    {
        VolumeM3 = TreatmentVolumeM3,
        Water = Well with { AlkalinityMmolL = 2, Co2OverAir = 7, TanMmolL = 0.04, NitrateMmolL = 1.5 },
        Temperature = new DailyTemperature(13.2, 0.3, 17, 0.4),
        Kla20PerHour = 0.25,
        DegasserKla20PerHour = 9.5,
        Nitrification = new Nitrification { PerHour = 6.5 },
        Doser = new AlkalinityDoser(2.12, 0.35),
        SourceWater = Well,
        ExchangePerDay = 0.5,
    };

    private static TankSettings North(double share) => new()
    {
        VolumeM3 = NorthVolumeM3,
        Water = Well with { AlkalinityMmolL = 2, Co2OverAir = 10, TanMmolL = 0.05, NitrateMmolL = 1.5 },
        Temperature = new DailyTemperature(13.2, 0.3, 17, 0.4),
        Kla20PerHour = 0.15,
        Stock = new Stock { FeedKgPerDay = 12 * share, ProteinShare = 0.45, PeakHour = 14 },
        Oxygen = new OxygenSupply(10.6, 9),
    };

    private static TankSettings Raceway => new()
    {
        VolumeM3 = RacewayVolumeM3,
        Water = Well with { AlkalinityMmolL = 2.05, Co2OverAir = 12, TanMmolL = 0.05, NitrateMmolL = 2 },
        Temperature = new DailyTemperature(27, 0.5, 17, 0.3),
        Kla20PerHour = 0.75,
        Stock = new Stock { FeedKgPerDay = 4.2, ProteinShare = 0.35 },
        Nitrification = new Nitrification { PerHour = 0.5 },
        Oxygen = new OxygenSupply(7.4, 4),
        SourceWater = Well with { AlkalinityMmolL = 2.5 },
        ExchangePerDay = 0.7,
    };

    private static TankSettings Shrimp => new()
    {
        VolumeM3 = ShrimpVolumeM3,
        Water = new WaterRecipe { AlkalinityMmolL = 2.4, Salinity = ShrimpSalinity, CalciumMmolL = 6, Co2OverAir = 4, TanMmolL = 0.02, NitrateMmolL = 1 },
        Temperature = new DailyTemperature(28.4, 0.3, 17, 0.2),
        Kla20PerHour = 3.3,
        Stock = new Stock { FeedKgPerDay = 2.6, ProteinShare = 0.38, PeakHour = 20 },
        Plants = new Plants { PhotosynthesisMmolLH = 0.06, RespirationMmolLH = 0.012, HalfSaturationCo2MmolL = 0.01 },
        Lamp = new Lamp(new Hours(new TimeOnly(7, 0), new TimeOnly(19, 0)), 300, 2),
        Nitrification = new Nitrification { PerHour = 0.65 },
        Doser = new AlkalinityDoser(2.5, 0.2),
    };

    private static TankSettings Bench => new()
    {
        VolumeM3 = BenchVolumeM3,
        Water = Tap with { TanMmolL = 0.01 },
        Temperature = new DailyTemperature(21.5, 0.6, 16, 0.2),
        Kla20PerHour = 0.8,
        Stock = new Stock { FeedKgPerDay = 0.008, ProteinShare = 0.4 },
        Nitrification = new Nitrification { PerHour = 0.4 },
        SourceWater = Tap,
        ExchangePerDay = 0.15,
    };
}
