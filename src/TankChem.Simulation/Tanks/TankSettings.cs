using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Tanks;

/// <summary>A virtual tank: its water, what lives in it, and its equipment. What is null or 0 is not there.</summary>
public sealed record TankSettings
{
    /// <summary>Volume, m³.</summary>
    public required double VolumeM3 { get; init; }

    /// <summary>Its water at the start.</summary>
    public required WaterRecipe Water { get; init; }

    /// <summary>Its temperature.</summary>
    public required DailyTemperature Temperature { get; init; }

    /// <summary>kLa of oxygen at 20 °C through surface and air stones, 1/h.</summary>
    public double Kla20PerHour { get; init; } = 0.3;

    /// <summary>kLa of oxygen at 20 °C that a degasser adds while it runs, 1/h.</summary>
    public double DegasserKla20PerHour { get; init; }

    /// <summary>Animals that are fed.</summary>
    public Stock? Stock { get; init; }

    /// <summary>Plants, algae, symbionts of corals.</summary>
    public Plants? Plants { get; init; }

    /// <summary>Light.</summary>
    public Lamp? Lamp { get; init; }

    /// <summary>Bacteria that turn ammonia to nitrate.</summary>
    public Nitrification? Nitrification { get; init; }

    /// <summary>Growing skeletons.</summary>
    public Calcification? Calcification { get; init; }

    /// <summary>CO2 injection.</summary>
    public Injector? Injector { get; init; }

    /// <summary>Alkalinity doser.</summary>
    public AlkalinityDoser? Doser { get; init; }

    /// <summary>Pure oxygen.</summary>
    public OxygenSupply? Oxygen { get; init; }

    /// <summary>Source water for exchange and make-up; needed where <see cref="ExchangePerDay"/> is above 0.</summary>
    public WaterRecipe? SourceWater { get; init; }

    /// <summary>Water exchanged, share of the volume per day.</summary>
    public double ExchangePerDay { get; init; }
}
