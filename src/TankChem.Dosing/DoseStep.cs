namespace TankChem.Dosing;

/// <summary>One portion of a plan and what it does.</summary>
public sealed record DoseStep
{
    /// <summary>Seconds after the plan's start.</summary>
    public required double AfterS { get; init; }

    /// <summary>Reagent id, e.g. <c>sodium-bicarbonate</c>.</summary>
    public required string Reagent { get; init; }

    /// <summary>Mass of reagent, g.</summary>
    public required double AmountG { get; init; }

    /// <summary>With no gas exchanged.</summary>
    public required PredictedWater Closed { get; init; }

    /// <summary>Back at the place's own CO2 (its pCO2 before the dose).</summary>
    public required PredictedWater Settled { get; init; }

    /// <summary>In equilibrium with the air above the place.</summary>
    public required PredictedWater Air { get; init; }
}
