using TankChem.Chemistry.Sea;

namespace TankChem.Chemistry.Fresh;

/// <summary>Phosphate and silicate as bases of a fresh water: the constants of sea water at salinity 0 (<see cref="SideAcids"/>), with activity coefficients.</summary>
internal readonly struct Nutrients
{
    private const double Ln10 = 2.302585092994045684;

    private readonly double phosphate;
    private readonly double silicate;
    private readonly double kP1;
    private readonly double kP2;
    private readonly double kP3;
    private readonly double kSi;

    public Nutrients(Solution solution)
    {
        phosphate = solution.PhosphateUmolKg * 1e-6;
        silicate = solution.SilicateUmolKg * 1e-6;
        if (!(phosphate > 0 || silicate > 0))
            return;
        double tK = solution.TemperatureC + 273.15, lnT = Math.Log(tK);
        kP1 = Math.Exp(SideAcids.LnKP1(tK, lnT, 0, 0));
        kP2 = Math.Exp(SideAcids.LnKP2(tK, lnT, 0, 0));
        kP3 = Math.Exp(SideAcids.LnKP3(tK, 0, 0));
        kSi = SideAcids.KSi(tK, lnT, 0, 0);
    }

    /// <summary>Their alkalinity, mol/kg, and its slope −d/d ln h.</summary>
    public (double Alkalinity, double Slope) At(double aH, in Activities g)
    {
        if (!(phosphate > 0 || silicate > 0))
            return (0, 0);
        double g2 = Math.Exp(4 * g.LogSingle * Ln10), g3 = Math.Exp(9 * g.LogSingle * Ln10);
        double p1 = kP1 * g.Neutral / (aH * g.Single);
        double p2 = p1 * kP2 * g.Single / (aH * g2);
        double p3 = p2 * kP3 * g2 / (aH * g3);
        double d = 1 + p1 + p2 + p3;
        double mean = (-1 + p2 + 2 * p3) / d;
        double charge = (p1 + 2 * p2 + 3 * p3) / d;
        double si = kSi * g.Neutral / (aH * g.Single);
        double share = si / (1 + si);
        double slope = phosphate * ((2 * p2 + 6 * p3) / d - mean * charge) + silicate * share * (1 - share);
        return (phosphate * mean + silicate * share, slope);
    }

    /// <summary>d alkalinity/d I at constant pH, dimensionless.</summary>
    public double ByIonicStrength(double aH, in Activities g, in ActivitySlopes slope)
    {
        if (!(phosphate > 0 || silicate > 0))
            return 0;
        double g2 = Math.Exp(4 * g.LogSingle * Ln10), g3 = Math.Exp(9 * g.LogSingle * Ln10);
        double p1 = kP1 * g.Neutral / (aH * g.Single);
        double p2 = p1 * kP2 * g.Single / (aH * g2);
        double p3 = p2 * kP3 * g2 / (aH * g3);
        double d = 1 + p1 + p2 + p3;
        double mean = (-1 + p2 + 2 * p3) / d;
        double l1 = slope.Neutral - slope.Single, l2 = slope.Neutral - 4 * slope.Single, l3 = slope.Neutral - 9 * slope.Single;
        double si = kSi * g.Neutral / (aH * g.Single);
        double share = si / (1 + si);
        return phosphate * ((p2 * l2 + 2 * p3 * l3) / d - mean * (p1 * l1 + p2 * l2 + p3 * l3) / d) + silicate * share * (1 - share) * l1;
    }
}
