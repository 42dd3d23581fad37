namespace TankChem.Monitoring.Readings;

/// <summary>A quantity as the outside names it.</summary>
/// <param name="Id">Its id in topics, addresses and bodies.</param>
/// <param name="Name">Its name for people, in a sentence.</param>
/// <param name="Unit">Canonical unit as written in bodies and on screens; empty when it has none.</param>
/// <param name="Digits">Decimals that make sense on a screen.</param>
public sealed record QuantityDefinition(string Id, string Name, string Unit, int Digits)
{
    /// <summary>Lowest value that is physically possible, canonical unit.</summary>
    public double Min { get; init; } = double.NegativeInfinity;

    /// <summary>Highest value that is physically possible, canonical unit.</summary>
    public double Max { get; init; } = double.PositiveInfinity;

    /// <summary>Whether a bare number is kept but not used until a person or the configuration says its unit.</summary>
    public bool NeedsConfirmedUnit { get; init; }

    /// <summary>Whether the service computes it (it is then never taken in).</summary>
    public bool Computed { get; init; }

    /// <summary>Oldest age at which a reading of it is used.</summary>
    public TimeSpan OldestUsed { get; init; } = TimeSpan.FromHours(1);

    /// <summary>Units a person may pick for it, canonical first; empty when only the canonical one makes sense.</summary>
    public IReadOnlyList<string> UnitChoices { get; init; } = [];
}
