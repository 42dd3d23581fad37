namespace TankChem.Chemistry;

/// <summary>How a computation ended.</summary>
public enum SolveStatus
{
    /// <summary>The state is the answer.</summary>
    Solved,

    /// <summary>An argument is missing, not a number, or outside its physical range; <see cref="CarbonateState.FaultyArgument"/> names it.</summary>
    InvalidInput,

    /// <summary>No water has these two values (for example a negative DIC).</summary>
    Impossible,

    /// <summary>The iteration cap was reached.</summary>
    NotConverged,
}
