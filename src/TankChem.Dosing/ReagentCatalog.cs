using TankChem.Chemistry;

namespace TankChem.Dosing;

/// <summary>The reagents that plans know.</summary>
/// <remarks>Molar masses: IUPAC 2021 abridged atomic weights. Solubilities: CRC Handbook of Chemistry and Physics, aqueous solubility tables (NaHCO3 and Na2CO3 checked, the others from memory).
/// Hazards in general words after the usual GHS classes (from memory).</remarks>
public static class ReagentCatalog
{
    /// <summary>The reagent that is taken when nobody names one.</summary>
    public const string Bicarbonate = "sodium-bicarbonate";

    /// <summary>Uses up CO2 while it adds alkalinity; raises pH fast.</summary>
    public const string Carbonate = "sodium-carbonate";

    private static readonly Reagent[] Reagents =
    [
        new(Bicarbonate, "sodium bicarbonate", "NaHCO3", MolarMass.SodiumBicarbonate, 1, 1, 1, 0, 81, false, "Dust irritates eyes: wear goggles when pouring."),
        new(Carbonate, "sodium carbonate", "Na2CO3", MolarMass.SodiumCarbonate, 2, 1, 2, 0, 125, false, "Irritates eyes: wear goggles and gloves. Dissolve it before it meets the animals, and add it where the flow is fastest."),
        new("potassium-bicarbonate", "potassium bicarbonate", "KHCO3", 100.115, 1, 1, 0, 1, 277, false, "Dust irritates eyes: wear goggles when pouring."),
        new("potassium-carbonate", "potassium carbonate", "K2CO3", 138.205, 2, 1, 0, 2, 1090, false, "Irritates skin, eyes and airways: wear goggles and gloves."),
        new("calcium-hydroxide", "calcium hydroxide", "Ca(OH)2", 74.092, 2, 0, 0, 0, 1.8, true, "Burns eyes."),
        new("sodium-hydroxide", "sodium hydroxide", "NaOH", 39.997, 1, 0, 1, 0, 1000, true, "Burns skin and eyes."),
        new("hydrochloric-acid", "hydrochloric acid", "HCl", 36.458, -1, 0, 0, 0, 700, true, "Burns skin and eyes, its fumes the lungs; frees CO2 from the water."),
    ];

    /// <summary>All of them.</summary>
    public static IReadOnlyList<Reagent> All => Reagents;

    /// <summary>A reagent by its id, or null.</summary>
    public static Reagent? Find(string id) => Array.Find(Reagents, r => r.Id == id);
}
