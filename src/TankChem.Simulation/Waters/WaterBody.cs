using TankChem.Chemistry;

namespace TankChem.Simulation.Waters;

/// <summary>A well-mixed virtual water. It changes only by <see cref="Book"/>, which keeps the account as well.</summary>
/// <remarks>
/// The carbonate system is solved exactly when the water has moved by more than <see cref="RefreshShare"/>, and followed to first order between:
/// with the intensities the chemistry gives, ∂CO2/∂DIC at constant alkalinity is (CO2/DIC)·β_open/β_closed, and ∂CO2/∂Alk at constant DIC is
/// −CO2·(β_open − β_closed)/(β_closed·A), A the carbonate alkalinity. Both follow from DIC and alkalinity as functions of pH and ln CO2 (total differential).
/// </remarks>
public sealed class WaterBody
{
    /// <summary>Relative move of DIC, alkalinity or CO2 after which the carbonate system is solved anew.</summary>
    public const double RefreshShare = 0.01;

    private const double RefreshTemperatureC = 0.2;

    private readonly Solution _solution;
    private WaterAmounts _solvedFor;
    private double _solvedAtC;
    private double _co2MmolL;
    private double _slopeDic;
    private double _slopeAlkalinity;
    private double _pco2Uatm;
    private bool _isSolved;

    /// <summary>A water of a recipe.</summary>
    /// <param name="volumeM3">Volume, m³, &gt; 0; constant.</param>
    /// <param name="recipe">What it is made of.</param>
    /// <param name="temperatureC">Temperature at the start, °C.</param>
    /// <param name="air">The air it starts under.</param>
    public WaterBody(double volumeM3, WaterRecipe recipe, double temperatureC, Air air)
    {
        ArgumentNullException.ThrowIfNull(recipe);
        if (!(volumeM3 > 0))
            throw new ArgumentOutOfRangeException(nameof(volumeM3), volumeM3, "The volume of a water must be above 0 m³.");
        VolumeM3 = volumeM3;
        Salinity = recipe.Salinity;
        TemperatureC = temperatureC;
        PressureAtm = air.PressureAtm;
        Amounts = recipe.AmountsAt(temperatureC, air);
        _solution = new Solution { TemperatureC = temperatureC, Salinity = recipe.Salinity, PressureAtm = air.PressureAtm, Ions = recipe.Ions };
    }

    /// <summary>Volume, m³.</summary>
    public double VolumeM3 { get; }

    /// <summary>Practical salinity.</summary>
    public double Salinity { get; }

    /// <summary>Temperature, °C.</summary>
    public double TemperatureC { get; set; }

    /// <summary>Barometric pressure, atm.</summary>
    public double PressureAtm { get; set; }

    /// <summary>What the water holds now.</summary>
    public WaterAmounts Amounts { get; private set; }

    /// <summary>Who brought it there.</summary>
    public WaterLedger Ledger { get; } = new();

    /// <summary>Dissolved CO2, mmol/L, followed to first order from the last exact solution.</summary>
    public double Co2MmolL
    {
        get
        {
            Refresh();
            return FollowedCo2;
        }
    }

    /// <summary>∂CO2/∂DIC at constant alkalinity, 0…1.</summary>
    public double Co2SlopePerDic
    {
        get
        {
            Refresh();
            return _slopeDic;
        }
    }

    private double FollowedCo2 => Math.Max(
        0.02 * _co2MmolL,
        _co2MmolL + _slopeDic * (Amounts.Dic - _solvedFor.Dic) + _slopeAlkalinity * (Amounts.Alkalinity - _solvedFor.Alkalinity));

    /// <summary>Changes the water and enters it in the ledger.</summary>
    /// <param name="process">What changes it.</param>
    /// <param name="change">The change, mmol/L.</param>
    public void Book(WaterProcess process, WaterAmounts change)
    {
        Amounts += change;
        Ledger.Book(process, change * VolumeM3);
    }

    /// <summary>CO2, mmol/L, that this water would hold in equilibrium with an air (Henry's law from the solved state).</summary>
    public double Co2InEquilibriumWith(Air air)
    {
        Refresh();
        return _co2MmolL / _pco2Uatm * Atmosphere.Pco2Uatm(air.Co2Ppm, air.PressureAtm, TemperatureC, Salinity);
    }

    /// <summary>Oxygen, mmol/L, in equilibrium with the air.</summary>
    public double SaturatedOxygenMmolL => DissolvedOxygen.SaturationMgL(TemperatureC, Salinity, PressureAtm) / Molar.Oxygen;

    /// <summary>Solves the carbonate system exactly. To look changes nothing.</summary>
    public CarbonateState Solve()
    {
        double perKg = PerKg;
        Solution solution = _solution with { TemperatureC = TemperatureC, PressureAtm = PressureAtm, AmmoniaUmolKg = Amounts.Tan * perKg };
        CarbonateState state = CarbonateSystem.Solve(solution, new CarbonateInput
        {
            DicUmolKg = Amounts.Dic * perKg,
            AlkalinityUmolKg = Amounts.Alkalinity * perKg,
        });
        return state.Status == SolveStatus.Solved
            ? state
            : throw new InvalidOperationException(
                $"The virtual water left what the chemistry can solve ({state.Status}: {state.FaultyArgument}) at {Amounts}, {TemperatureC} °C, S {Salinity}. Its processes take more than it holds.");
    }

    private double PerKg => 1000 / Density.KgPerL(TemperatureC, Salinity);

    private void Refresh()
    {
        if (!_isSolved
            || Math.Abs(Amounts.Dic - _solvedFor.Dic) > RefreshShare * _solvedFor.Dic
            || Math.Abs(Amounts.Alkalinity - _solvedFor.Alkalinity) > RefreshShare * Math.Abs(_solvedFor.Alkalinity)
            || Math.Abs(FollowedCo2 - _co2MmolL) > 4 * RefreshShare * _co2MmolL
            || Math.Abs(TemperatureC - _solvedAtC) > RefreshTemperatureC)
        {
            Follow(Solve());
        }
    }

    private void Follow(in CarbonateState state)
    {
        double perKg = PerKg;
        double carbonateAlkalinity = (state.Hco3UmolKg + 2 * state.Co3UmolKg) / perKg;
        _solvedFor = Amounts;
        _solvedAtC = TemperatureC;
        _pco2Uatm = state.Pco2Uatm;
        _co2MmolL = state.Co2UmolKg / perKg;
        _slopeDic = Math.Clamp(state.Co2UmolKg / state.DicUmolKg * state.BufferOpenUmolKg / state.BufferClosedUmolKg, 1e-6, 1);
        _slopeAlkalinity = -_co2MmolL * (state.BufferOpenUmolKg - state.BufferClosedUmolKg) / (state.BufferClosedUmolKg * carbonateAlkalinity);
        _isSolved = true;
    }
}
