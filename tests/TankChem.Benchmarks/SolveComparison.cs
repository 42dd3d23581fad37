using TankChem.Chemistry;

namespace TankChem.Benchmarks;

/// <summary>A solve against a bare loop of the exponentials and logarithms that its constants and activity coefficients cannot do without.</summary>
internal static class SolveComparison
{
    private const int Rows = 20_000;

    /// <summary>Constants of sea water (three quarters exponentials, the rest logarithms).</summary>
    private const int SeaFunctions = 28;

    /// <summary>Constants of fresh water, and activity coefficients at two ionic strengths.</summary>
    private const int FreshFunctions = 50;

    private static double sink;

    public static void Print()
    {
        Print("solve, sea, pH + alkalinity", 35, SeaFunctions, new CarbonateInput { PH = 8.1, AlkalinityUmolKg = 2300 }, false);
        Print("solve, fresh, pH + alkalinity", 0, FreshFunctions, new CarbonateInput { PH = 7.3, AlkalinityUmolKg = 2000 }, false);
        Print("solve, fresh, alkalinity + pCO2", 0, FreshFunctions, new CarbonateInput { AlkalinityUmolKg = 2000, Pco2Uatm = 420 }, false);
        Print("solve with uncertainty, sea", 35, SeaFunctions, new CarbonateInput { PH = 8.1, AlkalinityUmolKg = 2300 }, true);
        Print("solve with uncertainty, fresh", 0, FreshFunctions, new CarbonateInput { PH = 7.3, AlkalinityUmolKg = 2000 }, true);
    }

    private static void Print(string name, double salinity, int functions, CarbonateInput input, bool propagate)
    {
        int rows = propagate ? Rows / 10 : Rows;
        Comparison.Print(name, rows, () => Solve(rows, salinity, input, propagate), () => Functions(rows, functions));
    }

    private static void Solve(int rows, double salinity, CarbonateInput input, bool propagate)
    {
        var uncertainty = new InputUncertainty { PH = 0.02, AlkalinityUmolKg = 30, TemperatureC = 0.1, IncludeConstants = true };
        for (int i = 0; i < rows; i++)
        {
            var solution = new Solution { TemperatureC = 5 + 20.0 * i / rows, Salinity = salinity };
            CarbonateState state = CarbonateSystem.Solve(solution, input);
            sink += state.Co2UmolKg;
            if (propagate)
                sink += CarbonateSystem.Propagate(solution, input, state, uncertainty).Co2UmolKg;
        }
    }

    private static void Functions(int rows, int functions)
    {
        for (int i = 0; i < rows; i++)
        {
            double x = 1 + (double)i / rows;
            for (int f = 0; f < functions; f += 4)
                sink += Math.Exp(-x - f) + Math.Exp(x - f) + Math.Exp(-2 * x - f) + Math.Log(x + f);
        }
    }
}
