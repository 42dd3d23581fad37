namespace TankChem.Chemistry.Fresh;

/// <summary>The carbonate system of a fresh water with ion pairs; amounts in mol per kg of water, pH as activity.</summary>
internal readonly struct FreshWater
{
    private const double PHLow = 1;
    private const double PHHigh = 13;

    private readonly Solution solution;
    private readonly FreshConstants k;
    private readonly ConstantShift shift;

    public FreshWater(Solution solution, in ConstantShift shift)
    {
        this.solution = solution;
        this.shift = shift;
        k = new FreshConstants(solution.TemperatureC, solution.PressureAtm, shift);
    }

    /// <summary>Solves one pair.</summary>
    public CarbonateState Solve(in CarbonateInput input)
    {
        double alkalinity = input.AlkalinityUmolKg * 1e-6 ?? double.NaN;
        double dic = input.DicUmolKg * 1e-6 ?? double.NaN;
        double fugacity = input.Pco2Uatm * 1e-6 * k.FugacityFactor ?? double.NaN;
        var speciation = new Speciation(solution, k, shift);
        double ph;
        if (input.PH is { } given)
        {
            ph = given;
            Known known = input.AlkalinityUmolKg is not null ? Known.Alkalinity : input.DicUmolKg is not null ? Known.Dic : Known.Fugacity;
            double value = known switch { Known.Alkalinity => alkalinity, Known.Dic => dic, Known.Fugacity => fugacity };

            // On another scale than the activity scale the pH moves with the activity coefficient, which the speciation gives.
            for (int i = 0; i < 6; i++)
            {
                if (!speciation.TryAt(ph, known, value))
                    return NoCarbonate();
                double next = given + speciation.NbsMinus(input.Scale);
                if (Math.Abs(next - ph) < 1e-13)
                    break;
                ph = next;
            }
        }
        else
        {
            SolveStatus status = FindPH(ref speciation, input, alkalinity, dic, fugacity, out ph);
            if (status != SolveStatus.Solved)
                return new CarbonateState { Status = status, FaultyArgument = "no fresh water of this temperature has these two values together" };
        }

        return speciation.State(ph, speciation.Slopes(ph));
    }

    /// <summary>A speciation of this water to be asked again and again.</summary>
    public Speciation Start() => new(solution, k, shift);

    /// <summary>The water at an NBS pH and a pCO2 in µatm, and how it answers them.</summary>
    public CarbonateState At(ref Speciation speciation, double phNbs, double pco2Uatm, out CarbonateSlopes slopes)
    {
        speciation.TryAt(phNbs, Known.Fugacity, pco2Uatm * 1e-6 * k.FugacityFactor);
        slopes = speciation.Slopes(phNbs);
        return speciation.State(phNbs, slopes);
    }

    private SolveStatus FindPH(ref Speciation speciation, in CarbonateInput input, double alkalinity, double dic, double fugacity, out double ph)
    {
        if (input.AlkalinityUmolKg is null)
        {
            var ratio = new FugacityAt { Speciation = speciation, Dic = dic, LnTarget = Math.Log(fugacity) };
            SolveStatus byRatio = dic > 0 ? RootFinder.TryFind(ref ratio, PHLow, PHHigh, StartingPH.Ratio(dic, k.KH * fugacity, k.K1), out ph) : Impossible(out ph);
            speciation = ratio.Speciation;
            if (byRatio == SolveStatus.Solved)
                speciation.TryAt(ph, Known.Dic, dic);
            return byRatio;
        }

        Known known = input.DicUmolKg is not null ? Known.Dic : Known.Fugacity;
        double value = known == Known.Dic ? dic : fugacity;
        speciation.FixAlkalinity(alkalinity);
        var function = new AlkalinityAt { Speciation = speciation, Known = known, Value = value, Target = alkalinity };
        double start = known == Known.Dic ? StartingPH.Closed(alkalinity, dic, k.K1, k.K2) : StartingPH.Open(alkalinity, k.KH * fugacity, k.K1);
        SolveStatus status = RootFinder.TryFind(ref function, PHLow, PHHigh, start, out ph);
        speciation = function.Speciation;
        if (status == SolveStatus.Solved)
            speciation.TryAt(ph, known, value);
        return status;
    }

    private static SolveStatus Impossible(out double ph)
    {
        ph = double.NaN;
        return SolveStatus.Impossible;
    }

    private static CarbonateState NoCarbonate() => new()
    {
        Status = SolveStatus.Impossible,
        FaultyArgument = "alkalinity_umol_kg: less than hydroxide and the other bases alone carry at this pH; DIC would be negative",
    };

    private struct AlkalinityAt : IRisingFunction
    {
        public static bool SlopeIsExact => false;

        public Speciation Speciation;
        public Known Known;
        public double Value;
        public double Target;

        public double At(double x, out double slope)
        {
            Speciation.TryAt(x, Known, Value);
            slope = Known == Known.Dic ? Speciation.AlkalinityRiseClosed : Speciation.AlkalinityRiseOpen;
            return Speciation.Alkalinity - Target;
        }
    }

    private struct FugacityAt : IRisingFunction
    {
        public static bool SlopeIsExact => false;

        public Speciation Speciation;
        public double Dic;
        public double LnTarget;

        public double At(double x, out double slope)
        {
            Speciation.TryAt(x, Known.Dic, Dic);
            slope = Speciation.LnFugacityFall;
            return LnTarget - Math.Log(Speciation.Fugacity);
        }
    }
}

/// <summary>What is known beside the pH.</summary>
internal enum Known
{
    Alkalinity,
    Dic,
    Fugacity,
}
