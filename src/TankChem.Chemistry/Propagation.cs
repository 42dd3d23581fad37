namespace TankChem.Chemistry;

/// <summary>First-order propagation: each input and constant is moved by a small step to both sides, everything else held (constants that only scale an answer need no step); contributions add in squares.</summary>
internal static class Propagation
{
    /// <summary>Small against any measurement, large against the rounding of a solved pH (1e-13): the central difference is good to about 1e-7 relative.</summary>
    private const double RelativeStep = 1e-4;

    private const double Ln10 = 2.302585092994045684;

    public static CarbonateUncertainty Of(Solution solution, in CarbonateInput input, in CarbonateState state, in InputUncertainty u)
    {
        var sum = new Squares(state);
        if (u.PH > 0 && input.PH is { } ph)
            sum.Add(solution, solution, input with { PH = ph + RelativeStep }, input with { PH = ph - RelativeStep }, default, default, u.PH / RelativeStep);
        if (u.AlkalinityUmolKg > 0 && input.AlkalinityUmolKg is { } alkalinity)
        {
            double step = Step(alkalinity, u.AlkalinityUmolKg);
            sum.Add(solution, solution, input with { AlkalinityUmolKg = alkalinity + step }, input with { AlkalinityUmolKg = alkalinity - step }, default, default, u.AlkalinityUmolKg / step);
        }

        if (u.DicUmolKg > 0 && input.DicUmolKg is { } dic)
        {
            double step = Step(dic, u.DicUmolKg);
            sum.Add(solution, solution, input with { DicUmolKg = dic + step }, input with { DicUmolKg = dic - step }, default, default, u.DicUmolKg / step);
        }

        if (u.Pco2Uatm > 0 && input.Pco2Uatm is { } pco2)
        {
            double step = Step(pco2, u.Pco2Uatm);
            sum.Add(solution, solution, input with { Pco2Uatm = pco2 + step }, input with { Pco2Uatm = pco2 - step }, default, default, u.Pco2Uatm / step);
        }

        if (u.TemperatureC > 0)
        {
            const double step = 1e-3;
            sum.Add(solution with { TemperatureC = solution.TemperatureC + step }, solution with { TemperatureC = solution.TemperatureC - step }, input, input, default, default, u.TemperatureC / step);
        }

        if (u.Salinity > 0 && solution.Salinity > 0)
        {
            double step = RelativeStep * solution.Salinity;
            sum.Add(solution with { Salinity = solution.Salinity + step }, solution with { Salinity = solution.Salinity - step }, input, input, default, default, u.Salinity / step);
        }

        if (u.IncludeConstants)
            AddConstants(ref sum, solution, input);
        return sum.Root();
    }

    private static void AddConstants(ref Squares sum, Solution solution, in CarbonateInput input)
    {
        const double e = RelativeStep;
        sum.AddSolubilities(ConstantShift.UPKsp);
        if (input.Pco2Uatm is null)
            sum.AddHenry(ConstantShift.UPK0);
        else
            Add(ref sum, solution, input, new() { PK0 = e }, new() { PK0 = -e }, ConstantShift.UPK0 / e);
        double share = CarbonateSystem.ShareOfSea(solution);
        bool blended = share is > 0 and < 1;
        if (solution.AmmoniaUmolKg == 0 && !blended)
            sum.AddAmmonium(ConstantShift.UPKNh4);
        else
            Add(ref sum, solution, input, new() { PKNh4 = e }, new() { PKNh4 = -e }, ConstantShift.UPKNh4 / e);
        Add(ref sum, solution, input, new() { PK1 = e }, new() { PK1 = -e }, ConstantShift.UPK1 / e);
        Add(ref sum, solution, input, new() { PK2 = e }, new() { PK2 = -e }, ConstantShift.UPK2 / e);
        Add(ref sum, solution, input, new() { PKW = e }, new() { PKW = -e }, ConstantShift.UPKW / e);
        if (share > 0)
        {
            Add(ref sum, solution, input, new() { PKB = e }, new() { PKB = -e }, ConstantShift.UPKB / e);
            Add(ref sum, solution, input, new() { BoronRelative = e }, new() { BoronRelative = -e }, ConstantShift.UBoronRelative / e);
        }

        AddAssumedIons(ref sum, solution, input);
        AddModels(ref sum, solution, input, share);
    }

    /// <summary>Where two descriptions of one water are blended, neither is known to be the right one.</summary>
    private static void AddModels(ref Squares sum, Solution solution, in CarbonateInput input, double share)
    {
        if (share is > 0 and < 1)
        {
            // The standard deviation of a quantity that is one value with probability w and the other with 1 − w.
            CarbonateState fresh = CarbonateSystem.Solve(solution with { Constants = ConstantSet.Fresh }, input, default);
            CarbonateState sea = CarbonateSystem.Solve(solution with { Constants = ConstantSet.Millero2010 }, input, default);
            if (fresh.Status == SolveStatus.Solved && sea.Status == SolveStatus.Solved)
                sum.AddDifference(sea, fresh, Math.Sqrt(share * (1 - share)));
        }

        if (share > 0 && NbsBridge.StandardUncertainty(solution) is > 0 and var u)
            Add(ref sum, solution, input, new() { NbsBridge = RelativeStep }, new() { NbsBridge = -RelativeStep }, u / RelativeStep);
    }

