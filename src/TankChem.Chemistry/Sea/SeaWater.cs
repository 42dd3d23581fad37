namespace TankChem.Chemistry.Sea;

/// <summary>The carbonate system of a sea or brackish water on the total scale; amounts in mol per kg of solution.</summary>
internal readonly struct SeaWater
{
    private const double Ln10 = 2.302585092994045684;
    private const double PHLow = 1;
    private const double PHHigh = 13;

    private readonly SeaConstants k;
    private readonly double phosphate;
    private readonly double silicate;
    private readonly double ammonia;

    public SeaWater(Solution solution, in ConstantShift shift)
    {
        k = new SeaConstants(solution.TemperatureC, solution.Salinity, solution.PressureAtm, solution.Constants, shift);
        phosphate = solution.PhosphateUmolKg * 1e-6;
        silicate = solution.SilicateUmolKg * 1e-6;
        ammonia = solution.AmmoniaUmolKg * 1e-6;
    }

    /// <summary>Solves one pair.</summary>
    public CarbonateState Solve(in CarbonateInput input)
    {
        double ph = input.PH is { } given ? given + TotalMinus(input.Scale) : double.NaN;
        double alkalinity = input.AlkalinityUmolKg * 1e-6 ?? double.NaN;
        double dic = input.DicUmolKg * 1e-6 ?? double.NaN;
        double co2 = input.Pco2Uatm * 1e-6 * k.FugacityFactor * k.K0 ?? double.NaN;
        SolveStatus status = SolveStatus.Solved;
        string? why = null;
        if (input.PH is null)
        {
            status = FindPH(input, alkalinity, dic, co2, out ph);
            if (status != SolveStatus.Solved)
                why = $"no water of this temperature and salinity has {Named(input)} together";
        }

        if (status != SolveStatus.Solved)
            return new CarbonateState { Status = status, FaultyArgument = why };
        double h = Math.Pow(10, -ph);
        if (input.DicUmolKg is null)
        {
            double hco3 = input.Pco2Uatm is not null ? k.K1 * co2 / h : (alkalinity - Side(h, out _)) / (1 + 2 * k.K2 / h);
            dic = hco3 * (1 + h / k.K1 + k.K2 / h);
        }

        if (!(dic >= 0) || !double.IsFinite(dic))
            return new CarbonateState { Status = SolveStatus.Impossible, FaultyArgument = "alkalinity_umol_kg: less than borate, hydroxide and the other bases alone carry at this pH; DIC would be negative" };
        return State(ph, h, dic);
    }

    private SolveStatus FindPH(in CarbonateInput input, double alkalinity, double dic, double co2, out double ph)
    {
        if (input.AlkalinityUmolKg is null)
        {
            // 1 + K1·x + K1·K2·x² = DIC/CO2 with x = 1/h, in the form that does not cancel.
            double surplus = dic / co2 - 1;
            double x = 2 * surplus / (k.K1 + Math.Sqrt(k.K1 * k.K1 + 4 * k.K1 * k.K2 * surplus));
            ph = Math.Log10(x);
            return surplus > 0 && ph is > PHLow and < PHHigh ? SolveStatus.Solved : SolveStatus.Impossible;
        }

        if (input.DicUmolKg is not null)
        {
            var closed = new ClosedAlkalinity(this, dic, alkalinity);
            return RootFinder.TryFind(ref closed, PHLow, PHHigh, StartingPH.Closed(alkalinity, dic, k.K1, k.K2), out ph);
        }

        var open = new OpenAlkalinity(this, co2, alkalinity);
        return RootFinder.TryFind(ref open, PHLow, PHHigh, StartingPH.Open(alkalinity, co2, k.K1), out ph);
    }

    /// <summary>The water at an NBS pH and a pCO2 in µatm, and how it answers them.</summary>
    public CarbonateState At(double phNbs, double pco2Uatm, out CarbonateSlopes slopes)
    {
        double ph = phNbs + k.LogNbsPerTotal, h = Math.Pow(10, -ph);
        double co2 = pco2Uatm * 1e-6 * k.FugacityFactor * k.K0;
        double hco3 = k.K1 * co2 / h, co3 = k.K2 * hco3 / h, dic = co2 + hco3 + co3;
        Side(h, out double sideSlope);
        slopes = new CarbonateSlopes(Ln10 * (hco3 + 4 * co3 - sideSlope), hco3 + 2 * co3, Ln10 * (hco3 + 2 * co3), dic);
        return State(ph, h, dic);
    }

    private CarbonateState State(double ph, double h, double dic)
    {
        double co2 = dic / (1 + k.K1 / h + k.K1 * k.K2 / (h * h));
        double hco3 = k.K1 * co2 / h;
        double co3 = k.K2 * hco3 / h;
        double side = Side(h, out double sideSlope);
        double fco2 = co2 / k.K0;
        double closed = CarbonateSlope(h, dic) - sideSlope;
        double open = hco3 + 4 * co3 - sideSlope;
        return new CarbonateState
        {
            Status = SolveStatus.Solved,
            Caveats = k.InFittedRange ? Caveats.None : Caveats.OutOfFittedRange,
            PhTotal = ph,
            PhFree = ph + Math.Log10(k.TotalPerFree),
            PhSeawater = ph + Math.Log10(k.TotalPerFree / k.SeawaterPerFree),
            PhNbs = ph - k.LogNbsPerTotal,
            AlkalinityUmolKg = (hco3 + 2 * co3 + side) * 1e6,
            DicUmolKg = dic * 1e6,
            Co2UmolKg = co2 * 1e6,
            Hco3UmolKg = hco3 * 1e6,
            Co3UmolKg = co3 * 1e6,
            Fco2Uatm = fco2 * 1e6,
            Pco2Uatm = fco2 / k.FugacityFactor * 1e6,
            BufferClosedUmolKg = closed * Ln10 * 1e6,
            BufferOpenUmolKg = open * Ln10 * 1e6,
            OmegaCalcite = k.Calcium * co3 / k.KspCalcite,
            OmegaAragonite = k.Calcium * co3 / k.KspAragonite,
            Nh3Fraction = k.KNh4 / (k.KNh4 + h),
            IonicStrengthMolKg = k.IonicStrength,
        };
    }

    /// <summary>Alkalinity that is not carbonate, and its derivative by ln h.</summary>
    private double Side(double h, out double slope)
    {
        double borate = k.Boron * k.KB / (k.KB + h);
        double hydroxide = k.KW / h;
        double nh3 = ammonia * k.KNh4 / (k.KNh4 + h);
        double silicateIon = silicate * k.KSi / (k.KSi + h);
        double free = h / k.TotalPerFree;
        double bisulfate = k.Sulfate * free / (k.KS + free);
        double hf = k.Fluoride * free / (k.KF + free);
        slope = -borate * h / (k.KB + h) - hydroxide - nh3 * h / (k.KNh4 + h) - silicateIon * h / (k.KSi + h)
            - free - bisulfate * k.KS / (k.KS + free) - hf * k.KF / (k.KF + free);
        double sum = borate + hydroxide + nh3 + silicateIon - free - bisulfate - hf;
        if (phosphate > 0)
        {
            double p1 = k.KP1 * h * h, p2 = k.KP1 * k.KP2 * h, p3 = k.KP1 * k.KP2 * k.KP3, p0 = h * h * h;
            double d = p0 + p1 + p2 + p3;
            double mean = (-p0 + p2 + 2 * p3) / d;
            double protons = (3 * p0 + 2 * p1 + p2) / d;
            sum += phosphate * mean;
            slope += phosphate * ((-3 * p0 + p2) / d - mean * protons);
        }

        return sum;
    }

    /// <summary>−d(HCO3 + 2 CO3)/d ln h at constant DIC.</summary>
    private double CarbonateSlope(double h, double dic)
    {
        double d = h * h + k.K1 * h + k.K1 * k.K2;
        return dic * k.K1 * h * (h * h + 4 * k.K2 * h + k.K1 * k.K2) / (d * d);
    }

    private double TotalMinus(PhScale scale) => scale switch
    {
        PhScale.Nbs => k.LogNbsPerTotal,
        PhScale.Total => 0,
        PhScale.Seawater => -Math.Log10(k.TotalPerFree / k.SeawaterPerFree),
        PhScale.Free => -Math.Log10(k.TotalPerFree),
    };

    private static string Named(in CarbonateInput input) =>
        input.AlkalinityUmolKg is null ? "this dic_umol_kg and pco2_uatm" : input.DicUmolKg is null ? "this alkalinity_umol_kg and pco2_uatm" : "this alkalinity_umol_kg and dic_umol_kg";

    private readonly struct ClosedAlkalinity(SeaWater water, double dic, double target) : IRisingFunction
    {
        public static bool SlopeIsExact => true;

        public double At(double x, out double slope)
        {
            double h = Math.Pow(10, -x);
            double d = h * h + water.k.K1 * h + water.k.K1 * water.k.K2;
            double carbonate = dic * water.k.K1 * (h + 2 * water.k.K2) / d;
            double side = water.Side(h, out double sideSlope);
            slope = Ln10 * (water.CarbonateSlope(h, dic) - sideSlope);
            return carbonate + side - target;
        }
    }

    private readonly struct OpenAlkalinity(SeaWater water, double co2, double target) : IRisingFunction
    {
        public static bool SlopeIsExact => true;

        public double At(double x, out double slope)
        {
            double h = Math.Pow(10, -x);
            double hco3 = water.k.K1 * co2 / h;
            double co3 = water.k.K2 * hco3 / h;
            double side = water.Side(h, out double sideSlope);
            slope = Ln10 * (hco3 + 4 * co3 - sideSlope);
            return hco3 + 2 * co3 + side - target;
        }
    }
}
