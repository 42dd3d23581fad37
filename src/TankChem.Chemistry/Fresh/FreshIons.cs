namespace TankChem.Chemistry.Fresh;

/// <summary>Total major ions, mol/kg, as given or as assumed.</summary>
internal readonly record struct FreshIons(double Calcium, double Magnesium, double Sodium, double Potassium, double Chloride, double Sulfate)
{
    // Shares of a typical bicarbonate water, equivalents per equivalent of alkalinity; the world's rivers are near it
    // (common practice, no source; their spread is ConstantShift.IonSpread).
    private const double CationsPerAlkalinity = 1.35;
    private const double CalciumShare = 0.55;
    private const double MagnesiumShare = 0.20;
    private const double SodiumShare = 0.22;
    private const double PotassiumShare = 0.03;
    private const double AnionsPerAlkalinity = 0.175;

    // Sea salt at S 35, mol per kg of solution (DOE94 standard mean chemical composition).
    private const double SeaChloride = 0.54586 / 35;
    private const double SeaSulfate = 0.02824 / 35;
    private const double SeaSodium = 0.46906 / 35;
    private const double SeaMagnesium = 0.05282 / 35;
    private const double SeaCalcium = 0.01028 / 35;
    private const double SeaPotassium = 0.01021 / 35;

    /// <summary>Whether the composition depends on the alkalinity, which may itself be an answer.</summary>
    public static bool DependsOnAlkalinity(Solution solution) => solution.Ions is null;

    /// <summary>The ions of a water.</summary>
    public static FreshIons Of(Solution solution, double alkalinity, in ConstantShift shift)
    {
        if (solution.Ions is { } ions)
            return new FreshIons(ions.CalciumMmolKg * 1e-3, ions.MagnesiumMmolKg * 1e-3, ions.SodiumMmolKg * 1e-3, ions.PotassiumMmolKg * 1e-3, ions.ChlorideMmolKg * 1e-3, ions.SulfateMmolKg * 1e-3);

        double s = solution.Salinity;
        double spread = Math.Exp(shift.LnAssumedIons);
        double equivalents = Math.Max(alkalinity, 5e-5) * CationsPerAlkalinity * spread;
        double anions = Math.Max(alkalinity, 5e-5) * AnionsPerAlkalinity * spread;
        var assumed = new FreshIons(
            CalciumShare * equivalents / 2 + SeaCalcium * s,
            MagnesiumShare * equivalents / 2 + SeaMagnesium * s,
            SodiumShare * equivalents + SeaSodium * s,
            PotassiumShare * equivalents + SeaPotassium * s,
            anions + SeaChloride * s,
            anions / 2 + SeaSulfate * s);
        if (solution.HardnessMmolKg is not { } hardness)
            return assumed;

        double total = hardness * 1e-3;
        double calcium = assumed.Calcium / (assumed.Calcium + assumed.Magnesium);
        double sodium = Math.Max(assumed.Sodium, Math.Max(alkalinity, 0) + assumed.Chloride + 2 * assumed.Sulfate - 2 * total - assumed.Potassium);
        return assumed with { Calcium = calcium * total, Magnesium = (1 - calcium) * total, Sodium = sodium };
    }
}
