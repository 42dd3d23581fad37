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
        double share = solution.Constants switch
        {
            ConstantSet.Fresh => 0,
            ConstantSet.Auto => Blend.ShareOfSea(solution.Salinity),
            ConstantSet.Millero2010 or ConstantSet.Waters2014 or ConstantSet.Lueker2000 => 1,
        };
        CarbonateState state = share switch
        {
            0 => new FreshWater(solution, shift).Solve(input),
            1 => new SeaWater(solution, shift).Solve(input),
            _ => Blended(new FreshWater(solution, shift).Solve(input), new SeaWater(solution, shift).Solve(input), share),
        };
        return state with { DensityKgPerL = Density.KgPerL(solution.TemperatureC, solution.Salinity) };
    }

    private static CarbonateState Blended(in CarbonateState fresh, in CarbonateState sea, double w)
    {
        if (fresh.Status != SolveStatus.Solved)
            return fresh;
        if (sea.Status != SolveStatus.Solved)
            return sea;
        return new CarbonateState
        {
            Status = SolveStatus.Solved,
            Caveats = fresh.Caveats | sea.Caveats | Caveats.Blended,
            PhNbs = Mean(fresh.PhNbs, sea.PhNbs, w),
            PhTotal = Mean(fresh.PhTotal, sea.PhTotal, w),
            PhSeawater = Mean(fresh.PhSeawater, sea.PhSeawater, w),
            PhFree = Mean(fresh.PhFree, sea.PhFree, w),
            AlkalinityUmolKg = Mean(fresh.AlkalinityUmolKg, sea.AlkalinityUmolKg, w),
            DicUmolKg = Mean(fresh.DicUmolKg, sea.DicUmolKg, w),
            Co2UmolKg = Geometric(fresh.Co2UmolKg, sea.Co2UmolKg, w),
            Hco3UmolKg = Geometric(fresh.Hco3UmolKg, sea.Hco3UmolKg, w),
            Co3UmolKg = Geometric(fresh.Co3UmolKg, sea.Co3UmolKg, w),
            Pco2Uatm = Geometric(fresh.Pco2Uatm, sea.Pco2Uatm, w),
            Fco2Uatm = Geometric(fresh.Fco2Uatm, sea.Fco2Uatm, w),
            BufferClosedUmolKg = Geometric(fresh.BufferClosedUmolKg, sea.BufferClosedUmolKg, w),
            BufferOpenUmolKg = Geometric(fresh.BufferOpenUmolKg, sea.BufferOpenUmolKg, w),
            OmegaCalcite = Geometric(fresh.OmegaCalcite, sea.OmegaCalcite, w),
            OmegaAragonite = Geometric(fresh.OmegaAragonite, sea.OmegaAragonite, w),
            Nh3Fraction = Geometric(fresh.Nh3Fraction, sea.Nh3Fraction, w),
            IonicStrengthMolKg = Mean(fresh.IonicStrengthMolKg, sea.IonicStrengthMolKg, w),
        };
    }

    private static double Mean(double a, double b, double w) => a + w * (b - a);

    private static double Geometric(double a, double b, double w) => a > 0 && b > 0 ? a * Math.Pow(b / a, w) : Mean(a, b, w);
}
