namespace TankChem.Chemistry.Tests;

/// <summary>A bad number is an answer that names the argument, the value and the range.</summary>
public class BadInputTests
{
    private static readonly CarbonateInput Pair = new() { PH = 7.4, AlkalinityUmolKg = 2000 };
    private static readonly Solution Water = new() { TemperatureC = 15 };

    public static TheoryData<string, double> Numbers => new()
    {
        { "temperature_c", double.NaN },
        { "temperature_c", double.PositiveInfinity },
        { "temperature_c", -2.01 },
        { "temperature_c", 60.01 },
        { "salinity", double.NaN },
        { "salinity", -0.001 },
        { "salinity", 60.01 },
        { "pressure_atm", double.NaN },
        { "pressure_atm", 0 },
        { "pressure_atm", 1013.25 },
        { "phosphate_umol_kg", -1 },
        { "silicate_umol_kg", double.NegativeInfinity },
        { "ammonia_umol_kg", -1e-9 },
        { "hardness_mmol_kg", -1 },
        { "calcium_mmol_kg", double.NaN },
        { "magnesium_mmol_kg", -1 },
        { "sodium_mmol_kg", 1e6 },
        { "potassium_mmol_kg", double.PositiveInfinity },
        { "chloride_mmol_kg", -1 },
        { "sulfate_mmol_kg", double.NaN },
        { "ph", double.NaN },
        { "ph", 1.99 },
        { "ph", 12.01 },
        { "alkalinity_umol_kg", double.NaN },
        { "alkalinity_umol_kg", 1e308 },
        { "dic_umol_kg", -1 },
        { "dic_umol_kg", double.NaN },
        { "pco2_uatm", 0 },
        { "pco2_uatm", -400 },
        { "pco2_uatm", double.PositiveInfinity },
    };

    [Theory]
    [MemberData(nameof(Numbers))]
    public void Solve_NumberOutOfRange_IsInvalidAndSaysWhichValueAndRange(string argument, double value)
    {
        (Solution water, CarbonateInput input) = With(argument, value);

        CarbonateState state = CarbonateSystem.Solve(water, input);

        Assert.Equal(SolveStatus.InvalidInput, state.Status);
        Assert.StartsWith($"{argument}: {value.ToString(System.Globalization.CultureInfo.InvariantCulture)} is outside ", state.FaultyArgument, StringComparison.Ordinal);
        Assert.Contains(" to ", state.FaultyArgument, StringComparison.Ordinal);
    }

