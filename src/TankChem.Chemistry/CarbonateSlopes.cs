namespace TankChem.Chemistry;

/// <summary>How alkalinity and DIC of a water answer its pH and its CO2: partial derivatives by pH and by the logarithm of pCO2, mol/kg, the composition otherwise unchanged.</summary>
internal readonly record struct CarbonateSlopes(double AlkalinityByPH, double AlkalinityByLnPco2, double DicByPH, double DicByLnPco2)
{
    /// <summary>Buffer intensity at constant pCO2, mol/kg per pH unit.</summary>
    public double Open => AlkalinityByPH;

    /// <summary>Buffer intensity at constant DIC, mol/kg per pH unit.</summary>
    public double Closed => DicByLnPco2 > 0 ? AlkalinityByPH - AlkalinityByLnPco2 * DicByPH / DicByLnPco2 : AlkalinityByPH;

    /// <summary>The slopes of a mean of two waters.</summary>
    public static CarbonateSlopes Mean(in CarbonateSlopes a, in CarbonateSlopes b, double shareOfB) => new(
        a.AlkalinityByPH + shareOfB * (b.AlkalinityByPH - a.AlkalinityByPH),
        a.AlkalinityByLnPco2 + shareOfB * (b.AlkalinityByLnPco2 - a.AlkalinityByLnPco2),
        a.DicByPH + shareOfB * (b.DicByPH - a.DicByPH),
        a.DicByLnPco2 + shareOfB * (b.DicByLnPco2 - a.DicByLnPco2));
}
