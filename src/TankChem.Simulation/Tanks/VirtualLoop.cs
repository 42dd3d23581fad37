using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Tanks;

/// <summary>Tanks that share their water through a treatment (biofilter, degasser, sump), each with a flow of its own there and back.</summary>
public sealed class VirtualLoop
{
    private readonly List<(VirtualTank Tank, double FlowM3PerHour)> _tanks = [];

    /// <summary>A loop around a treatment.</summary>
    /// <param name="treatment">The treatment's water and equipment.</param>
    public VirtualLoop(VirtualTank treatment)
    {
        ArgumentNullException.ThrowIfNull(treatment);
        Treatment = treatment;
    }

    /// <summary>The treatment.</summary>
    public VirtualTank Treatment { get; }

    /// <summary>The tanks.</summary>
    public IEnumerable<VirtualTank> Tanks => _tanks.Select(tank => tank.Tank);

    /// <summary>How far it has got.</summary>
    public DateTimeOffset Time => Treatment.Time;

    /// <summary>Adds a tank.</summary>
    /// <param name="tank">The tank, at the same time as the treatment.</param>
    /// <param name="flowM3PerHour">Flow there and back, m³/h.</param>
    public void Add(VirtualTank tank, double flowM3PerHour)
    {
        ArgumentNullException.ThrowIfNull(tank);
        if (tank.Time != Time)
            throw new ArgumentException($"The tank is at {tank.Time:O}, the treatment at {Time:O}; all waters of a loop start together.", nameof(tank));
        if (!(flowM3PerHour >= 0))
            throw new ArgumentOutOfRangeException(nameof(flowM3PerHour), flowM3PerHour, "A flow is 0 m³/h or more.");
        _tanks.Add((tank, flowM3PerHour));
    }

    /// <summary>Lets the loop live until a time.</summary>
    /// <param name="until">Until when; not before <see cref="Time"/>.</param>
    /// <param name="air">The air above meanwhile.</param>
    public void Advance(DateTimeOffset until, Air air)
    {
        if (until < Time)
            throw new ArgumentOutOfRangeException(nameof(until), until, $"The loop is at {Time:O} already and cannot go back.");
        while (Time < until)
        {
            TimeSpan step = until - Time < VirtualTank.LongestStep ? until - Time : VirtualTank.LongestStep;
            foreach ((VirtualTank tank, _) in _tanks)
                tank.Step(step, air);
            Treatment.Step(step, air);
            foreach ((VirtualTank tank, double flow) in _tanks)
                Exchange(tank.Water, Treatment.Water, flow * step.TotalHours);
        }
    }

    // Two well-mixed waters that swap v: their difference decays by exp(−v(1/Va + 1/Vb)), and nothing is lost.
    private static void Exchange(WaterBody tank, WaterBody treatment, double swappedM3)
    {
        double reduced = tank.VolumeM3 * treatment.VolumeM3 / (tank.VolumeM3 + treatment.VolumeM3);
        double movedM3 = reduced * (1 - Math.Exp(-swappedM3 / reduced));
        WaterAmounts moved = (treatment.Amounts - tank.Amounts) * movedM3;
        tank.Book(WaterProcess.LoopFlow, moved * (1 / tank.VolumeM3));
        treatment.Book(WaterProcess.LoopFlow, moved * (-1 / treatment.VolumeM3));
    }
}
