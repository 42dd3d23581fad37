namespace TankChem.Chemistry.Fresh;

/// <summary>
/// Derivatives of a solved speciation. By the laws of mass action the logarithm of every species is a linear form (<see cref="Change"/>); the metals' balances give their free
/// ions, and the balances of sulfate and of ionic strength are two linear equations in the two changes that are not free.
/// </summary>
internal ref struct SpeciationSlopes
{
    private const double Ln10 = 2.302585092994045684;

    /// <summary>Σ z² c d ln c: twice the change of ionic strength.</summary>
    private Change charge;

    /// <summary>Change of total sulfate.</summary>
    private Change sulfate;

    private Change alkalinity;
    private Change dic;

    /// <summary>Adds a species that is free of metals.</summary>
    public void Add(double amount, in Change ln, double chargeSquared, double inAlkalinity, double inDic)
    {
        Change change = amount * ln;
        charge += chargeSquared * change;
        alkalinity += inAlkalinity * change;
        dic += inDic * change;
    }

    /// <summary>Adds free sulfate.</summary>
    public void AddSulfate(double amount)
    {
        var change = new Change(0, 0, amount, 0);
        sulfate += change;
        charge += 4 * change;
    }

    /// <summary>Adds alkalinity whose ions count in nothing else.</summary>
    public void AddAlkalinity(in Change change) => alkalinity += change;

    /// <summary>Adds a metal with its four pairs; a pair's change is given with the free metal held.</summary>
    public void AddMetal(double total, double free, double chargeSquared, in MetalPair bicarbonate, in MetalPair carbonate, in MetalPair withSulfate, in MetalPair hydroxide)
    {
        if (!(total > 0))
            return;
        Change metal = -1 / total * (bicarbonate.Amount * bicarbonate.Ln + carbonate.Amount * carbonate.Ln + withSulfate.Amount * withSulfate.Ln + hydroxide.Amount * hydroxide.Ln);
        charge += chargeSquared * free * metal;
        Add(bicarbonate.Amount, metal + bicarbonate.Ln, bicarbonate.ChargeSquared, 1, 1);
        Add(carbonate.Amount, metal + carbonate.Ln, carbonate.ChargeSquared, 2, 1);
        Add(hydroxide.Amount, metal + hydroxide.Ln, hydroxide.ChargeSquared, 1, 0);
        Change pair = withSulfate.Amount * (metal + withSulfate.Ln);
        sulfate += pair;
        charge += withSulfate.ChargeSquared * pair;
    }

    /// <summary>Solves for the two changes that are not free and gives the slopes.</summary>
    public readonly CarbonateSlopes Solve()
    {
        // Without sulfate its balance is empty; any value does, since no amount goes with it.
        double a = sulfate.LnSulfate > 0 ? sulfate.LnSulfate : 1, b = sulfate.IonicStrength;
        double c = charge.LnSulfate, d = charge.IonicStrength - 2;
        double determinant = a * d - b * c;
        (double sulfateByH, double strengthByH) = Unknowns(a, b, c, d, determinant, sulfate.LnHydrogen, charge.LnHydrogen);
        (double sulfateByF, double strengthByF) = Unknowns(a, b, c, d, determinant, sulfate.LnFugacity, charge.LnFugacity);
        return new CarbonateSlopes(
            -Ln10 * (alkalinity.LnHydrogen + alkalinity.LnSulfate * sulfateByH + alkalinity.IonicStrength * strengthByH),
            alkalinity.LnFugacity + alkalinity.LnSulfate * sulfateByF + alkalinity.IonicStrength * strengthByF,
            -Ln10 * (dic.LnHydrogen + dic.LnSulfate * sulfateByH + dic.IonicStrength * strengthByH),
            dic.LnFugacity + dic.LnSulfate * sulfateByF + dic.IonicStrength * strengthByF);
    }

    private static (double Sulfate, double IonicStrength) Unknowns(double a, double b, double c, double d, double determinant, double sulfateSide, double chargeSide) =>
        ((b * chargeSide - d * sulfateSide) / determinant, (c * sulfateSide - a * chargeSide) / determinant);
}

/// <summary>A pair of a metal: amount, change of its logarithm with the free metal held, charge squared.</summary>
internal readonly record struct MetalPair(double Amount, Change Ln, double ChargeSquared);
