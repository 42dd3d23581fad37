namespace TankChem.Chemistry.Fresh;

/// <summary>Activity coefficients of the species at one ionic strength. Ion sizes and linear terms: TJ74; ions without them: Dav62; neutral species: log γ = 0.1 I.</summary>
internal readonly struct Activities
{
    private const double Ln10 = 2.302585092994045684;

    public Activities(in DebyeHueckel debye, double ionicStrength)
    {
        double i = ionicStrength, root = Math.Sqrt(i);
        Hydrogen = Ten(debye.LogGamma(i, root, 1, 9.0, 0));
        Hydroxide = Ten(debye.LogGamma(i, root, 1, 3.5, 0));
        Bicarbonate = Ten(debye.LogGamma(i, root, 1, 5.4, 0));
        Carbonate = Ten(debye.LogGamma(i, root, 4, 5.4, 0));
        Calcium = Ten(debye.LogGamma(i, root, 4, 5.0, 0.165));
        Magnesium = Ten(debye.LogGamma(i, root, 4, 5.5, 0.20));
        Sodium = Ten(debye.LogGamma(i, root, 1, 4.0, 0.075));
        Potassium = Ten(debye.LogGamma(i, root, 1, 3.5, 0.015));
        Sulfate = Ten(debye.LogGamma(i, root, 4, 5.0, -0.04));
        CalciumPair = Ten(debye.LogGamma(i, root, 1, 6.0, 0));
        MagnesiumPair = Ten(debye.LogGamma(i, root, 1, 4.0, 0));
        Ammonium = Ten(debye.LogGamma(i, root, 1, 2.5, 0));
        LogSingle = debye.LogGammaDavies(i, root, 1);
        Single = Ten(LogSingle);
        Neutral = Ten(0.1 * i);
    }

    public double Hydrogen { get; }

    public double Hydroxide { get; }

    public double Bicarbonate { get; }

    public double Carbonate { get; }

    public double Calcium { get; }

    public double Magnesium { get; }

    public double Sodium { get; }

    public double Potassium { get; }

    public double Sulfate { get; }

    /// <summary>CaHCO3⁺, CaOH⁺.</summary>
    public double CalciumPair { get; }

    /// <summary>MgHCO3⁺, MgOH⁺.</summary>
    public double MagnesiumPair { get; }

    public double Ammonium { get; }

    /// <summary>Singly charged ions without parameters of their own.</summary>
    public double Single { get; }

    /// <summary>log of <see cref="Single"/>; times z² for other charges.</summary>
    public double LogSingle { get; }

    public double Neutral { get; }

    private static double Ten(double exponent) => Math.Exp(exponent * Ln10);
}
