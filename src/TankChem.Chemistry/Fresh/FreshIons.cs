namespace TankChem.Chemistry.Fresh;

/// <summary>Total major ions, mol/kg, as given or as assumed; their charges balance with the alkalinity.</summary>
internal readonly record struct FreshIons(double Calcium, double Magnesium, double Sodium, double Potassium, double Chloride, double Sulfate)
{
    // What a fresh water holds when nobody has told (common practice, no source): beside the cations of its alkalinity 2 meq/kg of other salt,
    // as with 35 mg/L chloride and 48 mg/L sulfate; half of the cations calcium and magnesium. ConstantShift says how far waters spread about it.
    private const double OtherAnions = 2e-3;
    private const double SulfateShare = 0.4;
    private const double CalciumShareOfHardness = 0.75;
    private const double PotassiumShareOfRest = 0.06;

    // Sea salt at S 35, mol per kg of solution (standard mean chemical composition, DOE94).
    private const double SeaChloride = 0.54586 / 35;
    private const double SeaSulfate = 0.02824 / 35;
    private const double SeaSodium = 0.46906 / 35;
    private const double SeaMagnesium = 0.05282 / 35;
    private const double SeaCalcium = 0.01028 / 35;
    private const double SeaPotassium = 0.01021 / 35;

    /// <summary>The ions of a water.</summary>
    public static FreshIons Of(Solution solution, double alkalinity, in ConstantShift shift)
    {
        // Alkalinity is the charge that strong ions leave over; ammonia in it is a base without being one of them, phosphate counts from H2PO4⁻.
        double charge = alkalinity - solution.AmmoniaUmolKg * 1e-6 + solution.PhosphateUmolKg * 1e-6;
        return solution.Ions is { } ions ? Given(ions, charge) : Assumed(solution, charge, shift);
    }

    /// <summary>The ions as given; sodium closes the balance of charges, chloride where there is none to take away.</summary>
    private static FreshIons Given(IonComposition ions, double charge)
    {
        var given = new FreshIons(ions.CalciumMmolKg * 1e-3, ions.MagnesiumMmolKg * 1e-3, ions.SodiumMmolKg * 1e-3, ions.PotassiumMmolKg * 1e-3, ions.ChlorideMmolKg * 1e-3, ions.SulfateMmolKg * 1e-3);
        double missing = charge + given.Chloride + 2 * given.Sulfate - 2 * given.Calcium - 2 * given.Magnesium - given.Sodium - given.Potassium;
        double sodium = given.Sodium + missing;
        return sodium >= 0 ? given with { Sodium = sodium } : given with { Sodium = 0, Chloride = given.Chloride - sodium };
    }

    private static FreshIons Assumed(Solution solution, double charge, in ConstantShift shift)
    {
        double s = solution.Salinity;
        double salt = s * (SeaChloride + 2 * SeaSulfate), usual = OtherAnions * Math.Exp(shift.LnOtherSalt);

        // A salinity that is known takes the place of what is usual.
        double other = Math.Sqrt(salt * salt + usual * usual) - salt;
        double cations = Math.Max(charge, 0) + other;
        double sulfate = SeaSulfate * s + SulfateShare * other / 2;
        double seaHardness = 2 * (SeaCalcium + SeaMagnesium) * s, cationsAll = cations + (2 * SeaCalcium + 2 * SeaMagnesium + SeaSodium + SeaPotassium) * s;
        double hardness = solution.HardnessMmolKg is { } known ? 2e-3 * known : cations / (1 + Math.Exp(-shift.LogitHardness)) + seaHardness;
        double rest = Math.Max(cationsAll - hardness, 0);
        double seaShare = hardness > 0 ? Math.Min(seaHardness / hardness, 1) : 0;
        double calciumShare = seaShare * SeaCalcium / (SeaCalcium + SeaMagnesium) + (1 - seaShare) * CalciumShareOfHardness;
        double potassiumShare = PotassiumShareOfRest * cations / cationsAll + SeaPotassium / (SeaPotassium + SeaSodium) * (1 - cations / cationsAll);
        return new FreshIons(
            calciumShare * hardness / 2,
            (1 - calciumShare) * hardness / 2,
            (1 - potassiumShare) * rest,
            potassiumShare * rest,
            Math.Max(hardness + rest - charge - 2 * sulfate, 0),
            sulfate);
    }
}