    /// <summary>How natural waters differ from the assumed composition; a whole standard deviation to both sides, since it is wide.</summary>
    private static void AddAssumedIons(ref Squares sum, Solution solution, in CarbonateInput input)
    {
        if (solution.Ions is not null || CarbonateSystem.ShareOfSea(solution) >= 1)
            return;
        Add(ref sum, solution, input, new() { LnOtherSalt = ConstantShift.ULnOtherSalt }, new() { LnOtherSalt = -ConstantShift.ULnOtherSalt }, 1);
        if (solution.HardnessMmolKg is null)
            Add(ref sum, solution, input, new() { LogitHardness = ConstantShift.ULogitHardness }, new() { LogitHardness = -ConstantShift.ULogitHardness }, 1);
    }

    private static void Add(ref Squares sum, Solution solution, in CarbonateInput input, in ConstantShift up, in ConstantShift down, double factor) =>
        sum.Add(solution, solution, input, input, up, down, factor);

    private static double Step(double value, double u) => Math.Max(Math.Abs(value) * RelativeStep, u * 1e-6);

    /// <summary>Sums of squares of the contributions.</summary>
    private struct Squares(CarbonateState state)
    {
        private readonly CarbonateState state = state;
        private double ph;
        private double alkalinity;
        private double dic;
        private double co2;
        private double co2MgL;
        private double hco3;
        private double co3;
        private double pco2;
        private double nh3;
        private double closed;
        private double open;
        private double calcite;
        private double aragonite;

        public void Add(Solution upSolution, Solution downSolution, in CarbonateInput upInput, in CarbonateInput downInput, in ConstantShift upShift, in ConstantShift downShift, double factor)
        {
            CarbonateState up = CarbonateSystem.Solve(upSolution, upInput, upShift);
            CarbonateState down = CarbonateSystem.Solve(downSolution, downInput, downShift);

            // At an edge of what is possible only one side exists: the slope is then taken there.
            double span = 0.5;
            if (up.Status != SolveStatus.Solved)
                (up, span) = (state, 1);
            else if (down.Status != SolveStatus.Solved)
                (down, span) = (state, 1);
            if (down.Status != SolveStatus.Solved)
                return;
            AddDifference(up, down, factor * span);
        }

        /// <summary>Adds a part of the difference of two states as a contribution.</summary>
        public void AddDifference(in CarbonateState up, in CarbonateState down, double f)
        {
            ph += Square(f * (up.PhNbs - down.PhNbs));
            alkalinity += Square(f * (up.AlkalinityUmolKg - down.AlkalinityUmolKg));
            dic += Square(f * (up.DicUmolKg - down.DicUmolKg));
            co2 += Square(f * (up.Co2UmolKg - down.Co2UmolKg));
            co2MgL += Square(f * (up.Co2MgL - down.Co2MgL));
            hco3 += Square(f * (up.Hco3UmolKg - down.Hco3UmolKg));
            co3 += Square(f * (up.Co3UmolKg - down.Co3UmolKg));
            pco2 += Square(f * (up.Pco2Uatm - down.Pco2Uatm));
            nh3 += Square(f * (up.Nh3Fraction - down.Nh3Fraction));
            closed += Square(f * (up.BufferClosedUmolKg - down.BufferClosedUmolKg));
            open += Square(f * (up.BufferOpenUmolKg - down.BufferOpenUmolKg));
            calcite += Square(f * (up.OmegaCalcite - down.OmegaCalcite));
            aragonite += Square(f * (up.OmegaAragonite - down.OmegaAragonite));
        }

        /// <summary>Solubility products divide the saturation states and touch nothing else.</summary>
        public void AddSolubilities(double uPK)
        {
            calcite += Square(state.OmegaCalcite * Ln10 * uPK);
            aragonite += Square(state.OmegaAragonite * Ln10 * uPK);
        }

        /// <summary>Henry's constant divides the pressure of CO2 and touches nothing else, unless that pressure is what was given.</summary>
        public void AddHenry(double uPK) => pco2 += Square(state.Pco2Uatm * Ln10 * uPK);

        /// <summary>Without ammonia in the alkalinity its constant moves only its own share f: df = −f (1 − f) ln 10 dpK.</summary>
        public void AddAmmonium(double uPK) => nh3 += Square(state.Nh3Fraction * (1 - state.Nh3Fraction) * Ln10 * uPK);

        public readonly CarbonateUncertainty Root() => new()
        {
            PhNbs = Math.Sqrt(ph),
            AlkalinityUmolKg = Math.Sqrt(alkalinity),
            DicUmolKg = Math.Sqrt(dic),
            Co2UmolKg = Math.Sqrt(co2),
            Co2MgL = Math.Sqrt(co2MgL),
            Hco3UmolKg = Math.Sqrt(hco3),
            Co3UmolKg = Math.Sqrt(co3),
            Pco2Uatm = Math.Sqrt(pco2),
            Nh3Fraction = Math.Sqrt(nh3),
            BufferClosedUmolKg = Math.Sqrt(closed),
            BufferOpenUmolKg = Math.Sqrt(open),
            OmegaCalcite = Math.Sqrt(calcite),
            OmegaAragonite = Math.Sqrt(aragonite),
        };

        private static double Square(double x) => x * x;
    }
}
