namespace TankChem.Simulation.Demo;

/// <summary>What the water of a place truly is, as nobody on the site can know it.</summary>
/// <param name="Co2MgL">Dissolved CO2, mg/L.</param>
/// <param name="PhNbs">pH, NBS scale.</param>
/// <param name="AlkalinityMmolL">Alkalinity, mmol/L.</param>
/// <param name="TanMgL">Total ammonia nitrogen, mg/L as N.</param>
/// <param name="Nh3MgL">Un-ionised ammonia, mg/L as N.</param>
/// <param name="OxygenMgL">Oxygen, mg/L.</param>
/// <param name="OxygenSaturationPercent">Oxygen, % of equilibrium with the air.</param>
/// <param name="TemperatureC">Temperature, °C.</param>
/// <param name="CalciumMgL">Calcium, mg/L.</param>
/// <param name="Light">Light, µmol/(m² s).</param>
/// <param name="InjectionOn">Whether CO2 flows.</param>
public readonly record struct DemoTruth(
    double Co2MgL,
    double PhNbs,
    double AlkalinityMmolL,
    double TanMgL,
    double Nh3MgL,
    double OxygenMgL,
    double OxygenSaturationPercent,
    double TemperatureC,
    double CalciumMgL,
    double Light,
    bool InjectionOn);
