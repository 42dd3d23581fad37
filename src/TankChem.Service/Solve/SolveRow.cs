using System.Globalization;
using TankChem.Chemistry;

namespace TankChem.Service.Solve;

/// <summary>One row of <c>solve</c>: parsed, solved, answered. Reused from row to row.</summary>
internal sealed class SolveRow
{
    private readonly double?[] numbers = new double?[SolveColumns.Numbers.Length];
    private readonly string[] words = new string[SolveColumns.Words.Length];

    /// <summary>Why it cannot be solved; empty when it was.</summary>
    public string Error { get; private set; } = "";

    /// <summary>The state; only where <see cref="Error"/> is empty.</summary>
    public CarbonateState State { get; private set; }

    /// <summary>The equilibrium with air; null where it has none.</summary>
    public CarbonateState? Air { get; private set; }

    /// <summary>Uncertainties; null where none were given.</summary>
    public CarbonateUncertainty? Uncertainty { get; private set; }

    /// <summary>The scale the row's pH stands on.</summary>
    public PhScale Scale { get; private set; }

    /// <summary>Forgets the row before.</summary>
    public void Clear()
    {
        Array.Clear(numbers);
        Array.Fill(words, "");
        Error = "";
        State = default;
        Air = null;
        Uncertainty = null;
    }

    /// <summary>Takes a number cell; an empty one is an absent value.</summary>
    public void SetNumber(int column, ReadOnlySpan<char> cell)
    {
        ReadOnlySpan<char> text = cell.Trim();
        if (text.IsEmpty)
            return;
        if (double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double value) && double.IsFinite(value))
            numbers[column] = value;
        else if (Error.Length == 0)
            Error = $"{SolveColumns.Numbers[column]}: \"{Shorten(text)}\" is not a number; right would be like 7.25";
    }

    /// <summary>Takes a word cell.</summary>
    public void SetWord(int column, ReadOnlySpan<char> cell) => words[column] = cell.Trim().ToString();

    /// <summary>Solves the row.</summary>
    public void Solve()
    {
        if (Error.Length > 0)
            return;
        if (!TryReadWords(out ConstantSet constants, out bool includeConstants) || !TryReadAmounts())
            return;

        Solution solution = ReadSolution(constants);
        var input = new CarbonateInput { PH = N(2), AlkalinityUmolKg = N(3), DicUmolKg = N(4), Pco2Uatm = N(5), Scale = Scale };
        CarbonateState state = CarbonateSystem.Solve(solution, input);
        if (state.Status != SolveStatus.Solved)
        {
            Error = state.FaultyArgument ?? state.Status.ToString();
            return;
        }

        State = state;
        double airPpm = N(17) ?? 425;
        if (state.AlkalinityUmolKg > 0)
        {
            double pco2 = Atmosphere.Pco2Uatm(airPpm, solution.PressureAtm, solution.TemperatureC, solution.Salinity);
            CarbonateState air = CarbonateSystem.Solve(solution, new CarbonateInput { AlkalinityUmolKg = state.AlkalinityUmolKg, Pco2Uatm = pco2, Scale = Scale });
            if (air.Status == SolveStatus.Solved)
                Air = air;
        }

        if (N(18) is not null || N(19) is not null || N(20) is not null || N(21) is not null || N(22) is not null || N(23) is not null)
        {
            Uncertainty = CarbonateSystem.Propagate(solution, input, state, new InputUncertainty
            {
                PH = N(18) ?? 0,
                AlkalinityUmolKg = N(19) ?? 0,
                TemperatureC = N(20) ?? 0,
                Salinity = N(21) ?? 0,
                DicUmolKg = N(22) ?? 0,
                Pco2Uatm = N(23) ?? 0,
                IncludeConstants = includeConstants,
            });
        }
    }

    private double? N(int column) => numbers[column];

    private bool TryReadAmounts()
    {
        if (N(0) is null)
            return Fail("temperature_c: empty; the temperature in °C is needed");
        if (N(1) is null)
            return Fail("salinity: empty; practical salinity is needed, 0 for fresh water");
        int given = (N(2) is null ? 0 : 1) + (N(3) is null ? 0 : 1) + (N(4) is null ? 0 : 1) + (N(5) is null ? 0 : 1);
        if (given != 2)
            return Fail($"ph, alkalinity_umol_kg, dic_umol_kg, pco2_uatm: {given} of them given; exactly two are needed");
        if (N(17) is <= 0 or > 1_000_000)
            return Fail("air_co2_ppm: must be more than 0 and at most 1000000");
        for (int i = 6; i < SolveColumns.Numbers.Length; i++)
        {
            if (numbers[i] < 0)
                return Fail($"{SolveColumns.Numbers[i]}: must not be negative");
        }

        return true;
    }

    private bool TryReadWords(out ConstantSet constants, out bool includeConstants)
    {
        constants = ConstantSet.Auto;
        includeConstants = true;
        switch (words[0])
        {
            case "" or "nbs":
                Scale = PhScale.Nbs;
                break;
            case "total":
                Scale = PhScale.Total;
                break;
            case "seawater":
                Scale = PhScale.Seawater;
                break;
            case "free":
                Scale = PhScale.Free;
                break;
            default:
                return Fail($"ph_scale: \"{Shorten(words[0])}\" is not a scale; right would be nbs, total, seawater or free");
        }

        switch (words[1])
        {
            case "" or "auto":
                break;
            case "fresh":
                constants = ConstantSet.Fresh;
                break;
            case "millero2010":
                constants = ConstantSet.Millero2010;
                break;
            case "waters2014":
                constants = ConstantSet.Waters2014;
                break;
            case "lueker2000":
                constants = ConstantSet.Lueker2000;
                break;
            default:
                return Fail($"constants: \"{Shorten(words[1])}\" is not a set; right would be auto, fresh, millero2010, waters2014 or lueker2000");
        }

        switch (words[2])
        {
            case "" or "published":
                return true;
            case "none":
                includeConstants = false;
                return true;
            default:
                return Fail($"u_constants: \"{Shorten(words[2])}\" is not known; right would be published or none");
        }
    }

    private Solution ReadSolution(ConstantSet constants)
    {
        bool anyIon = false;
        for (int i = 9; i <= 14; i++)
            anyIon |= numbers[i] is not null;
        return new Solution
        {
            TemperatureC = N(0)!.Value,
            Salinity = N(1)!.Value,
            PhosphateUmolKg = N(6) ?? 0,
            SilicateUmolKg = N(7) ?? 0,
            AmmoniaUmolKg = N(8) ?? 0,
            Ions = anyIon
                ? new IonComposition
                {
                    CalciumMmolKg = N(9) ?? 0,
                    MagnesiumMmolKg = N(10) ?? 0,
                    SodiumMmolKg = N(11) ?? 0,
                    PotassiumMmolKg = N(12) ?? 0,
                    ChlorideMmolKg = N(13) ?? 0,
                    SulfateMmolKg = N(14) ?? 0,
                }
                : null,
            HardnessMmolKg = anyIon ? null : N(15),
            PressureAtm = N(16) ?? 1,
            Constants = constants,
        };
    }

    private bool Fail(string why)
    {
        Error = why;
        return false;
    }

    private static string Shorten(ReadOnlySpan<char> text) => text.Length <= 40 ? text.ToString() : $"{text[..40]}…";
}
