using TankChem.Chemistry.Fresh;
using TankChem.Chemistry.Sea;

namespace TankChem.Chemistry;

/// <summary>
/// Between fresh and sea: one water described by both models. At a pH (NBS) and a pCO2 each model says what the water is, and the answer lies between, in a share that
/// rises smoothly with salinity; every other pair of known values is solved for that pH and pCO2. So all pairs agree with each other, as in either model alone.
/// </summary>
internal readonly struct BrackishWater
{
    private const double PHLow = 1;
    private const double PHHigh = 13;
    private const double LnPco2Low = -30;

    /// <summary>No pCO2 of a brackish water is further than this (a factor of 1,000) from what the rough constants give.</summary>
    private const double LnRoughMax = 7;

    // Of a dilute water near 20 °C, for the start of a search only.
    private const double RoughK0 = 0.039e-6;
    private const double RoughK1 = 6e-7;
    private const double RoughK2 = 1e-10;

    private readonly FreshWater fresh;
    private readonly SeaWater sea;
    private readonly double share;

    public BrackishWater(Solution solution, in ConstantShift shift, double shareOfSea)
    {
        fresh = new FreshWater(solution, shift);
        sea = new SeaWater(solution, shift);
        share = shareOfSea;
    }

    /// <summary>Solves one pair.</summary>
    public CarbonateState Solve(in CarbonateInput input)
    {
        var both = new Both(fresh, sea, share);
        double alkalinity = input.AlkalinityUmolKg ?? double.NaN, dic = input.DicUmolKg ?? double.NaN;
        double lnPco2 = input.Pco2Uatm is { } pco2 ? Math.Log(pco2) : double.NaN;
        (double startPH, double startLnPco2) = Start(input);
        double ph = input.PH ?? startPH;
        SolveStatus status;
        if (input.PH is not null)
            status = AtPH(ref both, input, startLnPco2, ref ph, ref lnPco2);
        else if (input.AlkalinityUmolKg is null)
            status = Find(new DicAtPH(both, lnPco2, dic), startPH, ref both, out ph);
        else if (input.DicUmolKg is null)
            status = Find(new AlkalinityAtPH(both, lnPco2, alkalinity), startPH, ref both, out ph);
        else
        {
            status = Find(new AlkalinityAtDic(both, dic, alkalinity), startPH, ref both, out ph);
            if (status == SolveStatus.Solved)
                status = both.FindPco2ForDic(ph, dic, out lnPco2);
        }

        return status == SolveStatus.Solved
            ? both.At(ph, lnPco2, out _)
            : new CarbonateState { Status = status, FaultyArgument = "no brackish water of this temperature and salinity has these two values together" };
    }

    /// <summary>Between the answers of the two models, where both have one.</summary>
    private (double PH, double LnPco2) Start(in CarbonateInput input)
    {
        CarbonateState ofFresh = fresh.Solve(input), ofSea = sea.Solve(input);
        return ofFresh.Status == SolveStatus.Solved && ofSea.Status == SolveStatus.Solved
            ? (Mean(ofFresh.PhNbs, ofSea.PhNbs, share), Mean(Math.Log(ofFresh.Pco2Uatm), Math.Log(ofSea.Pco2Uatm), share))
            : (double.NaN, double.NaN);
    }

    /// <summary>Finds the pCO2 at a pH that may stand on another scale than NBS, where it moves a little with the composition.</summary>
    private static SolveStatus AtPH(ref Both both, in CarbonateInput input, double start, ref double ph, ref double lnPco2)
    {
        double given = ph;
        for (int i = 0; i < 8; i++)
        {
            SolveStatus status = input.AlkalinityUmolKg is { } alkalinity ? both.FindPco2ForAlkalinity(ph, alkalinity, start, out lnPco2)
                : input.DicUmolKg is { } dic ? both.FindPco2ForDic(ph, dic, out lnPco2)
                : SolveStatus.Solved;
            if (status != SolveStatus.Solved || input.Scale == PhScale.Nbs)
                return status;
            CarbonateState state = both.At(ph, lnPco2, out _);
            double next = ph + given - (input.Scale switch
            {
                PhScale.Nbs => state.PhNbs,
                PhScale.Total => state.PhTotal,
                PhScale.Seawater => state.PhSeawater,
                PhScale.Free => state.PhFree,
            });
            if (Math.Abs(next - ph) < 1e-13)
                break;
            ph = next;
        }

        return SolveStatus.Solved;
    }

    private static SolveStatus Find<T>(T function, double start, ref Both both, out double ph)
        where T : struct, IRisingFunction, IOfBoth
    {
        SolveStatus status = RootFinder.TryFind(ref function, PHLow, PHHigh, start, out ph);
        both = function.Both;
        return status;
    }

    private interface IOfBoth
    {
        Both Both { get; }
    }

    /// <summary>Both models and where the last search ended.</summary>
    private struct Both(FreshWater fresh, SeaWater sea, double share)
    {
        private readonly FreshWater fresh = fresh;
        private readonly SeaWater sea = sea;
        private readonly double share = share;
        private Speciation speciation = fresh.Start();

        /// <summary>How far the last pCO2 found was from the rough one: the next is as far.</summary>
        private double lnOffRough;

        public CarbonateState At(double phNbs, double lnPco2, out CarbonateSlopes slopes)
        {
            double pco2 = Math.Exp(lnPco2);
            CarbonateState ofFresh = fresh.At(ref speciation, phNbs, pco2, out CarbonateSlopes freshSlopes);
            CarbonateState ofSea = sea.At(phNbs, pco2, out CarbonateSlopes seaSlopes);
            slopes = CarbonateSlopes.Mean(freshSlopes, seaSlopes, share);
            return Between(ofFresh, ofSea, slopes, share);
        }

        public SolveStatus FindPco2ForDic(double phNbs, double dic, out double lnPco2)
        {
            lnPco2 = double.NegativeInfinity;
            if (dic == 0)
                return SolveStatus.Solved;
            double rough = RoughLnPco2(phNbs, dic);
            var function = new DicAtPco2(this, phNbs, dic);
            SolveStatus status = RootFinder.TryFind(ref function, rough - LnRoughMax, rough + LnRoughMax, rough + lnOffRough, out lnPco2);
            this = function.Both;
            lnOffRough = status == SolveStatus.Solved ? lnPco2 - rough : 0;
            return status;
        }

        public SolveStatus FindPco2ForAlkalinity(double phNbs, double alkalinity, double start, out double lnPco2)
        {
            double bicarbonateOnly = Math.Log(Math.Max(alkalinity, 1) * 1e-6 * Math.Pow(10, -phNbs) / RoughK1 / RoughK0);
            var function = new AlkalinityAtPco2(this, phNbs, alkalinity);
            SolveStatus status = RootFinder.TryFind(ref function, LnPco2Low, bicarbonateOnly + LnRoughMax, double.IsNaN(start) ? bicarbonateOnly : start, out lnPco2);
            this = function.Both;
            return status;
        }

        private static double RoughLnPco2(double phNbs, double dic)
        {
            double perH = Math.Pow(10, phNbs);
            return Math.Log(dic * 1e-6 / RoughK0 / (1 + RoughK1 * perH * (1 + RoughK2 * perH)));
        }
    }

    /// <summary>The state between two: amounts that follow a law of mass action in their logarithm, what is balanced or a logarithm already as it stands.</summary>
    private static CarbonateState Between(in CarbonateState fresh, in CarbonateState sea, in CarbonateSlopes slopes, double w) => new()
    {
        Status = fresh.Status,
        FaultyArgument = fresh.FaultyArgument,
        Caveats = fresh.Caveats | sea.Caveats | Caveats.Blended,
        PhNbs = fresh.PhNbs,
        PhTotal = Mean(fresh.PhTotal, sea.PhTotal, w),
        PhSeawater = Mean(fresh.PhSeawater, sea.PhSeawater, w),
        PhFree = Mean(fresh.PhFree, sea.PhFree, w),
        AlkalinityUmolKg = Mean(fresh.AlkalinityUmolKg, sea.AlkalinityUmolKg, w),
        DicUmolKg = Mean(fresh.DicUmolKg, sea.DicUmolKg, w),
        Co2UmolKg = Geometric(fresh.Co2UmolKg, sea.Co2UmolKg, w),
        Hco3UmolKg = Geometric(fresh.Hco3UmolKg, sea.Hco3UmolKg, w),
        Co3UmolKg = Geometric(fresh.Co3UmolKg, sea.Co3UmolKg, w),
        Pco2Uatm = Geometric(fresh.Pco2Uatm, sea.Pco2Uatm, w),
        Fco2Uatm = Geometric(fresh.Fco2Uatm, sea.Fco2Uatm, w),
        BufferClosedUmolKg = slopes.Closed * 1e6,
        BufferOpenUmolKg = slopes.Open * 1e6,
        OmegaCalcite = Geometric(fresh.OmegaCalcite, sea.OmegaCalcite, w),
        OmegaAragonite = Geometric(fresh.OmegaAragonite, sea.OmegaAragonite, w),
        Nh3Fraction = Geometric(fresh.Nh3Fraction, sea.Nh3Fraction, w),
        IonicStrengthMolKg = Mean(fresh.IonicStrengthMolKg, sea.IonicStrengthMolKg, w),
    };

    private static double Mean(double a, double b, double w) => a + w * (b - a);

    private static double Geometric(double a, double b, double w) => a > 0 && b > 0 ? a * Math.Pow(b / a, w) : Mean(a, b, w);

    private struct DicAtPH(Both both, double lnPco2, double target) : IRisingFunction, IOfBoth
    {
        private Both both = both;

        public static bool SlopeIsExact => false;

        public readonly Both Both => both;

        public double At(double x, out double slope)
        {
            double dic = both.At(x, lnPco2, out CarbonateSlopes slopes).DicUmolKg;
            slope = slopes.DicByPH * 1e6 / dic;
            return Math.Log(dic / target);
        }
    }

    private struct AlkalinityAtPH(Both both, double lnPco2, double target) : IRisingFunction, IOfBoth
    {
        private Both both = both;

        public static bool SlopeIsExact => false;

        public readonly Both Both => both;

        public double At(double x, out double slope)
        {
            double alkalinity = both.At(x, lnPco2, out CarbonateSlopes slopes).AlkalinityUmolKg;
            slope = slopes.Open * 1e6;
            return alkalinity - target;
        }
    }

    private struct AlkalinityAtDic(Both both, double dic, double target) : IRisingFunction, IOfBoth
    {
        private Both both = both;

        public static bool SlopeIsExact => false;

        public readonly Both Both => both;

        public double At(double x, out double slope)
        {
            both.FindPco2ForDic(x, dic, out double lnPco2);
            double alkalinity = both.At(x, lnPco2, out CarbonateSlopes slopes).AlkalinityUmolKg;
            slope = slopes.Closed * 1e6;
            return alkalinity - target;
        }
    }

    private struct DicAtPco2(Both both, double phNbs, double target) : IRisingFunction, IOfBoth
    {
        private Both both = both;

        public static bool SlopeIsExact => false;

        public readonly Both Both => both;

        public double At(double x, out double slope)
        {
            double dic = both.At(phNbs, x, out CarbonateSlopes slopes).DicUmolKg;
            slope = slopes.DicByLnPco2 * 1e6 / dic;
            return Math.Log(dic / target);
        }
    }

    private struct AlkalinityAtPco2(Both both, double phNbs, double target) : IRisingFunction, IOfBoth
    {
        private Both both = both;

        public static bool SlopeIsExact => false;

        public readonly Both Both => both;

        public double At(double x, out double slope)
        {
            double alkalinity = both.At(phNbs, x, out CarbonateSlopes slopes).AlkalinityUmolKg;
            slope = slopes.AlkalinityByLnPco2 * 1e6;
            return alkalinity - target;
        }
    }
}
