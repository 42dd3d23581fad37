using TankChem.Chemistry;

namespace TankChem.Dosing;

/// <summary>One tank's water as a starting point from which doses are computed; one set of input values.</summary>
/// <remarks>Alkalinity and carbon are kept as amounts: a dose adds equivalents and carbon to what is there, the chemistry says what pH that makes. Doses are given as planned, µmol/kg on the recorded volume;
/// in a chain whose volume is another the same mass makes another difference.</remarks>
internal sealed class WaterChain
{
    private readonly Solution solution;
    private readonly double airPco2Uatm;
    private readonly double tanMgL;
    private readonly double strength;
    private readonly bool hasCalcium;
    private readonly CarbonateState start;

    // The judge asks for the same few states in turn: before and after a portion settled, and right after it.
    private (Reagent? Reagent, double AddedUmolKg, CarbonateState State) settledNewer;
    private (Reagent? Reagent, double AddedUmolKg, CarbonateState State) settledOlder;
    private (Reagent? Reagent, double SettledUmolKg, double AddedUmolKg, CarbonateState State) closed;

    /// <summary>A chain from the tank's values, each moved by so many of its standard uncertainties.</summary>
    public WaterChain(DoseWater water, double volumeRelativeU, in Shift shift)
    {
        tanMgL = water.TanMgL is { } known ? Math.Max(0, known.Value + shift.Tan * known.StandardUncertainty) : double.NaN;
        double temperatureC = water.Solution.TemperatureC + shift.Temperature * water.TemperatureU;
        double density = Density.KgPerL(temperatureC, water.Solution.Salinity);
        solution = water.Solution with
        {
            TemperatureC = temperatureC,
            AmmoniaUmolKg = double.IsNaN(tanMgL) ? water.Solution.AmmoniaUmolKg : tanMgL / MolarMass.Nitrogen * 1000 / density,
        };
        hasCalcium = solution.Ions is not null || solution.HardnessMmolKg is not null || solution.Salinity > 5;
        airPco2Uatm = water.AirPco2Uatm;
        strength = 1 / (1 + shift.Volume * volumeRelativeU);
        start = CarbonateSystem.Solve(solution, new CarbonateInput
        {
            PH = water.PH.Value + shift.PH * water.PH.StandardUncertainty,
            AlkalinityUmolKg = Math.Max(1, water.AlkalinityUmolKg.Value + shift.Alkalinity * water.AlkalinityUmolKg.StandardUncertainty),
        });
    }

    /// <summary>Whether the start is a possible water.</summary>
    public bool IsPossible => start.Status == SolveStatus.Solved;

    /// <summary>As it is.</summary>
    public Predicted Now => Of(start);

    /// <summary>Dissolved CO2 now, mg/L.</summary>
    public double Co2MgL => start.Co2MgL;

    /// <summary>Dissolved CO2 in equilibrium with the air, mg/L: proportional to pCO2 within the precision of any use here.</summary>
    public double AirCo2MgL => start.Co2MgL * airPco2Uatm / start.Pco2Uatm;

    /// <summary>After a dose, no gas exchanged.</summary>
    /// <param name="reagent">The reagent.</param>
    /// <param name="addedUmolKg">Alkalinity it adds, µmol/kg.</param>
    public Predicted Closed(Reagent reagent, double addedUmolKg) => Of(ClosedFrom(start, reagent, 0, addedUmolKg));

    /// <summary>After a portion on top of what has settled already, no gas exchanged since then.</summary>
    public Predicted ClosedFromSettled(Reagent reagent, double settledUmolKg, double addedUmolKg) => Of(ClosedState(reagent, settledUmolKg, addedUmolKg));

    /// <summary>After a dose, back at the tank's own pCO2.</summary>
    public Predicted Settled(Reagent reagent, double addedUmolKg) => Of(SettledState(reagent, addedUmolKg));

    /// <summary>After a dose, in equilibrium with the air above it.</summary>
    public Predicted Air(Reagent reagent, double addedUmolKg) => Of(AtPco2(reagent, addedUmolKg, airPco2Uatm));

    /// <summary>Without a dose, at a given dissolved CO2, mg/L.</summary>
    public Predicted AtCo2(double co2MgL) => Of(AtPco2(ReagentCatalog.All[0], 0, start.Pco2Uatm * co2MgL / start.Co2MgL));

