namespace TankChem.Chemistry.Tests;

/// <summary>Waters of every kind that the model knows.</summary>
internal static class Waters
{
    public static readonly IonComposition TapIons = new() { CalciumMmolKg = 1.1, MagnesiumMmolKg = 0.3, SodiumMmolKg = 0.9, PotassiumMmolKg = 0.1, ChlorideMmolKg = 0.8, SulfateMmolKg = 0.4 };

    /// <summary>No ions but those of the carbonate system: ionic strength near 0.</summary>
    public static readonly IonComposition NoIons = new();

    /// <summary>Kinds of water by name.</summary>
    public static readonly string[] Kinds = ["fresh, ions known", "fresh, hardness known", "fresh, nothing known", "nearly fresh", "brackish", "estuary", "sea", "sea, Waters", "sea, Lueker"];

    public static Solution Of(string kind, double temperatureC = 18) => kind switch
    {
        "fresh, ions known" => new Solution { TemperatureC = temperatureC, Ions = TapIons },
        "fresh, hardness known" => new Solution { TemperatureC = temperatureC, HardnessMmolKg = 1.2 },
        "fresh, nothing known" => new Solution { TemperatureC = temperatureC },
        "nearly fresh" => new Solution { TemperatureC = temperatureC, Salinity = 0.6 },
        "brackish" => new Solution { TemperatureC = temperatureC, Salinity = 2.5 },
        "estuary" => new Solution { TemperatureC = temperatureC, Salinity = 9 },
        "sea" => new Solution { TemperatureC = temperatureC, Salinity = 34, PhosphateUmolKg = 3, SilicateUmolKg = 20, AmmoniaUmolKg = 15 },
        "sea, Waters" => new Solution { TemperatureC = temperatureC, Salinity = 34, Constants = ConstantSet.Waters2014 },
        "sea, Lueker" => new Solution { TemperatureC = temperatureC, Salinity = 34, Constants = ConstantSet.Lueker2000 },
        _ => throw new ArgumentOutOfRangeException(nameof(kind), kind, "No such water."),
    };

    public static CarbonateState Solved(Solution solution, CarbonateInput input)
    {
        CarbonateState state = CarbonateSystem.Solve(solution, input);
        Assert.True(state.Status == SolveStatus.Solved, $"{state.Status}: {state.FaultyArgument} for {input} in {solution}");
        return state;
    }
}
