namespace TankChem.Chemistry;

/// <summary>Solves the carbonate system of a water from any two of pH, alkalinity, DIC and pCO2.</summary>
public static class CarbonateSystem
{
    /// <summary>The full state of a water.</summary>
    public static CarbonateState Solve(Solution solution, in CarbonateInput input) => throw new NotSupportedException();

    /// <summary>Standard uncertainties of <see cref="Solve"/>'s answer from those of its inputs, first order.</summary>
    public static CarbonateUncertainty Propagate(Solution solution, in CarbonateInput input, in CarbonateState state, in InputUncertainty uncertainty) => throw new NotSupportedException();
}
