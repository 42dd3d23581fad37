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

    /// <summary>How far fresh waters spread about the assumed composition, standard deviations: ln of the salt beside the alkalinity (a factor of 3.7 either way), and the logit
    /// of the share of calcium and magnesium among the cations (0.1 to 0.9). Common practice, no source; the waters of the reference tables lie within.</summary>
    public const double ULnOtherSalt = 1.3;
    public const double ULogitHardness = 2.2;

    public double PK0 { get; init; }

    public double PK1 { get; init; }

    public double PK2 { get; init; }

    public double PKB { get; init; }

    public double PKW { get; init; }

    public double PKNh4 { get; init; }

    public double BoronRelative { get; init; }

    /// <summary>ln of the factor on the salt that is assumed beside the alkalinity.</summary>
    public double LnOtherSalt { get; init; }

    /// <summary>Logit of the share of calcium and magnesium among the assumed cations; 0 is one half.</summary>
    public double LogitHardness { get; init; }

    /// <summary>Shift of pH on the NBS scale against the total scale in salt water.</summary>
    public double NbsBridge { get; init; }
}
