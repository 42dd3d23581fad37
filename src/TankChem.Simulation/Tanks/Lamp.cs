namespace TankChem.Simulation.Tanks;

/// <summary>Light over a tank that fades in and out.</summary>
/// <param name="Hours">When it is lit.</param>
/// <param name="Full">Full light, µmol/(m² s).</param>
/// <param name="FadeHours">How long it fades in, and out, h.</param>
public sealed record Lamp(Hours Hours, double Full, double FadeHours = 0.5)
{
    /// <summary>Light at an hour of the day, µmol/(m² s).</summary>
    /// <param name="hourOfDay">Hour of the day, 0…24.</param>
    public double At(double hourOfDay)
    {
        double start = Hours.Start.ToTimeSpan().TotalHours;
        double lit = (Hours.End - Hours.Start).TotalHours;
        double since = (hourOfDay - start + 24) % 24;
        if (since >= lit)
            return 0;
        double ramp = Math.Min(since, lit - since);
        return Full * Math.Min(1, ramp / FadeHours);
    }
}
