namespace TankChem.Chemistry.Fresh;

/// <summary>
/// Derivatives of a solved speciation. By the laws of mass action the logarithm of every species is a linear form (<see cref="Change"/>); the metals' balances give their free
/// ions, and the balances of sulfate, ionic strength and alkalinity are three linear equations in the three changes that are not free. Alkalinity comes and goes with sodium.
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

    /// <summary>Adds chloride that leaves as alkalinity comes.</summary>
    public void AddChloride() => charge += new Change(0, 0, 0, 0, -1);

    /// <summary>Adds alkalinity whose ions count in nothing else.</summary>
    public void AddAlkalinity(in Change change) => alkalinity += change;

    /// <summary>Adds a metal with its four pairs; a pair's change is given with the free metal held, and how much of the metal comes with each mole of alkalinity.</summary>
    public void AddMetal(
        double total, double totalByAlkalinity, double free, double chargeSquared, in MetalPair bicarbonate, in MetalPair carbonate, in MetalPair withSulfate, in MetalPair hydroxide)
    {
        if (!(total > 0))
            return;
        Change metal = 1 / total * (new Change(0, 0, 0, 0, totalByAlkalinity)
            + -1 * (bicarbonate.Amount * bicarbonate.Ln + carbonate.Amount * carbonate.Ln + withSulfate.Amount * withSulfate.Ln + hydroxide.Amount * hydroxide.Ln));
        charge += chargeSquared * free * metal;
        Add(bicarbonate.Amount, metal + bicarbonate.Ln, bicarbonate.ChargeSquared, 1, 1);
        Add(carbonate.Amount, metal + carbonate.Ln, carbonate.ChargeSquared, 2, 1);
        Add(hydroxide.Amount, metal + hydroxide.Ln, hydroxide.ChargeSquared, 1, 0);
        Change pair = withSulfate.Amount * (metal + withSulfate.Ln);
        sulfate += pair;
        charge += withSulfate.ChargeSquared * pair;
    }

    /// <summary>Solves for the three changes that are not free and gives the slopes.</summary>
    public readonly CarbonateSlopes Solve()
    {
        (double sulfateByH, double strengthByH, double alkalinityByH) = Unknowns(-sulfate.LnHydrogen, -charge.LnHydrogen, -alkalinity.LnHydrogen);
        (double sulfateByF, double strengthByF, double alkalinityByF) = Unknowns(-sulfate.LnFugacity, -charge.LnFugacity, -alkalinity.LnFugacity);
        return new CarbonateSlopes(
            -Ln10 * alkalinityByH,
            alkalinityByF,
            -Ln10 * (dic.LnHydrogen + dic.LnSulfate * sulfateByH + dic.IonicStrength * strengthByH + dic.Alkalinity * alkalinityByH),
            dic.LnFugacity + dic.LnSulfate * sulfateByF + dic.IonicStrength * strengthByF + dic.Alkalinity * alkalinityByF);
    }

    /// <summary>The changes of ln sulfate, ionic strength and alkalinity, by Cramer's rule.</summary>
    private readonly (double LnSulfate, double IonicStrength, double Alkalinity) Unknowns(double r1, double r2, double r3)
    {
        // Without sulfate its balance is empty; any value does, since no amount goes with it.
        double a1 = sulfate.LnSulfate > 0 ? sulfate.LnSulfate : 1, b1 = sulfate.IonicStrength, c1 = sulfate.Alkalinity;
        double a2 = charge.LnSulfate, b2 = charge.IonicStrength - 2, c2 = charge.Alkalinity;
        double a3 = alkalinity.LnSulfate, b3 = alkalinity.IonicStrength, c3 = alkalinity.Alkalinity - 1;
        double determinant = Determinant(a1, b1, c1, a2, b2, c2, a3, b3, c3);
        return (
            Determinant(r1, b1, c1, r2, b2, c2, r3, b3, c3) / determinant,
            Determinant(a1, r1, c1, a2, r2, c2, a3, r3, c3) / determinant,
            Determinant(a1, b1, r1, a2, b2, r2, a3, b3, r3) / determinant);
    }

    private static double Determinant(double a1, double b1, double c1, double a2, double b2, double c2, double a3, double b3, double c3) =>
        a1 * (b2 * c3 - c2 * b3) - b1 * (a2 * c3 - c2 * a3) + c1 * (a2 * b3 - b2 * a3);
}

/// <summary>A pair of a metal: amount, change of its logarithm with the free metal held, charge squared.</summary>
internal readonly record struct MetalPair(double Amount, Change Ln, double ChargeSquared);
