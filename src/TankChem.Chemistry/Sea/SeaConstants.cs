namespace TankChem.Chemistry.Sea;

/// <summary>All constants of one water on the total scale, mol per kg of solution.</summary>
internal readonly struct SeaConstants
{
    public SeaConstants(double tC, double s, double pressureAtm, ConstantSet set, in ConstantShift shift)
    {
        double tK = tC + 273.15, lnT = Math.Log(tK), sqrtS = Math.Sqrt(s);
        IonicStrength = SeaSalt.IonicStrength(s);
        Sulfate = SeaSalt.Sulfate(s);
        Fluoride = SeaSalt.Fluoride(s);
        Boron = SeaSalt.Boron(s) * (1 + shift.BoronRelative);
        Calcium = SeaSalt.Calcium(s);
        KS = SideAcids.KS(tK, lnT, s, IonicStrength);
        KF = SideAcids.KF(tK, s, IonicStrength);
        TotalPerFree = 1 + Sulfate / KS;
        SeawaterPerFree = TotalPerFree + Fluoride / KF;
        double totalPerSeawater = TotalPerFree / SeawaterPerFree;
        (K1, K2, InFittedRange) = CarbonicAcid(tC, tK, lnT, s, sqrtS, totalPerSeawater, set);
        K1 *= Ten(-shift.PK1);
        K2 *= Ten(-shift.PK2);
        K0 = CarbonDioxideW74.K0(tK, s) * Ten(-shift.PK0);
        FugacityFactor = CarbonDioxideW74.FugacityFactor(tK, pressureAtm);
        KB = Math.Exp(SideAcids.LnKB(tK, lnT, s, sqrtS)) * Ten(-shift.PKB);
        KW = Math.Exp(SideAcids.LnKW(tK, lnT, s, sqrtS)) * totalPerSeawater * Ten(-shift.PKW);
        KP1 = Math.Exp(SideAcids.LnKP1(tK, lnT, s, sqrtS)) * totalPerSeawater;
        KP2 = Math.Exp(SideAcids.LnKP2(tK, lnT, s, sqrtS)) * totalPerSeawater;
        KP3 = Math.Exp(SideAcids.LnKP3(tK, s, sqrtS)) * totalPerSeawater;
        KSi = SideAcids.KSi(tK, lnT, s, IonicStrength) * totalPerSeawater;
        KNh4 = Ten(-SideAcids.PKAmmonium(tK, s) - shift.PKNh4) * SeaSalt.WaterShare(s);
        KspCalcite = CalciumCarbonateMuc83.Calcite(tK, lnT, s, sqrtS);
        KspAragonite = CalciumCarbonateMuc83.Aragonite(tK, lnT, s, sqrtS);
        LogNbsPerTotal = NbsBridge.LogActivityPerTotal(tK, s, TotalPerFree, SeawaterPerFree) + shift.NbsBridge;
    }

    public double IonicStrength { get; }

    public double Sulfate { get; }

    public double Fluoride { get; }

    public double Boron { get; }

    public double Calcium { get; }

    /// <summary>Bisulfate, free scale.</summary>
    public double KS { get; }

    /// <summary>Hydrogen fluoride, free scale.</summary>
    public double KF { get; }

    /// <summary>[H]T/[H]F.</summary>
    public double TotalPerFree { get; }

    /// <summary>[H]SWS/[H]F.</summary>
    public double SeawaterPerFree { get; }

    public double K0 { get; }

    public double FugacityFactor { get; }

    public double K1 { get; }

    public double K2 { get; }

    public bool InFittedRange { get; }

    public double KB { get; }

    public double KW { get; }

    public double KP1 { get; }

    public double KP2 { get; }

    public double KP3 { get; }

    public double KSi { get; }

    public double KNh4 { get; }

    public double KspCalcite { get; }

    public double KspAragonite { get; }

    /// <summary>log10 of a(H, NBS)/[H]T.</summary>
    public double LogNbsPerTotal { get; }

    private static (double K1, double K2, bool InRange) CarbonicAcid(double tC, double tK, double lnT, double s, double sqrtS, double totalPerSeawater, ConstantSet set) => set switch
    {
        ConstantSet.Waters2014 => (Ten(-CarbonicAcidWMW14.PK1(tK, lnT, s, sqrtS)), Ten(-CarbonicAcidWMW14.PK2(tK, lnT, s, sqrtS)), CarbonicAcidWMW14.InFittedRange(tC, s)),
        ConstantSet.Lueker2000 => (Ten(-CarbonicAcidLDK00.PK1(tK, lnT, s)), Ten(-CarbonicAcidLDK00.PK2(tK, lnT, s)), CarbonicAcidLDK00.InFittedRange(tC, s)),
        ConstantSet.Auto or ConstantSet.Millero2010 or ConstantSet.Fresh => (
            Ten(-CarbonicAcidM10.PK1(tK, lnT, s, sqrtS)) * totalPerSeawater, Ten(-CarbonicAcidM10.PK2(tK, lnT, s, sqrtS)) * totalPerSeawater, CarbonicAcidM10.InFittedRange(tC, s)),
    };

    private static double Ten(double exponent) => exponent == 0 ? 1 : Math.Exp(exponent * 2.302585092994045684);
}
