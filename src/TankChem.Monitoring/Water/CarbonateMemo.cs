using TankChem.Chemistry;

namespace TankChem.Monitoring.Water;

/// <summary>Remembers the last solved waters of one place: most steps bring another quantity, and the carbonate system is by far the dearest part of a step. Gives exactly what solving anew would.</summary>
internal sealed class CarbonateMemo
{
    private (Solution Solution, CarbonateInput Input, InputUncertainty Uncertainty, CarbonateState State, CarbonateUncertainty Answer)? _water;
    private (Solution Solution, CarbonateInput Input, CarbonateState State)? _air;
    private (Solution Solution, CarbonateInput Input, CarbonateState State)? _injected;

    /// <summary>The water with its uncertainty; the latter is only worth something when the state is solved.</summary>
    public (CarbonateState State, CarbonateUncertainty Uncertainty) Water(Solution solution, in CarbonateInput input, in InputUncertainty uncertainty)
    {
        if (_water is { } known && known.Input == input && known.Uncertainty == uncertainty && known.Solution == solution)
            return (known.State, known.Answer);
        CarbonateState state = CarbonateSystem.Solve(solution, input);
        CarbonateUncertainty answer = state.Status == SolveStatus.Solved ? CarbonateSystem.Propagate(solution, input, state, uncertainty) : default;
        _water = (solution, input, uncertainty, state, answer);
        return (state, answer);
    }

    /// <summary>The water in equilibrium with its air.</summary>
    public CarbonateState Air(Solution solution, in CarbonateInput input) => AtGas(ref _air, solution, input);

    /// <summary>The water in equilibrium with the CO2 supply.</summary>
    public CarbonateState Injected(Solution solution, in CarbonateInput input) => AtGas(ref _injected, solution, input);

    private static CarbonateState AtGas(ref (Solution Solution, CarbonateInput Input, CarbonateState State)? memo, Solution solution, in CarbonateInput input)
    {
        if (memo is { } known && known.Input == input && known.Solution == solution)
            return known.State;
        CarbonateState state = CarbonateSystem.Solve(solution, input);
        memo = (solution, input, state);
        return state;
    }
}
