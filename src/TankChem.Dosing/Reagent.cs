namespace TankChem.Dosing;

/// <summary>A dosing chemical.</summary>
/// <param name="Id">Stable id in bodies and the logbook.</param>
/// <param name="Name">Name for people.</param>
/// <param name="Formula">Formula, without water.</param>
/// <param name="MolarMassGMol">Molar mass, g/mol.</param>
/// <param name="EquivalentsPerMole">Alkalinity it adds, eq/mol.</param>
/// <param name="CarbonPerMole">Inorganic carbon it adds, mol/mol.</param>
/// <param name="SodiumPerMole">Sodium it adds, mol/mol.</param>
/// <param name="PotassiumPerMole">Potassium it adds, mol/mol.</param>
/// <param name="SolubilityGPerL">Solubility at 10 °C, g per litre of water: more than this in a stock solution stays on the bottom.</param>
/// <param name="Locked">Off until a competent person unlocks it for a site; this version has no way to do so.</param>
/// <param name="Handling">Hazards and handling in general words.</param>
public sealed record Reagent(
    string Id,
    string Name,
    string Formula,
    double MolarMassGMol,
    double EquivalentsPerMole,
    double CarbonPerMole,
    double SodiumPerMole,
    double PotassiumPerMole,
    double SolubilityGPerL,
    bool Locked,
    string Handling);
