namespace TankChem.Chemistry.Fresh;

/// <summary>Thermodynamic constants of fresh water at one temperature: activities, molal, I → 0. 0…90 °C.</summary>
/// <remarks>Carbonic acid, CO2, Ca and Mg pairs, calcite, aragonite: PB82. Water: WATEQ4F expression, BN91. Sodium, potassium and sulfate pairs, hydroxide pairs: BN91
/// (log K at 25 °C and reaction enthalpy, van 't Hoff). Ammonium: Eme75.</remarks>
internal readonly struct FreshConstants
{
    private const double Ln10 = 2.302585092994045684;
    private const double KilocaloriesPerLn10R = 1 / (Ln10 * 1.98720425864e-3);

    public FreshConstants(double tC, double pressureAtm, in ConstantShift shift)
    {
        double tK = tC + 273.15, logT = Math.Log10(tK), invT = 1 / tK, invT2 = invT * invT;
        double vantHoff = (invT - 1 / 298.15) * KilocaloriesPerLn10R;
        K1 = Ten(-356.3094 - 0.06091964 * tK + 21834.37 * invT + 126.8339 * logT - 1684915.0 * invT2 - shift.PK1);
        K2 = Ten(-107.8871 - 0.03252849 * tK + 5151.79 * invT + 38.92561 * logT - 563713.9 * invT2 - shift.PK2);
        KH = Ten(108.3865 + 0.01985076 * tK - 6919.53 * invT - 40.45154 * logT + 669365.0 * invT2 - shift.PK0);
        KW = Ten(-283.971 - 0.05069842 * tK + 13323.0 * invT + 102.24447 * logT - 1119669.0 * invT2 - shift.PKW);
        KspCalcite = Ten(-171.9065 - 0.077993 * tK + 2839.319 * invT + 71.595 * logT);
        KspAragonite = Ten(-171.9773 - 0.077993 * tK + 2903.293 * invT + 71.595 * logT);
        CaHco3 = Ten(1209.120 + 0.31294 * tK - 34765.05 * invT - 478.782 * logT);
        CaCo3 = Ten(-1228.732 - 0.299440 * tK + 35512.75 * invT + 485.818 * logT);
        MgHco3 = Ten(-59.215 + 2537.455 * invT + 20.92298 * logT);
        MgCo3 = Ten(0.9910 + 0.00667 * tK);
        NaHco3 = Ten(-0.25 + 1.0 * vantHoff);
        NaCo3 = Ten(1.27 - 8.91 * vantHoff);
        CaSo4 = Ten(2.25 - 1.325 * vantHoff);
        MgSo4 = Ten(2.37 - 4.55 * vantHoff);
        NaSo4 = Ten(0.7 - 1.12 * vantHoff);
        KSo4 = Ten(0.85 - 2.25 * vantHoff);
        CaOh = Ten(-12.78);
        MgOh = Ten(-11.44 - 15.952 * vantHoff);
        KNh4 = Ten(-(0.09018 + 2729.92 * invT) - shift.PKNh4);
        FugacityFactor = Sea.CarbonDioxideW74.FugacityFactor(tK, pressureAtm);
        Debye = new DebyeHueckel(tC);
        InFittedRange = tC is >= 0 and <= 90;
    }

    public double K1 { get; }

    public double K2 { get; }

    /// <summary>Henry's constant, mol/(kg atm).</summary>
    public double KH { get; }

    public double KW { get; }

    public double KspCalcite { get; }

    public double KspAragonite { get; }

    public double CaHco3 { get; }

    public double CaCo3 { get; }

    public double MgHco3 { get; }

    public double MgCo3 { get; }

    public double NaHco3 { get; }

    public double NaCo3 { get; }

    public double CaSo4 { get; }

    public double MgSo4 { get; }

    public double NaSo4 { get; }

    public double KSo4 { get; }

    /// <summary>Ca²⁺ + H2O = CaOH⁺ + H⁺.</summary>
    public double CaOh { get; }

    /// <summary>Mg²⁺ + H2O = MgOH⁺ + H⁺.</summary>
    public double MgOh { get; }

    public double KNh4 { get; }

    public double FugacityFactor { get; }

    public DebyeHueckel Debye { get; }

    public bool InFittedRange { get; }

    private static double Ten(double exponent) => Math.Exp(exponent * Ln10);
}
