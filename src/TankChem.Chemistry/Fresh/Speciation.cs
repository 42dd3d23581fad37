using TankChem.Chemistry.Sea;

namespace TankChem.Chemistry.Fresh;

/// <summary>All species of a fresh water at one pH, by successive substitution of free ions and ionic strength. It remembers its last answer as the next start.</summary>
internal struct Speciation
{
    private const double Ln10 = 2.302585092994045684;
    private const int IterationsMax = 200;
    private const double Tolerance = 1e-14;

    /// <summary>The activity model ends well below this; a bracket's far ends pass through it and must stay finite.</summary>
    private const double IonicStrengthMax = 2;

    private readonly Solution solution;
    private readonly FreshConstants k;
    private readonly ConstantShift shift;
    private readonly double ammonia;
    private readonly double phosphate;
    private readonly double silicate;
    private readonly bool ionsFollowAlkalinity;
    private FreshIons total;
    private bool fixedIons;
    private double calcium;
    private double magnesium;
    private double sodium;
    private double potassium;
    private double sulfate;
    private double ionicStrength;
    private Activities g;
    private double hydrogen;
    private double co2;
    private double hco3;
    private double co3;
    private double perHco3;
    private double perCo3;
    private double sideSlope;
    private double nh3Fraction;

    public Speciation(Solution solution, in FreshConstants constants, in ConstantShift shift)
    {
        this.solution = solution;
        this.shift = shift;
        k = constants;
        ammonia = solution.AmmoniaUmolKg * 1e-6;
        phosphate = solution.PhosphateUmolKg * 1e-6;
        silicate = solution.SilicateUmolKg * 1e-6;
        ionsFollowAlkalinity = FreshIons.DependsOnAlkalinity(solution);
        ionicStrength = 1e-3;
        Alkalinity = 1e-3;
        SetIons(Alkalinity);
    }

    /// <summary>Alkalinity of the last answer, mol/kg.</summary>
    public double Alkalinity { get; private set; }

    /// <summary>DIC of the last answer, mol/kg.</summary>
    public double Dic { get; private set; }

    /// <summary>Fugacity of CO2 of the last answer, atm.</summary>
    public readonly double Fugacity => co2 * g.Neutral / k.KH;

    /// <summary>d alkalinity/d pH at constant DIC, mol/kg.</summary>
    public readonly double BufferClosed
    {
        get
        {
            double d = co2 + perHco3 + perCo3;
            double a = perHco3 + 2 * perCo3;
            return Ln10 * (Dic * (2 * perCo3 * d + a * (co2 - perCo3)) / (d * d) + sideSlope);
        }
    }

    /// <summary>d alkalinity/d pH at constant pCO2, mol/kg.</summary>
    public readonly double BufferOpen => Ln10 * (perHco3 + 4 * perCo3 + sideSlope);

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
        for (int i = 0; i < IterationsMax; i++)
        {
            double before = ionicStrength, bicarbonateBefore = hco3;
            g = new Activities(k.Debye, Math.Min(ionicStrength, IonicStrengthMax));
            if (!Carbonates(aH, known, value))
                return false;
            FreeIons(aH);
            if (ionsFollowAlkalinity && !fixedIons)
                SetIons(Alkalinity);
            if (Math.Abs(ionicStrength - before) <= Tolerance + 1e-13 * ionicStrength && Math.Abs(hco3 - bicarbonateBefore) <= 1e-13 * hco3)
                break;
        }