    /// <summary>How far an amount lifts pH above what was settled before it, once it has settled too. NaN where it cannot be computed.</summary>
    public double PhRiseSettled(Reagent reagent, double settledUmolKg, double addedUmolKg)
    {
        CarbonateState before = SettledState(reagent, settledUmolKg);
        CarbonateState settled = SettledState(reagent, settledUmolKg + addedUmolKg);
        return before.Status == SolveStatus.Solved && settled.Status == SolveStatus.Solved ? settled.PhNbs - before.PhNbs : double.NaN;
    }

    /// <summary>How far a portion lifts pH above what was settled before it: right after it or settled, whichever is higher. NaN where it cannot be computed.</summary>
    public double PhRise(Reagent reagent, double settledUmolKg, double addedUmolKg)
    {
        CarbonateState before = SettledState(reagent, settledUmolKg), after = ClosedState(reagent, settledUmolKg, addedUmolKg);
        return after.Status == SolveStatus.Solved ? Math.Max(after.PhNbs - before.PhNbs, PhRiseSettled(reagent, settledUmolKg, addedUmolKg)) : double.NaN;
    }

    private CarbonateState ClosedState(Reagent reagent, double settledUmolKg, double addedUmolKg)
    {
        if (closed.Reagent != reagent || closed.SettledUmolKg != settledUmolKg || closed.AddedUmolKg != addedUmolKg)
        {
            CarbonateState settled = SettledState(reagent, settledUmolKg);
            closed = (reagent, settledUmolKg, addedUmolKg, settled.Status == SolveStatus.Solved ? ClosedFrom(settled, reagent, settledUmolKg, addedUmolKg) : settled);
        }

        return closed.State;
    }

    private CarbonateState ClosedFrom(in CarbonateState from, Reagent reagent, double beforeUmolKg, double addedUmolKg)
    {
        double added = addedUmolKg * strength;
        return CarbonateSystem.Solve(With(reagent, beforeUmolKg + addedUmolKg), new CarbonateInput
        {
            AlkalinityUmolKg = from.AlkalinityUmolKg + added,
            DicUmolKg = from.DicUmolKg + added * reagent.CarbonPerMole / reagent.EquivalentsPerMole,
        });
    }

    private CarbonateState SettledState(Reagent reagent, double addedUmolKg)
    {
        if (addedUmolKg == 0)
            return start;
        if (settledNewer.Reagent == reagent && settledNewer.AddedUmolKg == addedUmolKg)
            return settledNewer.State;
        if (settledOlder.Reagent == reagent && settledOlder.AddedUmolKg == addedUmolKg)
            return settledOlder.State;
        settledOlder = settledNewer;
        settledNewer = (reagent, addedUmolKg, AtPco2(reagent, addedUmolKg, start.Pco2Uatm));
        return settledNewer.State;
    }

    private CarbonateState AtPco2(Reagent reagent, double addedUmolKg, double pco2Uatm) => CarbonateSystem.Solve(
        With(reagent, addedUmolKg), new CarbonateInput { AlkalinityUmolKg = start.AlkalinityUmolKg + addedUmolKg * strength, Pco2Uatm = pco2Uatm });

    /// <summary>The reagent's own cations change the ionic strength where the ions are known.</summary>
    private Solution With(Reagent reagent, double addedUmolKg)
    {
        if (solution.Ions is not { } ions || addedUmolKg == 0)
            return solution;
        double mmol = addedUmolKg * strength / reagent.EquivalentsPerMole / 1000;
        return solution with
        {
            Ions = ions with
            {
                SodiumMmolKg = ions.SodiumMmolKg + mmol * reagent.SodiumPerMole,
                PotassiumMmolKg = ions.PotassiumMmolKg + mmol * reagent.PotassiumPerMole,
            },
        };
    }

    private Predicted Of(in CarbonateState state) => state.Status == SolveStatus.Solved
        ? new Predicted(
            state.PhNbs,
            state.Co2MgL,
            tanMgL * state.Nh3Fraction,
            state.AlkalinityUmolKg * state.DensityKgPerL / 1000,
            hasCalcium ? state.OmegaCalcite : double.NaN,
            hasCalcium ? state.OmegaAragonite : double.NaN)
        : default;
}

/// <summary>What a chain predicts; <see cref="PH"/> 0 where it could not be computed, NaN where an input is not known.</summary>
internal readonly record struct Predicted(double PH, double Co2MgL, double Nh3NMgL, double AlkalinityMmolL, double OmegaCalcite, double OmegaAragonite)
{
    /// <summary>Whether there is a prediction.</summary>
    public bool IsSolved => PH > 0;
}
