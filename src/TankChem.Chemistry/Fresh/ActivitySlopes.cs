namespace TankChem.Chemistry.Fresh;

/// <summary>d ln γ/dI of each species, kg/mol: the derivatives of <see cref="Activities"/>.</summary>
internal readonly struct ActivitySlopes
{
    private const double Ln10 = 2.302585092994045684;

    public ActivitySlopes(in DebyeHueckel debye, double ionicStrength)
    {
        double root = Math.Sqrt(ionicStrength);
        Hydrogen = Ln10 * debye.LogGammaSlope(root, 1, 9.0, 0);
        Hydroxide = Ln10 * debye.LogGammaSlope(root, 1, 3.5, 0);
        Bicarbonate = Ln10 * debye.LogGammaSlope(root, 1, 5.4, 0);
        Carbonate = Ln10 * debye.LogGammaSlope(root, 4, 5.4, 0);
        Calcium = Ln10 * debye.LogGammaSlope(root, 4, 5.0, 0.165);
        Magnesium = Ln10 * debye.LogGammaSlope(root, 4, 5.5, 0.20);
        Sodium = Ln10 * debye.LogGammaSlope(root, 1, 4.0, 0.075);
        Potassium = Ln10 * debye.LogGammaSlope(root, 1, 3.5, 0.015);
        Sulfate = Ln10 * debye.LogGammaSlope(root, 4, 5.0, -0.04);
        CalciumPair = Ln10 * debye.LogGammaSlope(root, 1, 6.0, 0);
        MagnesiumPair = Ln10 * debye.LogGammaSlope(root, 1, 4.0, 0);
        Ammonium = Ln10 * debye.LogGammaSlope(root, 1, 2.5, 0);
        Single = Ln10 * debye.LogGammaDaviesSlope(root, 1);
        Neutral = Ln10 * 0.1;
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

    public double CalciumPair { get; }

    public double MagnesiumPair { get; }

    public double Ammonium { get; }

    public double Single { get; }

    public double Neutral { get; }
}
