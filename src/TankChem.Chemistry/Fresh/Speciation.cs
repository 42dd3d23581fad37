using TankChem.Chemistry.Sea;

namespace TankChem.Chemistry.Fresh;

/// <summary>All species of a fresh water at one pH, by successive substitution of free ions inside a secant on the ionic strength, whose exponentials are dear. It remembers its last answer as the next start.</summary>
internal struct Speciation
{
    private const double Ln10 = 2.302585092994045684;
    private const int IterationsMax = 100;
    private const int SubstitutionsMax = 50;
    private const double Tolerance = 1e-14;

    /// <summary>How exact, as a share of the step in ionic strength, the ions are made before the next step.</summary>
    private const double SubstitutionShare = 1e-3;

    /// <summary>Ionic strength answers its own change by far less than this in every dilute water.</summary>
    private const double SlopeMax = 0.8;

    /// <summary>The activity model ends well below this; a bracket's far ends pass through it and must stay finite.</summary>
    private const double IonicStrengthMax = 2;

    /// <summary>Up to here the activity coefficients are good.</summary>
    private const double IonicStrengthFitted = 0.5;

    private readonly Solution solution;
    private readonly FreshConstants k;
    private readonly ConstantShift shift;
    private readonly double ammonia;
    private readonly Nutrients nutrients;
    private FreshIons total;
    private bool fixedIons;
    private double calcium;
    private double magnesium;
    private double sodium;
    private double potassium;
    private double sulfate;
    private double ionicStrength;
    private Activities g;
    private ConditionalConstants c;
    private (double Alkalinity, double Slope) nutrient;
    private double co2;
    private double hco3;
    private double co3;
    private double perHco3;
    private double perCo3;
    private double sideSlope;

    public Speciation(Solution solution, in FreshConstants constants, in ConstantShift shift)
    {
        this.solution = solution;
        this.shift = shift;
        k = constants;
        ammonia = solution.AmmoniaUmolKg * 1e-6;
        nutrients = new Nutrients(solution);
        ionicStrength = 1e-3;
        Alkalinity = 1e-3;
        SetIons(Alkalinity);
    }

    /// <summary>Whether the last answer was reached within the cap on iterations.</summary>
    public bool Converged { get; private set; }

    /// <summary>Alkalinity of the last answer, mol/kg.</summary>
    public double Alkalinity { get; private set; }

    /// <summary>DIC of the last answer, mol/kg.</summary>
    public double Dic { get; private set; }

    /// <summary>Fugacity of CO2 of the last answer, atm.</summary>
    public readonly double Fugacity => co2 * g.Neutral / k.KH;

    /// <summary>d alkalinity/d pH at constant DIC with the free ions held, mol/kg: near enough for the next step of a search.</summary>
    public readonly double AlkalinityRiseClosed
    {
        get
        {
            double d = co2 + perHco3 + perCo3;
            double a = perHco3 + 2 * perCo3;
            return Ln10 * (Dic * (2 * perCo3 * d + a * (co2 - perCo3)) / (d * d) + sideSlope);
        }
    }

    /// <summary>d alkalinity/d pH at constant pCO2 with the free ions held, mol/kg: near enough for the next step of a search.</summary>
    public readonly double AlkalinityRiseOpen => Ln10 * (perHco3 + 4 * perCo3 + sideSlope);

    /// <summary>−d ln fugacity/d pH at constant DIC.</summary>
    public readonly double LnFugacityFall => Ln10 * (1 - (co2 - perCo3) / (co2 + perHco3 + perCo3));

    /// <summary>Settles assumed ions by an alkalinity that is given.</summary>
    public void FixAlkalinity(double alkalinity)
    {
        SetIons(alkalinity);
        fixedIons = true;
    }

    /// <summary>pH on the activity scale minus pH on another scale, at the last answer.</summary>
    public readonly double NbsMinus(PhScale scale)
    {
        (double totalPerFree, double seawaterPerFree) = SeaRatios();
        return scale switch
        {
            PhScale.Nbs => 0,
            PhScale.Free => -Math.Log10(g.Hydrogen),
            PhScale.Total => -Math.Log10(g.Hydrogen / totalPerFree),
            PhScale.Seawater => -Math.Log10(g.Hydrogen / seawaterPerFree),
        };
    }

