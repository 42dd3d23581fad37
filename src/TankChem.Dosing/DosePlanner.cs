namespace TankChem.Dosing;

/// <summary>Makes and judges dose plans. Pure: the same problem gives the same plan.</summary>
public static class DosePlanner
{
    /// <summary>A plan that brings alkalinity to the target with the first of the reagents that is allowed, or a refusal with its grounds.</summary>
    /// <param name="problem">The water.</param>
    /// <param name="target">What it shall be.</param>
    /// <param name="reagents">Reagent ids in order of preference; empty for the planner's own choice.</param>
    public static DosePlan Plan(DoseProblem problem, DoseTarget target, IReadOnlyList<string> reagents) => throw new NotSupportedException();
}
