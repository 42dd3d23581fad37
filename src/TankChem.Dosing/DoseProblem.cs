namespace TankChem.Dosing;

/// <summary>What a dose plan is made from: the shared water, each tank it reaches, and what stands in the way.</summary>
public sealed record DoseProblem
{
    /// <summary>All water the dose mixes into, m³ (of the loop, when the tank is in one); null when not on record.</summary>
    public required double? VolumeM3 { get; init; }

    /// <summary>Each tank the water passes, the one asked for first; empty when its state is not known.</summary>
    public required IReadOnlyList<DoseWater> Waters { get; init; }

    /// <summary>Inputs that are missing, old, or of unconfirmed unit; each refuses the plan.</summary>
    public required IReadOnlyList<DoseGround> MissingInputs { get; init; }

    /// <summary>Alkalinity already added to this water since the day began, mmol/L.</summary>
    public double DosedTodayMmolL { get; init; }

    /// <summary>Largest rise of alkalinity in one step, mmol/L (common practice, no source: 20–25 mg/L as CaCO3 for fish).</summary>
    public double StepMmolLMax { get; init; } = 0.45;

    /// <summary>Largest rise of alkalinity a day, mmol/L (common practice, no source: 50 mg/L as CaCO3 for fish).</summary>
    public double DayMmolLMax { get; init; } = 1.0;

    /// <summary>Relative standard uncertainty of the volume (common practice, no source: 5 %; gravel, pipes and the true level are rarely measured).</summary>
    public double VolumeRelativeU { get; init; } = 0.05;

    /// <summary>Exchange rate of CO2 under strong aeration, 1/h (common practice, no source: diffused air in tanks 1–4 an hour).</summary>
    public double StripPerHour { get; init; } = 2;

    /// <summary>Exchange rate of CO2 with nothing but the surface as it is, 1/h (common practice, no source).</summary>
    public double IdlePerHour { get; init; } = 0.3;
}