    /// <summary>Computes all species; false when no bicarbonate is left for the alkalinity at this pH.</summary>
    public bool TryAt(double ph, Known known, double value)
    {
        if (known == Known.Alkalinity && !fixedIons)
            FixAlkalinity(value);
        double aH = Math.Exp(-ph * Ln10);
        double startBefore = double.NaN, answerBefore = double.NaN;
        Converged = false;
        for (int i = 0; i < IterationsMax; i++)
        {
            double start = ionicStrength;
            g = new Activities(k.Debye, Math.Min(start, IonicStrengthMax));
            c = new ConditionalConstants(k, g, aH);
            nutrient = nutrients.At(aH, g);
            if (!Substitute(known, value, start))
                return false;
            double answer = ionicStrength;
            if (Math.Abs(answer - start) <= Tolerance * (1 + 10 * answer))
            {
                Converged = true;
                break;
            }

            // Where the line through the last two answers meets the diagonal (Wegstein 1958), unless it is too steep to trust.
            double slope = (answer - answerBefore) / (start - startBefore);
            if (Math.Abs(slope) < SlopeMax)
                ionicStrength = Math.Max((answer - slope * start) / (1 - slope), 0.5 * answer);
            (startBefore, answerBefore) = (start, answer);
        }

        return true;
    }

    /// <summary>Derivatives at the last answer, base coming as that of sodium, the other ions held.</summary>
    public readonly CarbonateSlopes Slopes(double ph)
    {
        var w = ionicStrength < IonicStrengthMax ? new ActivitySlopes(k.Debye, ionicStrength) : default;
        var slopes = default(SpeciationSlopes);
        slopes.Add(co2, new Change(0, 1, 0, -w.Neutral), 0, 0, 1);
        slopes.Add(hco3, new Change(-1, 1, 0, -w.Bicarbonate), 1, 1, 1);
        slopes.Add(co3, new Change(-2, 1, 0, -w.Carbonate), 4, 2, 1);
        slopes.Add(c.Hydroxide, new Change(-1, 0, 0, -w.Hydroxide), 1, 1, 0);
        slopes.Add(c.Hydrogen, new Change(1, 0, 0, -w.Hydrogen), 1, -1, 0);
        slopes.AddSulfate(sulfate);
        Change nh3 = ammonia * c.Nh3Fraction * (1 - c.Nh3Fraction) * new Change(-1, 0, 0, w.Ammonium - w.Neutral);
        slopes.AddAlkalinity(nh3);
        slopes.Add(-1, nh3, 1, 0, 0);
        slopes.AddAlkalinity(new Change(-nutrient.Slope, 0, 0, nutrients.ByIonicStrength(Math.Exp(-ph * Ln10), g, w)));
        slopes.AddMetal(
            total.Calcium,
            0,
            calcium,
            4,
            new MetalPair(calcium * hco3 * c.CaHco3, new Change(-1, 1, 0, w.Calcium - w.CalciumPair), 1),
            new MetalPair(calcium * co3 * c.CaCo3, new Change(-2, 1, 0, w.Calcium - w.Neutral), 0),
            new MetalPair(calcium * sulfate * c.CaSo4, new Change(0, 0, 1, w.Calcium + w.Sulfate - w.Neutral), 0),
            new MetalPair(calcium * c.CaOh, new Change(-1, 0, 0, w.Calcium - w.CalciumPair), 1));
        slopes.AddMetal(
            total.Magnesium,
            0,
            magnesium,
            4,
            new MetalPair(magnesium * hco3 * c.MgHco3, new Change(-1, 1, 0, w.Magnesium - w.MagnesiumPair), 1),
            new MetalPair(magnesium * co3 * c.MgCo3, new Change(-2, 1, 0, w.Magnesium - w.Neutral), 0),
            new MetalPair(magnesium * sulfate * c.MgSo4, new Change(0, 0, 1, w.Magnesium + w.Sulfate - w.Neutral), 0),
            new MetalPair(magnesium * c.MgOh, new Change(-1, 0, 0, w.Magnesium - w.MagnesiumPair), 1));
        slopes.AddMetal(
            total.Sodium,
            total.Sodium > 0 ? 1 : 0,
            sodium,
            1,
            new MetalPair(sodium * hco3 * c.NaHco3, new Change(-1, 1, 0, w.Sodium - w.Neutral), 0),
            new MetalPair(sodium * co3 * c.NaCo3, new Change(-2, 1, 0, w.Sodium - w.Single), 1),
            new MetalPair(sodium * sulfate * c.NaSo4, new Change(0, 0, 1, w.Sodium + w.Sulfate - w.Single), 1),
            default);
        slopes.AddMetal(
            total.Potassium,
            0,
            potassium,
            1,
            default,
            default,
            new MetalPair(potassium * sulfate * c.KSo4, new Change(0, 0, 1, w.Potassium + w.Sulfate - w.Single), 1),
            default);
        if (!(total.Sodium > 0))
            slopes.AddChloride();
        return slopes.Solve();
    }

