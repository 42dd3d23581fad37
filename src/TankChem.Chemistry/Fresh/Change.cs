namespace TankChem.Chemistry.Fresh;

/// <summary>A small change as a linear form of four others: ln a(H), ln fugacity of CO2, ln of free sulfate, and ionic strength.</summary>
internal readonly record struct Change(double LnHydrogen, double LnFugacity, double LnSulfate, double IonicStrength)
{
    public static Change operator +(in Change a, in Change b) =>
        new(a.LnHydrogen + b.LnHydrogen, a.LnFugacity + b.LnFugacity, a.LnSulfate + b.LnSulfate, a.IonicStrength + b.IonicStrength);

    public static Change operator *(double factor, in Change a) =>
        new(factor * a.LnHydrogen, factor * a.LnFugacity, factor * a.LnSulfate, factor * a.IonicStrength);
}