    [Fact]
    public void Solve_NotExactlyTwoGiven_IsInvalidAndSaysHowMany()
    {
        CarbonateState one = CarbonateSystem.Solve(Water, new CarbonateInput { PH = 7 });
        CarbonateState three = CarbonateSystem.Solve(Water, Pair with { DicUmolKg = 2000 });

        Assert.Equal(SolveStatus.InvalidInput, one.Status);
        Assert.Contains("1 given; exactly two", one.FaultyArgument, StringComparison.Ordinal);
        Assert.Equal(SolveStatus.InvalidInput, three.Status);
        Assert.Contains("3 given; exactly two", three.FaultyArgument, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("fresh, ions known")]
    [InlineData("brackish")]
    [InlineData("sea")]
    public void Solve_PairsThatNoWaterHas_AreImpossibleWithASentence(string kind)
    {
        Solution water = Waters.Of(kind);
        CarbonateInput[] impossible =
        [
            new() { PH = 10.5, AlkalinityUmolKg = 20 },
            new() { PH = 11, AlkalinityUmolKg = -500 },
            new() { DicUmolKg = 10, Pco2Uatm = 100_000 },
            new() { DicUmolKg = 0, Pco2Uatm = 400 },
        ];
        foreach (CarbonateInput input in impossible)
        {
            CarbonateState state = CarbonateSystem.Solve(water, input);

            Assert.True(state.Status == SolveStatus.Impossible, $"{input} in {kind}: {state.Status}");
            Assert.False(string.IsNullOrWhiteSpace(state.FaultyArgument));
        }
    }

    [Theory]
    [MemberData(nameof(BufferTests.AllKinds), MemberType = typeof(BufferTests))]
    public void Solve_AtTheEdgesOfItsRanges_IsAnswered(string kind)
    {
        double[] temperatures = [-2, 0, 60];
        CarbonateInput[] inputs =
        [
            new() { PH = 2, DicUmolKg = 0 },
            new() { PH = 12, DicUmolKg = 500_000 },
            new() { PH = 12, AlkalinityUmolKg = 200_000 },
            new() { PH = 2, AlkalinityUmolKg = -5000 },
            new() { PH = 2, Pco2Uatm = 2_000_000 },
            new() { PH = 7, Pco2Uatm = 1e-300 },
            new() { PH = 12, Pco2Uatm = 2_000_000 },
            new() { PH = 12, Pco2Uatm = 400 },
            new() { PH = 9.5, Pco2Uatm = 1_000_000 },
            new() { AlkalinityUmolKg = 200_000, Pco2Uatm = 2_000_000 },
            new() { AlkalinityUmolKg = -5000, DicUmolKg = 0 },
            new() { AlkalinityUmolKg = 200_000, DicUmolKg = 500_000 },
            new() { DicUmolKg = 500_000, Pco2Uatm = 2_000_000 },
        ];
        foreach (double t in temperatures)
        {
            foreach (CarbonateInput input in inputs)
            {
                CarbonateState state = CarbonateSystem.Solve(Waters.Of(kind, t), input);

                Assert.True(state.Status is SolveStatus.Solved or SolveStatus.Impossible, $"{state.Status} at {t} °C for {input}");
                Assert.Equal(state.Status == SolveStatus.Solved, state.FaultyArgument is null);
                Assert.True(state.Status == SolveStatus.Impossible || (double.IsFinite(state.Co2UmolKg) && double.IsFinite(state.PhNbs) && double.IsFinite(state.BufferClosedUmolKg)), $"not finite at {t} °C for {input}");
            }
        }
    }

    /// <summary>Such a pair was once called solved, with numbers that were not.</summary>
    [Theory]
    [MemberData(nameof(BufferTests.AllKinds), MemberType = typeof(BufferTests))]
    public void Solve_MoreCarbonateThanAnyWaterHolds_IsImpossible(string kind)
    {
        CarbonateInput[] inputs = [new() { PH = 12, Pco2Uatm = 400 }, new() { PH = 10.5, Pco2Uatm = 2_000_000 }, new() { PH = 9.5, Pco2Uatm = 1_000_000 }];
        foreach (CarbonateInput input in inputs)
        {
            CarbonateState state = CarbonateSystem.Solve(Waters.Of(kind), input);

            Assert.True(state.Status == SolveStatus.Impossible, $"{state.Status} for {input}");
            Assert.Contains("more than this model of water holds for", state.FaultyArgument, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void Solve_FreshWaterOfGreatIonicStrength_IsOutOfTheFittedRange()
    {
        CarbonateState state = Waters.Solved(new Solution { TemperatureC = 20, Ions = new IonComposition { SodiumMmolKg = 800, ChlorideMmolKg = 798 } }, new CarbonateInput { PH = 7.5, AlkalinityUmolKg = 2000 });

        Assert.Equal(Caveats.OutOfFittedRange, state.Caveats);
    }

    [Fact]
    public void Propagate_OfAStateThatIsNotSolved_Throws()
    {
        CarbonateState state = CarbonateSystem.Solve(Water, new CarbonateInput { PH = 7 });

        Assert.Throws<ArgumentException>(() => CarbonateSystem.Propagate(Water, Pair, state, new InputUncertainty { PH = 0.1 }));
    }

    private static (Solution Water, CarbonateInput Input) With(string argument, double value) => argument switch
    {
        "temperature_c" => (Water with { TemperatureC = value }, Pair),
        "salinity" => (Water with { Salinity = value }, Pair),
        "pressure_atm" => (Water with { PressureAtm = value }, Pair),
        "phosphate_umol_kg" => (Water with { PhosphateUmolKg = value }, Pair),
        "silicate_umol_kg" => (Water with { SilicateUmolKg = value }, Pair),
        "ammonia_umol_kg" => (Water with { AmmoniaUmolKg = value }, Pair),
        "hardness_mmol_kg" => (Water with { HardnessMmolKg = value }, Pair),
        "calcium_mmol_kg" => (Water with { Ions = Waters.TapIons with { CalciumMmolKg = value } }, Pair),
        "magnesium_mmol_kg" => (Water with { Ions = Waters.TapIons with { MagnesiumMmolKg = value } }, Pair),
        "sodium_mmol_kg" => (Water with { Ions = Waters.TapIons with { SodiumMmolKg = value } }, Pair),
        "potassium_mmol_kg" => (Water with { Ions = Waters.TapIons with { PotassiumMmolKg = value } }, Pair),
        "chloride_mmol_kg" => (Water with { Ions = Waters.TapIons with { ChlorideMmolKg = value } }, Pair),
        "sulfate_mmol_kg" => (Water with { Ions = Waters.TapIons with { SulfateMmolKg = value } }, Pair),
        "ph" => (Water, Pair with { PH = value }),
        "alkalinity_umol_kg" => (Water, Pair with { AlkalinityUmolKg = value }),
        "dic_umol_kg" => (Water, new CarbonateInput { PH = 7, DicUmolKg = value }),
        "pco2_uatm" => (Water, new CarbonateInput { PH = 7, Pco2Uatm = value }),
        _ => throw new ArgumentOutOfRangeException(nameof(argument), argument, "No such argument."),
    };
}
