namespace TankChem.Chemistry.Fresh;

/// <summary>Activity coefficients in dilute water at one temperature. Good to I ≈ 0.5. Source: TJ74; A and B from the density (FM83) and dielectric constant (MM56) of water.</summary>
internal readonly struct DebyeHueckel
{
    public DebyeHueckel(double tC)
    {
        double tK = tC + 273.15;
        double rho = Density.KgPerL(tC, 0);
        double epsilon = 2727.586 + 0.6224107 * tK - 466.9151 * Math.Log(tK) - 52000.87 / tK;
        double et = epsilon * tK;
        A = 1.82483e6 * Math.Sqrt(rho) / (et * Math.Sqrt(et));
        B = 50.2916 * Math.Sqrt(rho) / Math.Sqrt(et);
    }

    /// <summary>Limiting-law slope, (kg/mol)^½.</summary>
    public double A { get; }

    /// <summary>Ion-size slope, (kg/mol)^½ per Å.</summary>
    public double B { get; }

    /// <summary>log γ = −A z² √I/(1 + B a √I) + b I.</summary>
    /// <param name="ionicStrength">I, mol/kg.</param>
    /// <param name="root">√I, which all species share.</param>
    /// <param name="chargeSquared">z².</param>
    /// <param name="a">Ion size, Å.</param>
    /// <param name="b">Linear term, kg/mol.</param>
    public double LogGamma(double ionicStrength, double root, double chargeSquared, double a, double b) =>
        -A * chargeSquared * root / (1 + B * a * root) + b * ionicStrength;

    /// <summary>Dav62: log γ = −A z² (√I/(1 + √I) − 0.3 I), for ions without parameters of their own.</summary>
    public double LogGammaDavies(double ionicStrength, double root, double chargeSquared) =>
        -A * chargeSquared * (root / (1 + root) - 0.3 * ionicStrength);

    /// <summary>d log γ/dI of <see cref="LogGamma"/>, kg/mol.</summary>
    public double LogGammaSlope(double root, double chargeSquared, double a, double b)
    {
        double d = 1 + B * a * root;
        return -A * chargeSquared / (2 * root * d * d) + b;
    }

    /// <summary>d log γ/dI of <see cref="LogGammaDavies"/>, kg/mol.</summary>
    public double LogGammaDaviesSlope(double root, double chargeSquared)
    {
        double d = 1 + root;
        return -A * chargeSquared * (1 / (2 * root * d * d) - 0.3);
    }
}
