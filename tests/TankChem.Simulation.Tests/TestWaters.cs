using TankChem.Chemistry;
using TankChem.Simulation.Tanks;
using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Tests;

/// <summary>Waters and tanks for tests; each test changes what it is about.</summary>
internal static class TestWaters
{
    public static readonly DateTimeOffset Start = new(2026, 3, 1, 0, 0, 0, TimeSpan.Zero);

    public static readonly Air OpenAir = new(430, 1);

    public static WaterRecipe Fresh { get; } = new()
    {
        AlkalinityMmolL = 2,
        Ions = new IonComposition { CalciumMmolKg = 1, MagnesiumMmolKg = 0.25, SodiumMmolKg = 0.6, ChlorideMmolKg = 0.6, SulfateMmolKg = 0.25 },
    };

    public static WaterRecipe Sea { get; } = new() { AlkalinityMmolL = 2.4, Salinity = 35, CalciumMmolL = 10.5 };

    public static TankSettings Tank(WaterRecipe water) => new() { VolumeM3 = 2, Water = water, Temperature = new DailyTemperature(20) };
}
