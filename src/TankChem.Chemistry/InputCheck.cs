using System.Globalization;

namespace TankChem.Chemistry;

/// <summary>Finds what is wrong with a question before any number is computed.</summary>
internal static class InputCheck
{
    /// <summary>Highest alkalinity, µmol/kg.</summary>
    public const double AlkalinityMaxUmolKg = 200_000;

    /// <summary>Highest DIC, µmol/kg.</summary>
    public const double DicMaxUmolKg = 500_000;

    /// <summary>The first fault in words, or null.</summary>
    public static string? FaultOf(Solution solution, in CarbonateInput input)
    {
        string? fault = Range("temperature_c", solution.TemperatureC, -2, 60, "°C")
            ?? Range("salinity", solution.Salinity, 0, 60, "")
            ?? Range("pressure_atm", solution.PressureAtm, 0.4, 1.2, "atm")
            ?? Range("phosphate_umol_kg", solution.PhosphateUmolKg, 0, 1e5, "µmol/kg")
            ?? Range("silicate_umol_kg", solution.SilicateUmolKg, 0, 1e5, "µmol/kg")
            ?? Range("ammonia_umol_kg", solution.AmmoniaUmolKg, 0, 1e5, "µmol/kg");
        if (fault is null && solution.HardnessMmolKg is { } hardness)
            fault = Range("hardness_mmol_kg", hardness, 0, 200, "mmol/kg");
        if (fault is null && solution.Ions is { } ions)
            fault = OfIons(ions);
        return fault ?? OfPair(input);
    }

    private static string? OfIons(IonComposition ions) =>
        Range("calcium_mmol_kg", ions.CalciumMmolKg, 0, 1000, "mmol/kg")
        ?? Range("magnesium_mmol_kg", ions.MagnesiumMmolKg, 0, 1000, "mmol/kg")
        ?? Range("sodium_mmol_kg", ions.SodiumMmolKg, 0, 1000, "mmol/kg")
        ?? Range("potassium_mmol_kg", ions.PotassiumMmolKg, 0, 1000, "mmol/kg")
        ?? Range("chloride_mmol_kg", ions.ChlorideMmolKg, 0, 1000, "mmol/kg")
        ?? Range("sulfate_mmol_kg", ions.SulfateMmolKg, 0, 1000, "mmol/kg");

    private static string? OfPair(in CarbonateInput input)
    {
        int given = (input.PH is null ? 0 : 1) + (input.AlkalinityUmolKg is null ? 0 : 1) + (input.DicUmolKg is null ? 0 : 1) + (input.Pco2Uatm is null ? 0 : 1);
        if (given != 2)
            return $"ph, alkalinity_umol_kg, dic_umol_kg, pco2_uatm: {given} given; exactly two are needed";
        return (input.PH is { } ph ? Range("ph", ph, 2, 12, "") : null)
            ?? (input.AlkalinityUmolKg is { } alkalinity ? Range("alkalinity_umol_kg", alkalinity, -5000, AlkalinityMaxUmolKg, "µmol/kg") : null)
            ?? (input.DicUmolKg is { } dic ? Range("dic_umol_kg", dic, 0, DicMaxUmolKg, "µmol/kg") : null)
            ?? (input.Pco2Uatm is { } pco2 ? Range("pco2_uatm", pco2, double.Epsilon, 2000000, "µatm") : null);
    }

    private static string? Range(string name, double value, double min, double max, string unit) =>
        value >= min && value <= max
            ? null
            : string.Create(CultureInfo.InvariantCulture, $"{name}: {value} is outside {(min == double.Epsilon ? 0 : min)} to {max} {unit}").TrimEnd();
}
