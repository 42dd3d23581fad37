using TankChem.Chemistry;

namespace TankChem.Dosing.Tests;

/// <summary>Waters for tests: valid defaults, each test changes one thing.</summary>
internal static class Waters
{
    public static readonly DoseLimit SalmonCo2 = new("co2", true, 15, false, "CO2 limit 15 mg/L for salmonids");
    public static readonly DoseLimit SalmonCo2Danger = new("co2", true, 40, true, "CO2 danger limit 40 mg/L for salmonids");
    public static readonly DoseLimit SalmonPHLow = new("ph", false, 6.5, false, "pH limit 6.5 for salmonids");
    public static readonly DoseLimit SalmonPHHigh = new("ph", true, 8.5, false, "pH limit 8.5 for salmonids");
    public static readonly DoseLimit SalmonAmmonia = new("nh3-n", true, 0.0125, false, "Un-ionised ammonia limit 0.0125 mg/L NH3-N for salmonids");
    public static readonly DoseLimit SalmonAmmoniaDanger = new("nh3-n", true, 0.05, true, "Un-ionised ammonia danger limit 0.05 mg/L NH3-N for salmonids");
    public static readonly DoseLimit SalmonAlkalinity = new("alkalinity", false, 1.0, false, "Alkalinity limit 1 mmol/L for salmonids");

    public static readonly IReadOnlyList<DoseLimit> Salmonid = [SalmonCo2, SalmonCo2Danger, SalmonPHLow, SalmonPHHigh, SalmonAmmonia, SalmonAmmoniaDanger, SalmonAlkalinity];

    /// <summary>The water of knowledge of the trade's worked effect: 15 °C, alkalinity 50 mg/L as CaCO3, pH 7.00.</summary>
    public static DoseWater Worked(double? tanMgL = 2, string name = "Raceway 1") => Tank(7.00, 50 / 50.043, 15, tanMgL, name);

    public static DoseWater Tank(double pH, double alkalinityMmolL, double temperatureC = 12, double? tanMgL = 0.3, string name = "Raceway 1", double salinity = 0)
    {
        double density = Density.KgPerL(temperatureC, salinity);
        return new DoseWater
        {
            Name = name,
            Solution = new Solution { TemperatureC = temperatureC, Salinity = salinity },
            PH = new Estimate(pH, 0.05),
            AlkalinityUmolKg = new Estimate(alkalinityMmolL * 1000 / density, 0.05 * alkalinityMmolL * 1000 / density),
            TanMgL = tanMgL is { } tan ? new Estimate(tan, 0.1 * tan) : null,
            AirPco2Uatm = Atmosphere.Pco2Uatm(425, 1, temperatureC, salinity),
            Limits = Salmonid,
        };
    }

    public static DoseProblem In(double volumeM3, params DoseWater[] waters) => new()
    {
        VolumeM3 = volumeM3,
        Waters = waters,
        MissingInputs = [],
    };

    public static DosePlan PlanTo(this DoseProblem problem, double mmolL, params string[] reagents) =>
        DosePlanner.Plan(problem, new DoseTarget("alkalinity", mmolL), reagents);
}
