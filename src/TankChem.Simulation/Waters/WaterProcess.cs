namespace TankChem.Simulation.Waters;

/// <summary>What changes a virtual water; the ledger keeps an account of each.</summary>
public enum WaterProcess
{
    /// <summary>CO2 and oxygen crossing the surface, bubbles or a degasser.</summary>
    GasExchange,

    /// <summary>Stock breathing and excreting.</summary>
    Respiration,

    /// <summary>Plants, algae or corals: photosynthesis less their own respiration.</summary>
    Photosynthesis,

    /// <summary>Ammonia turned to nitrate.</summary>
    Nitrification,

    /// <summary>Skeletons and shells growing.</summary>
    Calcification,

    /// <summary>CO2 gas injected.</summary>
    Injection,

    /// <summary>Pure oxygen dissolved.</summary>
    OxygenSupply,

    /// <summary>Alkalinity dosed.</summary>
    Dosing,

    /// <summary>Water exchanged for source water.</summary>
    Exchange,

    /// <summary>Flow between the waters of a loop.</summary>
    LoopFlow,
}
