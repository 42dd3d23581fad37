using TankChem.Chemistry;
using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Tanks;

/// <summary>A tank that lives: its water changes by gas exchange, respiration, photosynthesis, nitrification, calcification, dosing and exchange.</summary>
/// <remarks>It has no clock: <see cref="Advance"/> is told from when to when. The day is that of UTC. The same calls give the same water, to the bit.</remarks>
public sealed class VirtualTank
{
    /// <summary>Longest step the processes are taken in.</summary>
    public static readonly TimeSpan LongestStep = TimeSpan.FromSeconds(60);

    private readonly TankSettings _settings;
    private readonly WaterAmounts _source;

    /// <summary>A tank under an air at a time.</summary>
    /// <param name="settings">What it is.</param>
    /// <param name="start">When it starts.</param>
    /// <param name="air">The air it starts under.</param>
    public VirtualTank(TankSettings settings, DateTimeOffset start, Air air)
    {
        ArgumentNullException.ThrowIfNull(settings);
        if (settings.ExchangePerDay > 0 && settings.SourceWater is null)
            throw new ArgumentException($"{nameof(settings.ExchangePerDay)} is {settings.ExchangePerDay} a day, but there is no {nameof(settings.SourceWater)} to exchange with.", nameof(settings));
        _settings = settings;
        Water = new WaterBody(settings.VolumeM3, settings.Water, settings.Temperature.At(start), air);
        _source = settings.SourceWater?.AmountsAt(settings.Temperature.MeanC, air) ?? default;
        Time = start;
    }

    /// <summary>Its water.</summary>
    public WaterBody Water { get; }

    /// <summary>What can be changed while it runs.</summary>
    public TankControls Controls { get; } = new();

    /// <summary>How far it has got.</summary>
    public DateTimeOffset Time { get; private set; }

    /// <summary>Light now, µmol/(m² s).</summary>
    public double Light => _settings.Lamp?.At(Time.UtcDateTime.TimeOfDay.TotalHours) ?? 0;

    /// <summary>Whether CO2 flows now.</summary>
    public bool InjectionOn => _settings.Injector is { } injector && (Controls.ValveStuck ?? injector.Hours.Contains(TimeOnly.FromTimeSpan(Time.UtcDateTime.TimeOfDay)));

    /// <summary>CO2 that flows now, g/h.</summary>
    public double InjectionGramsPerHour => InjectionOn ? _settings.Injector!.GramsPerHour * Controls.InjectionShare : 0;

    /// <summary>The water's carbonate system, solved exactly.</summary>
    public CarbonateState Solve() => Water.Solve();

    /// <summary>Lets the tank live until a time, in steps of at most <see cref="LongestStep"/>.</summary>
    /// <param name="until">Until when; not before <see cref="Time"/>.</param>
    /// <param name="air">The air above meanwhile.</param>
    public void Advance(DateTimeOffset until, Air air)
    {
        if (until < Time)
            throw new ArgumentOutOfRangeException(nameof(until), until, $"The tank is at {Time:O} already and cannot go back.");
        while (Time < until)
        {
            TimeSpan step = until - Time < LongestStep ? until - Time : LongestStep;
            Step(step, air);
        }
    }

    /// <summary>Adds a dose at once.</summary>
    /// <param name="alkalinityMol">Alkalinity, mol.</param>
    /// <param name="carbonMol">Inorganic carbon that comes with it, mol; as much as the alkalinity for bicarbonate.</param>
    public void Dose(double alkalinityMol, double carbonMol) =>
        Water.Book(WaterProcess.Dosing, new WaterAmounts(carbonMol, alkalinityMol, 0, 0, 0, 0) * (1 / Water.VolumeM3));

    /// <summary>Exchanges a share of the water for source water at once.</summary>
    /// <param name="share">Share of the volume, 0…1.</param>
    public void ExchangeWater(double share)
    {
        if (share is not (>= 0 and <= 1))
            throw new ArgumentOutOfRangeException(nameof(share), share, "The share of the water exchanged is from 0 to 1.");
        if (_settings.SourceWater is null)
            throw new InvalidOperationException("The tank has no source water to exchange with.");
        Water.Book(WaterProcess.Exchange, (_source - Water.Amounts) * share);
    }

    internal void Step(TimeSpan step, Air air)
    {
        double hours = step.TotalHours;
        double hourOfDay = Time.UtcDateTime.TimeOfDay.TotalHours;
        Water.PressureAtm = air.PressureAtm;

        double light = Light;
        WaterAmounts respiration = _settings.Stock?.Rates(Water, hourOfDay, Controls.FeedShare) ?? default;
        WaterAmounts plants = _settings.Plants?.Rates(Water, light) ?? default;
        WaterAmounts nitrification = _settings.Nitrification?.Rates(Water, hours) ?? default;
        WaterAmounts calcification = _settings.Calcification?.Rates(_settings.Lamp is { } lamp ? light / lamp.Full : 0) ?? default;
        WaterAmounts injection = new(InjectionGramsPerHour / MolarMass.Co2 / Water.VolumeM3, 0, 0, 0, 0, 0);
        WaterAmounts oxygen = Controls.OxygenOn ? _settings.Oxygen?.Rates(Water) ?? default : default;
        WaterAmounts dosing = Controls.DoserOn ? _settings.Doser?.Rates(Water) ?? default : default;
        WaterAmounts exchange = _settings.ExchangePerDay > 0 ? (_source - Water.Amounts) * (_settings.ExchangePerDay * Controls.ExchangeShare / 24) : default;
        WaterAmounts all = respiration + plants + nitrification + calcification + injection + oxygen + dosing + exchange;

        double kla = _settings.Kla20PerHour + (Controls.DegasserOn ? _settings.DegasserKla20PerHour : 0);
        WaterAmounts gas = GasTransfer.Transfer(Water, kla, air, all, hours);

        Water.Book(WaterProcess.Respiration, respiration * hours);
        Water.Book(WaterProcess.Photosynthesis, plants * hours);
        Water.Book(WaterProcess.Nitrification, nitrification * hours);
        Water.Book(WaterProcess.Calcification, calcification * hours);
        Water.Book(WaterProcess.Injection, injection * hours);
        Water.Book(WaterProcess.OxygenSupply, oxygen * hours);
        Water.Book(WaterProcess.Dosing, dosing * hours);
        Water.Book(WaterProcess.Exchange, exchange * hours);
        Water.Book(WaterProcess.GasExchange, gas);
        Time += step;
        Water.TemperatureC = _settings.Temperature.At(Time);
    }
}
