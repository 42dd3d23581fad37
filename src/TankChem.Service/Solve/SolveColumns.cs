namespace TankChem.Service.Solve;

/// <summary>Column names of <c>solve</c>.</summary>
internal static class SolveColumns
{
    /// <summary>Input columns that hold a number.</summary>
    public static readonly string[] Numbers =
    [
        "temperature_c", "salinity", "ph", "alkalinity_umol_kg", "dic_umol_kg", "pco2_uatm",
        "phosphate_umol_kg", "silicate_umol_kg", "ammonia_umol_kg",
        "calcium_mmol_kg", "magnesium_mmol_kg", "sodium_mmol_kg", "potassium_mmol_kg", "chloride_mmol_kg", "sulfate_mmol_kg", "hardness_mmol_kg",
        "pressure_atm", "air_co2_ppm",
        "u_ph", "u_alkalinity_umol_kg", "u_temperature_c", "u_salinity", "u_dic_umol_kg", "u_pco2_uatm",
    ];

    /// <summary>Input columns that hold a word.</summary>
    public static readonly string[] Words = ["ph_scale", "constants", "u_constants"];

    /// <summary>Columns of the answer, in order.</summary>
    public static readonly string[] Answers =
    [
        "ph_total", "ph_nbs", "alkalinity_umol_kg", "dic_umol_kg", "co2_umol_kg", "co2_mg_l", "hco3_umol_kg", "co3_umol_kg",
        "pco2_uatm", "fco2_uatm", "ph_air", "co2_air_mg_l", "buffer_closed_umol_kg", "buffer_open_umol_kg",
        "omega_calcite", "omega_aragonite", "nh3_fraction", "ionic_strength", "u_co2_mg_l", "u_pco2_uatm", "u_ph", "error",
    ];
}