    /// <summary>The last answer as a state.</summary>
    public readonly CarbonateState State(double ph, in CarbonateSlopes slopes)
    {
        double fugacity = Fugacity;
        double activityProduct = g.Calcium * calcium * g.Carbonate * co3;
        Caveats caveats = (solution.Ions, solution.HardnessMmolKg) switch
        {
            (not null, _) => Caveats.None,
            (null, not null) => Caveats.IonsFromHardness,
            (null, null) => Caveats.IonsAssumed,
        };
        return new CarbonateState
        {
            Status = Converged ? SolveStatus.Solved : SolveStatus.NotConverged,
            FaultyArgument = Converged ? null : "the free ions of this water were not found within the cap on iterations",
            Caveats = caveats | (k.InFittedRange && ionicStrength <= IonicStrengthFitted ? Caveats.None : Caveats.OutOfFittedRange),
            PhNbs = ph,
            PhFree = ph - NbsMinus(PhScale.Free),
            PhTotal = ph - NbsMinus(PhScale.Total),
            PhSeawater = ph - NbsMinus(PhScale.Seawater),
            AlkalinityUmolKg = Alkalinity * 1e6,
            DicUmolKg = Dic * 1e6,
            Co2UmolKg = co2 * 1e6,
            Hco3UmolKg = hco3 * 1e6,
            Co3UmolKg = co3 * 1e6,
            Fco2Uatm = fugacity * 1e6,
            Pco2Uatm = fugacity / k.FugacityFactor * 1e6,
            BufferClosedUmolKg = slopes.Closed * 1e6,
            BufferOpenUmolKg = slopes.Open * 1e6,
            OmegaCalcite = activityProduct / k.KspCalcite,
            OmegaAragonite = activityProduct / k.KspAragonite,
            Nh3Fraction = c.Nh3Fraction,
            IonicStrengthMolKg = ionicStrength,
        };
    }

    private readonly (double TotalPerFree, double SeawaterPerFree) SeaRatios()
    {
        double s = solution.Salinity;
        if (s <= 0)
            return (1, 1);
        double tK = solution.TemperatureC + 273.15, lnT = Math.Log(tK), iS = SeaSalt.IonicStrength(s);
        double totalPerFree = 1 + SeaSalt.Sulfate(s) / SideAcids.KS(tK, lnT, s, iS);
        return (totalPerFree, totalPerFree + SeaSalt.Fluoride(s) / SideAcids.KF(tK, s, iS));
    }

    private void SetIons(double alkalinity)
    {
        FreshIons next = FreshIons.Of(solution, alkalinity, shift);
        if (next == total)
            return;
        bool first = total.Calcium + total.Magnesium + total.Sodium + total.Chloride == 0;
        total = next;
        if (first)
            (calcium, magnesium, sodium, potassium, sulfate) = (total.Calcium, total.Magnesium, total.Sodium, total.Potassium, total.Sulfate);
    }

