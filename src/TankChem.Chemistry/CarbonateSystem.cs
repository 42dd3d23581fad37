using TankChem.Chemistry.Fresh;
using TankChem.Chemistry.Sea;

namespace TankChem.Chemistry;

/// <summary>Solves the carbonate system of a water from any two of pH, alkalinity, DIC and pCO2.</summary>
public static class CarbonateSystem
{
    /// <summary>The full state of a water.</summary>
    /// <param name="solution">Temperature, salinity, ions, nutrients, constants.</param>
    /// <param name="input">Exactly two of pH, alkalinity, DIC, pCO2.</param>
    /// <returns>The state; <see cref="CarbonateState.Status"/> says whether it holds. Never throws for a number.</returns>
    public static CarbonateState Solve(Solution solution, in CarbonateInput input)
    {
        ArgumentNullException.ThrowIfNull(solution);
        return InputCheck.FaultOf(solution, input) is { } fault
            ? new CarbonateState { Status = SolveStatus.InvalidInput, FaultyArgument = fault }
            : Solve(solution, input, default);
    }

    /// <summary>Standard uncertainties of <see cref="Solve(Solution, in CarbonateInput)"/>'s answer from those of its inputs and of the constants, first order, inputs independent.</summary>
    public static CarbonateUncertainty Propagate(Solution solution, in CarbonateInput input, in CarbonateState state, in InputUncertainty uncertainty)
    {
        ArgumentNullException.ThrowIfNull(solution);
        if (state.Status != SolveStatus.Solved)
            throw new ArgumentException($"Only a solved state has an uncertainty; this one is {state.Status}.", nameof(state));
        return Propagation.Of(solution, input, state, uncertainty);
    }

    /// <summary>Solves without looking at the input again, with constants shifted.</summary>
    internal static CarbonateState Solve(Solution solution, in CarbonateInput input, in ConstantShift shift)
    {
        double share = ShareOfSea(solution);
        CarbonateState state = share switch
        {
            0 => new FreshWater(solution, shift).Solve(input),
            1 => new SeaWater(solution, shift).Solve(input),
            _ => new BrackishWater(solution, shift, share).Solve(input),
        };
        if (state.Status is SolveStatus.Solved or SolveStatus.NotConverged && !Holds(state))
        {
            // Also where carbonate outgrew every bound before the ions were found.
            return new CarbonateState
            {
                Status = SolveStatus.Impossible,
                FaultyArgument = "together these two values ask for an alkalinity above 200000 or a DIC above 500000 µmol/kg, more than this model of water holds for",
            };
        }

        return state.Status != SolveStatus.Solved ? state : state with { DensityKgPerL = Density.KgPerL(solution.TemperatureC, solution.Salinity) };
    }

    /// <summary>Whether an answer stays within what would be taken as input; a millionth more is rounding.</summary>
    private static bool Holds(in CarbonateState state) =>
        state.AlkalinityUmolKg <= InputCheck.AlkalinityMaxUmolKg * (1 + 1e-6) && state.DicUmolKg <= InputCheck.DicMaxUmolKg * (1 + 1e-6)
        && double.IsFinite(state.AlkalinityUmolKg) && double.IsFinite(state.Co2UmolKg) && double.IsFinite(state.PhNbs);

    /// <summary>Share of the sea-water model in the answer: 0 fresh, 1 sea.</summary>
    internal static double ShareOfSea(Solution solution) => solution.Constants switch
    {
        ConstantSet.Fresh => 0,
        ConstantSet.Auto => Blend.ShareOfSea(solution.Salinity),
        ConstantSet.Millero2010 or ConstantSet.Waters2014 or ConstantSet.Lueker2000 => 1,
    };
}
