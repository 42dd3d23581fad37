namespace TankChem.Chemistry;

/// <summary>The scale a pH stands on.</summary>
public enum PhScale
{
    /// <summary>Activity scale of the NBS/NIST buffers: what a probe calibrated in such buffers reads.</summary>
    Nbs,

    /// <summary>Total scale: free hydrogen ion and bisulfate, mol per kg of solution.</summary>
    Total,

    /// <summary>Seawater scale: free hydrogen ion, bisulfate and hydrogen fluoride, mol per kg of solution.</summary>
    Seawater,

    /// <summary>Free scale: hydrogen ion alone, mol per kg of solution.</summary>
    Free,
}
