namespace TankChem.Dosing;

/// <summary>Where stripping takes the water in time.</summary>
internal static class RemedyPath
{
    /// <summary>Spread of an exchange rate that nobody has measured, as a standard deviation of its logarithm.</summary>
    private const double RateLnU = 0.5;

    private static readonly double[] TicksS = [0, 900, 3600, 21600];

    /// <summary>Points at 0, 15 min, 1 h and 6 h: CO2 decays towards the air and is held where to stop. What the animals breathe out meanwhile is left out, so it goes no faster than this.</summary>
    /// <param name="water">The water.</param>
    /// <param name="perHour">Exchange rate, 1/h; known to a factor only, which spreads where the water is at a time.</param>
    /// <param name="stopMgL">CO2 at which to stop, mg/L; 0 for the air's own.</param>
    public static IReadOnlyList<RemedyPoint> Of(WaterModel water, double perHour, double stopMgL)
    {
        var path = new List<RemedyPoint>(TicksS.Length);
        foreach (double seconds in TicksS)
        {
            double hours = seconds / 3600;
            Predicted at(WaterChain chain, double rate) => chain.AtCo2(Left(chain, rate * hours, stopMgL));
            if (water.Predict(c => at(c, perHour), c => at(c, perHour * Math.Exp(RateLnU)), c => at(c, perHour * Math.Exp(-RateLnU))) is { } then)
                path.Add(new RemedyPoint(seconds, then.Co2MgL, then.Nh3NMgL, then.PH));
        }

        return path;
    }

    private static double Left(WaterChain chain, double exchanges, double stopMgL)
    {
        double reached = chain.AirCo2MgL + (chain.Co2MgL - chain.AirCo2MgL) * Math.Exp(-exchanges);
        return chain.Co2MgL > stopMgL ? Math.Max(reached, stopMgL) : chain.Co2MgL;
    }
}
