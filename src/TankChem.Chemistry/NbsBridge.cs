using TankChem.Chemistry.Fresh;
using TankChem.Chemistry.Sea;

namespace TankChem.Chemistry;

/// <summary>Where a probe calibrated in NBS buffers reads in a salt water.</summary>
/// <remarks>Up to S 5 by the activity of the hydrogen ion (TJ74), from S 15 by fH (T82), which was measured near S 35 and is wrong in fresh water; blended in log S between.
/// Half of the difference of the two is an uncertainty there.</remarks>
internal static class NbsBridge
{
    private const double LnFrom = 1.6094379124341003;
    private const double LnTo = 2.70805020110221;

    /// <summary>log10 of a(H, NBS)/[H]T.</summary>
    public static double LogActivityPerTotal(double tK, double s, double totalPerFree, double seawaterPerFree)
    {
        double w = ShareOfFH(s);
        double byFH = w > 0 ? LogByFH(tK, s, totalPerFree, seawaterPerFree) : 0;
        double byActivity = w < 1 ? LogByActivity(tK, s, totalPerFree) : 0;
        return w * byFH + (1 - w) * byActivity;
    }

    /// <summary>Standard uncertainty of the NBS scale's place, pH: half of the difference of both ways where they are blended, otherwise 0.</summary>
    public static double StandardUncertainty(Solution solution)
    {
        double s = solution.Salinity;
        if (ShareOfFH(s) is <= 0 or >= 1)
            return 0;
        var k = new SeaConstants(solution.TemperatureC, s, solution.PressureAtm, solution.Constants, default);
        double tK = solution.TemperatureC + 273.15;
        return 0.5 * Math.Abs(LogByFH(tK, s, k.TotalPerFree, k.SeawaterPerFree) - LogByActivity(tK, s, k.TotalPerFree));
    }

    private static double ShareOfFH(double s) => s <= 5 ? 0 : s >= 15 ? 1 : Blend.Smooth((Math.Log(s) - LnFrom) / (LnTo - LnFrom));

    private static double LogByFH(double tK, double s, double totalPerFree, double seawaterPerFree) => Math.Log10(HydrogenActivityT82.FH(tK, s) * seawaterPerFree / totalPerFree);

    private static double LogByActivity(double tK, double s, double totalPerFree)
    {
        var debye = new DebyeHueckel(tK - 273.15);
        double logGamma = debye.LogGamma(SeaSalt.IonicStrength(s), Math.Sqrt(SeaSalt.IonicStrength(s)), 1, 9.0, 0);
        return logGamma - Math.Log10(SeaSalt.WaterShare(s)) - Math.Log10(totalPerFree);
    }
}