    /// <summary>Substitutes carbonates and free ions into each other at fixed activity coefficients, as far as the step in ionic strength deserves; false when no bicarbonate is left.</summary>
    private bool Substitute(Known known, double value, double ionicStrengthBefore)
    {
        for (int i = 0; i < SubstitutionsMax; i++)
        {
            double strength = ionicStrength, bicarbonate = hco3;
            if (!Carbonates(known, value))
                return false;
            FreeIons();
            if (!fixedIons)
                SetIons(Alkalinity);
            double tolerance = Math.Max(Tolerance, SubstitutionShare * Math.Abs(ionicStrength - ionicStrengthBefore) / ionicStrength);
            if (Math.Abs(ionicStrength - strength) <= tolerance * ionicStrength && Math.Abs(hco3 - bicarbonate) <= tolerance * hco3)
                break;
        }

        return true;
    }

    private bool Carbonates(Known known, double value)
    {
        double n1 = 1 + calcium * c.CaHco3 + magnesium * c.MgHco3 + sodium * c.NaHco3;
        double n2 = 1 + calcium * c.CaCo3 + magnesium * c.MgCo3 + sodium * c.NaCo3;
        double side = Side();
        switch (known)
        {
            case Known.Alkalinity:
                hco3 = (value - side) / (n1 + 2 * c.Co3PerHco3 * n2);
                if (!(hco3 >= 0))
                    return false;
                break;
            case Known.Dic:
                hco3 = value / (c.Co2PerHco3 + n1 + c.Co3PerHco3 * n2);
                break;
            case Known.Fugacity:
                hco3 = k.KH * value / (g.Neutral * c.Co2PerHco3);
                break;
        }

        co2 = c.Co2PerHco3 * hco3;
        co3 = c.Co3PerHco3 * hco3;
        perHco3 = n1 * hco3;
        perCo3 = n2 * co3;
        Dic = co2 + perHco3 + perCo3;
        Alkalinity = perHco3 + 2 * perCo3 + side;
        return true;
    }

    /// <summary>Alkalinity that is not carbonate; its slope −d/d ln h goes to <see cref="sideSlope"/>.</summary>
    private double Side()
    {
        double bases = c.Hydroxide + calcium * c.CaOh + magnesium * c.MgOh;
        double nh3 = ammonia * c.Nh3Fraction;
        sideSlope = bases + c.Hydrogen + nh3 * (1 - c.Nh3Fraction) + nutrient.Slope;
        return bases + nh3 - c.Hydrogen + nutrient.Alkalinity;
    }

    private void FreeIons()
    {
        sulfate = total.Sulfate / (1 + calcium * c.CaSo4 + magnesium * c.MgSo4 + sodium * c.NaSo4 + potassium * c.KSo4);
        calcium = total.Calcium / (1 + hco3 * c.CaHco3 + co3 * c.CaCo3 + sulfate * c.CaSo4 + c.CaOh);
        magnesium = total.Magnesium / (1 + hco3 * c.MgHco3 + co3 * c.MgCo3 + sulfate * c.MgSo4 + c.MgOh);
        sodium = total.Sodium / (1 + hco3 * c.NaHco3 + co3 * c.NaCo3 + sulfate * c.NaSo4);
        potassium = total.Potassium / (1 + sulfate * c.KSo4);
        double single = sodium + potassium + total.Chloride + hco3 + c.Hydroxide + c.Hydrogen
            + calcium * (hco3 * c.CaHco3 + c.CaOh) + magnesium * (hco3 * c.MgHco3 + c.MgOh) + sodium * co3 * c.NaCo3
            + sulfate * (sodium * c.NaSo4 + potassium * c.KSo4) + ammonia * (1 - c.Nh3Fraction);
        ionicStrength = 0.5 * (single + 4 * (calcium + magnesium + sulfate + co3));
    }
}
