using TankChem.Chemistry;

namespace TankChem.Dosing;

/// <summary>One tank's water as a starting point from which doses are computed; one set of input values.</summary>
internal sealed class WaterChain
{
    private readonly Solution solution;
    private readonly double airPco2Uatm;
    private readonly double tanMgL;
    private readonly CarbonateState start;

    /// <summary>A chain from the tank's values, each moved by so many of its standard uncertainties.</summary>
    public WaterChain(DoseWater water, double phSigmas, double alkalinitySigmas, double tanSigmas)
    {
        double tan = water.TanMgL is { } known ? Math.Max(0, known.Value + tanSigmas * known.StandardUncertainty) : double.NaN;
        tanMgL = tan;
        double density = Density.KgPerL(water.Solution.TemperatureC, water.Solution.Salinity);
        solution = double.IsNaN(tan) ? water.Solution : water.Solution with { AmmoniaUmolKg = tan / MolarMass.Nitrogen * 1000 / density };
        airPco2Uatm = water.AirPco2Uatm;
        start = CarbonateSystem.Solve(solution, new CarbonateInput
        {
            PH = water.PH.Value + phSigmas * water.PH.StandardUncertainty,
            AlkalinityUmolKg = Math.Max(1, water.AlkalinityUmolKg.Value + alkalinitySigmas * water.AlkalinityUmolKg.StandardUncertainty),
        });
    }

    /// <summary>Whether the start is a possible water.</summary>
    public bool IsPossible => start.Status == SolveStatus.Solved;

    /// <summary>As it is.</summary>
    public Predicted Now => Of(start);

    /// <summary>After a dose, no gas exchanged.</summary>
    /// <param name="reagent">The reagent.</param>
    /// <param name="addedUmolKg">Alkalinity it adds, µmol/kg.</param>
    public Predicted Closed(Reagent reagent, double addedUmolKg) => Of(CarbonateSystem.Solve(
        With(reagent, addedUmolKg),
        new CarbonateInput { AlkalinityUmolKg = start.AlkalinityUmolKg + addedUmolKg, DicUmolKg = start.DicUmolKg + addedUmolKg * reagent.CarbonPerMole / reagent.EquivalentsPerMole }));

    /// <summary>After a portion on top of what has settled already, no gas exchanged since then.</summary>
    public Predicted ClosedFromSettled(Reagent reagent, double settledUmolKg, double addedUmolKg)
    {
        CarbonateState settled = SettledState(reagent, settledUmolKg);
        return settled.Status != SolveStatus.Solved ? Of(settled) : Of(CarbonateSystem.Solve(
            With(reagent, settledUmolKg + addedUmolKg),
            new CarbonateInput { AlkalinityUmolKg = settled.AlkalinityUmolKg + addedUmolKg, DicUmolKg = settled.DicUmolKg + addedUmolKg * reagent.CarbonPerMole / reagent.EquivalentsPerMole }));
    }

    /// <summary>After a dose, back at the tank's own pCO2.</summary>
    public Predicted Settled(Reagent reagent, double addedUmolKg) => Of(SettledState(reagent, addedUmolKg));

    /// <summary>After a dose, in equilibrium with the air above it.</summary>
    public Predicted Air(Reagent reagent, double addedUmolKg) => AtPco2(reagent, addedUmolKg, airPco2Uatm);

    /// <summary>Without a dose, at a pCO2 between its own (share 0) and that of its air (share 1).</summary>
    public Predicted Towards(double share)
    {
        double pco2 = start.Pco2Uatm + share * (airPco2Uatm - start.Pco2Uatm);
        return AtPco2(ReagentCatalog.All[0], 0, pco2);
    }

    /// <summary>Without a dose, at a given dissolved CO2, mg/L.</summary>
    public Predicted AtCo2(double co2MgL) => AtPco2(ReagentCatalog.All[0], 0, start.Pco2Uatm * co2MgL / start.Co2MgL);

    private Predicted AtPco2(Reagent reagent, double addedUmolKg, double pco2Uatm) => Of(CarbonateSystem.Solve(
        With(reagent, addedUmolKg), new CarbonateInput { AlkalinityUmolKg = start.AlkalinityUmolKg + addedUmolKg, Pco2Uatm = pco2Uatm }));

    private CarbonateState SettledState(Reagent reagent, double addedUmolKg) => CarbonateSystem.Solve(
        With(reagent, addedUmolKg), new CarbonateInput { AlkalinityUmolKg = start.AlkalinityUmolKg + addedUmolKg, Pco2Uatm = start.Pco2Uatm });

    /// <summary>The reagent's own cations change the ionic strength where the ions are known.</summary>
    private Solution With(Reagent reagent, double addedUmolKg)
    {
        if (solution.Ions is not { } ions || addedUmolKg == 0)
            return solution;
        double mmol = addedUmolKg / reagent.EquivalentsPerMole / 1000;
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
            solution.Ions is not null || solution.HardnessMmolKg is not null || solution.Salinity > 5 ? state.OmegaCalcite : double.NaN)
        : default;
}

/// <summary>What a chain predicts; <see cref="PH"/> 0 where it could not be computed, NaN where an input is not known.</summary>
internal readonly record struct Predicted(double PH, double Co2MgL, double Nh3NMgL, double AlkalinityMmolL, double OmegaCalcite)
{
    /// <summary>Whether there is a prediction.</summary>
    public bool IsSolved => PH > 0;
}
