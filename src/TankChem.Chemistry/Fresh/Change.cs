namespace TankChem.Chemistry.Fresh;

/// <summary>A small change as a linear form of five others: ln a(H), ln fugacity of CO2, ln of free sulfate, ionic strength, and alkalinity.</summary>
internal readonly record struct Change(double LnHydrogen, double LnFugacity, double LnSulfate, double IonicStrength, double Alkalinity = 0)
{
    public static Change operator +(in Change a, in Change b) => new(
        a.LnHydrogen + b.LnHydrogen, a.LnFugacity + b.LnFugacity, a.LnSulfate + b.LnSulfate, a.IonicStrength + b.IonicStrength, a.Alkalinity + b.Alkalinity);

    public static Change operator *(double factor, in Change a) =>
        new(factor * a.LnHydrogen, factor * a.LnFugacity, factor * a.LnSulfate, factor * a.IonicStrength, factor * a.Alkalinity);
}
