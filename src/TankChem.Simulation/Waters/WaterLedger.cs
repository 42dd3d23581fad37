namespace TankChem.Simulation.Waters;

/// <summary>The account of what each process has brought into a virtual water, mol since the start; what it took counts negative.</summary>
public sealed class WaterLedger
{
    private readonly WaterAmounts[] _mol = new WaterAmounts[Enum.GetValues<WaterProcess>().Length];

    /// <summary>What one process has brought, mol.</summary>
    public WaterAmounts this[WaterProcess process] => _mol[(int)process];

    /// <summary>What all processes together have brought, mol.</summary>
    public WaterAmounts Total
    {
        get
        {
            WaterAmounts total = default;
            foreach (WaterAmounts mol in _mol)
                total += mol;
            return total;
        }
    }

    internal void Book(WaterProcess process, WaterAmounts mol) => _mol[(int)process] += mol;
}
