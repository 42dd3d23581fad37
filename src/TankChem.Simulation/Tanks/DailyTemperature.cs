namespace TankChem.Simulation.Tanks;

/// <summary>Water temperature as a daily wave on a slow one.</summary>
/// <param name="MeanC">Mean, °C.</param>
/// <param name="SwingC">Half of the daily swing, °C.</param>
/// <param name="WarmestHour">Hour of the day at which it is warmest.</param>
/// <param name="SlowSwingC">Half of the swing over about nine days, °C.</param>
public readonly record struct DailyTemperature(double MeanC, double SwingC = 0, double WarmestHour = 16, double SlowSwingC = 0)
{
    private const double SlowPeriodDays = 9.3;

    /// <summary>Temperature at a time, °C.</summary>
    public double At(DateTimeOffset time)
    {
        double hour = time.UtcDateTime.TimeOfDay.TotalHours;
        double days = (time.UtcDateTime - DateTime.UnixEpoch).TotalDays;
        return MeanC + SwingC * Math.Cos(2 * Math.PI * (hour - WarmestHour) / 24) + SlowSwingC * Math.Sin(2 * Math.PI * days / SlowPeriodDays);
    }
}