        return true;
    }

    /// <summary>The last answer as a state.</summary>
    public readonly CarbonateState State(double ph)
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
            Status = SolveStatus.Solved,
            Caveats = caveats | (k.InFittedRange ? Caveats.None : Caveats.OutOfFittedRange),
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
            BufferClosedUmolKg = BufferClosed * 1e6,
            BufferOpenUmolKg = BufferOpen * 1e6,
            OmegaCalcite = activityProduct / k.KspCalcite,
            OmegaAragonite = activityProduct / k.KspAragonite,
            Nh3Fraction = nh3Fraction,
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

    private bool Carbonates(double aH, Known known, double value)
    {
        double r0 = aH * g.Bicarbonate / (k.K1 * g.Neutral);
        double r2 = k.K2 * g.Bicarbonate / (aH * g.Carbonate);
        double n1 = 1 + calcium * CaHco3 + magnesium * MgHco3 + sodium * NaHco3;
        double n2 = 1 + calcium * CaCo3 + magnesium * MgCo3 + sodium * NaCo3;
        hydrogen = aH / g.Hydrogen;
        double side = Side(aH);
        switch (known)
        {
            case Known.Alkalinity:
                hco3 = (value - side) / (n1 + 2 * r2 * n2);
                if (!(hco3 >= 0))
                    return false;
                break;
            case Known.Dic:
                hco3 = value / (r0 + n1 + r2 * n2);
                break;
            case Known.Fugacity:
                hco3 = k.KH * value / (g.Neutral * r0);
                break;
        }

        co2 = r0 * hco3;
        co3 = r2 * hco3;
        perHco3 = n1 * hco3;
        perCo3 = n2 * co3;
        Dic = co2 + perHco3 + perCo3;
        Alkalinity = perHco3 + 2 * perCo3 + side;
        return true;
    }

    /// <summary>Alkalinity that is not carbonate; its slope −d/d ln h goes to <see cref="sideSlope"/>.</summary>
    private double Side(double aH)
    {
        double hydroxide = k.KW / (aH * g.Hydroxide);
        double pairs = calcium * k.CaOh * g.Calcium / (g.CalciumPair * aH) + magnesium * k.MgOh * g.Magnesium / (g.MagnesiumPair * aH);
        double ratio = k.KNh4 * g.Ammonium / (aH * g.Neutral);
        nh3Fraction = ratio / (1 + ratio);
        double nh3 = ammonia * nh3Fraction;
        double sum = hydroxide + pairs + nh3 - hydrogen;
        sideSlope = hydroxide + pairs + hydrogen + nh3 * (1 - nh3Fraction);
        return phosphate > 0 || silicate > 0 ? sum + Nutrients(aH) : sum;
    }

    private double Nutrients(double aH)
    {
        double tK = solution.TemperatureC + 273.15, lnT = Math.Log(tK);
        double g2 = Math.Exp(4 * g.LogSingle * Ln10), g3 = Math.Exp(9 * g.LogSingle * Ln10);
        double p1 = Math.Exp(SideAcids.LnKP1(tK, lnT, 0, 0)) * g.Neutral / (aH * g.Single);
        double p2 = p1 * Math.Exp(SideAcids.LnKP2(tK, lnT, 0, 0)) * g.Single / (aH * g2);
        double p3 = p2 * Math.Exp(SideAcids.LnKP3(tK, 0, 0)) * g2 / (aH * g3);
        double d = 1 + p1 + p2 + p3;
        double mean = (-1 + p2 + 2 * p3) / d;
        double charge = (p1 + 2 * p2 + 3 * p3) / d;
        double si = SideAcids.KSi(tK, lnT, 0, 0) * g.Neutral / (aH * g.Single);
        double share = si / (1 + si);
        sideSlope += phosphate * ((2 * p2 + 6 * p3) / d - mean * charge) + silicate * share * (1 - share);
        return phosphate * mean + silicate * share;
    }

    private void FreeIons(double aH)
    {
        double caSo4 = k.CaSo4 * g.Calcium * g.Sulfate / g.Neutral, mgSo4 = k.MgSo4 * g.Magnesium * g.Sulfate / g.Neutral;
        double naSo4 = k.NaSo4 * g.Sodium * g.Sulfate / g.Single, kSo4 = k.KSo4 * g.Potassium * g.Sulfate / g.Single;
        double caOh = k.CaOh * g.Calcium / (g.CalciumPair * aH), mgOh = k.MgOh * g.Magnesium / (g.MagnesiumPair * aH);
        sulfate = total.Sulfate / (1 + calcium * caSo4 + magnesium * mgSo4 + sodium * naSo4 + potassium * kSo4);
        calcium = total.Calcium / (1 + hco3 * CaHco3 + co3 * CaCo3 + sulfate * caSo4 + caOh);
        magnesium = total.Magnesium / (1 + hco3 * MgHco3 + co3 * MgCo3 + sulfate * mgSo4 + mgOh);
        sodium = total.Sodium / (1 + hco3 * NaHco3 + co3 * NaCo3 + sulfate * naSo4);
        potassium = total.Potassium / (1 + sulfate * kSo4);
        double single = sodium + potassium + total.Chloride + hco3 + k.KW / (aH * g.Hydroxide) + hydrogen
            + calcium * (hco3 * CaHco3 + caOh) + magnesium * (hco3 * MgHco3 + mgOh) + sodium * co3 * NaCo3
            + sulfate * (sodium * naSo4 + potassium * kSo4) + ammonia * (1 - nh3Fraction);
        ionicStrength = 0.5 * (single + 4 * (calcium + magnesium + sulfate + co3));
    }

    private readonly double CaHco3 => k.CaHco3 * g.Calcium * g.Bicarbonate / g.CalciumPair;

    private readonly double CaCo3 => k.CaCo3 * g.Calcium * g.Carbonate / g.Neutral;

    private readonly double MgHco3 => k.MgHco3 * g.Magnesium * g.Bicarbonate / g.MagnesiumPair;

    private readonly double MgCo3 => k.MgCo3 * g.Magnesium * g.Carbonate / g.Neutral;

    private readonly double NaHco3 => k.NaHco3 * g.Sodium * g.Bicarbonate / g.Neutral;

    private readonly double NaCo3 => k.NaCo3 * g.Sodium * g.Carbonate / g.Single;
}
