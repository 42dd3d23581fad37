namespace TankChem.Dosing;

/// <summary>What to do about CO2 that is too high (or about to be), never base first.</summary>
public static class RemedyAdvisor
{
    /// <summary>Gas off, more air with the ammonia check and where to stop, and what not to do.</summary>
    /// <param name="problem">The water; its missing inputs are named in the advice instead of refusing it: gas off never waits for a titration.</param>
    /// <param name="hasInjection">Whether CO2 is injected there.</param>
    public static IReadOnlyList<Remedy> ForHighCo2(DoseProblem problem, bool hasInjection) => throw new NotSupportedException();
}
