namespace TankChem.Chemistry;

/// <summary>Shifts of constants, for the propagation of their published uncertainty; <c>default</c> shifts nothing.</summary>
/// <remarks>Standard uncertainties: pK0 0.002, pK1 0.0075, pK2 0.015, pKB 0.01, pKW 0.01, pKsp 0.02, total boron 2 % after OEDG18
/// (table 1; from memory); pK(NH4) 0.01 is common practice, no source.</remarks>
internal readonly record struct ConstantShift
{
    public const double UPK0 = 0.002;
    public const double UPK1 = 0.0075;
    public const double UPK2 = 0.015;
    public const double UPKB = 0.01;
    public const double UPKW = 0.01;
    public const double UPKsp = 0.02;
    public const double UPKNh4 = 0.01;
    public const double UBoronRelative = 0.02;

    /// <summary>How far the ions of natural fresh waters spread about the assumed composition, as a factor of their amounts (common practice, no source; covers the waters of the reference tables).</summary>
    public const double IonSpread = 1.6;

    public double PK0 { get; init; }

    public double PK1 { get; init; }

    public double PK2 { get; init; }

    public double PKB { get; init; }

    public double PKW { get; init; }

    public double PKNh4 { get; init; }

    public double BoronRelative { get; init; }

    /// <summary>ln of the factor on assumed ions; 0 leaves them.</summary>
    public double LnAssumedIons { get; init; }
}
