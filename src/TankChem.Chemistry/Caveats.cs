namespace TankChem.Chemistry;

/// <summary>What a reader of a computed state must know beside its numbers.</summary>
[Flags]
public enum Caveats
{
    /// <summary>Nothing to add.</summary>
    None = 0,

    /// <summary>Major ions not known: ionic strength and ion pairs follow a typical composition scaled to the alkalinity.</summary>
    IonsAssumed = 1,

    /// <summary>Only hardness known: calcium and magnesium split by a typical ratio.</summary>
    IonsFromHardness = 2,

    /// <summary>Temperature or salinity outside the range the constants were fitted in.</summary>
    OutOfFittedRange = 4,

    /// <summary>Between fresh and sea water: two models blended.</summary>
    Blended = 8,
}
