using System.Globalization;
using Microsoft.AspNetCore.Components;
using TankChem.Dashboard.Text;
using TankChem.Dosing;
using TankChem.Monitoring.Advising;

namespace TankChem.Dashboard.Components.Parts;

/// <summary>The corner chart as SVG: the model has the values, here they become places on paper.</summary>
public sealed partial class CornerPicture
{
    private const double Width = 640;
    private const double Height = 420;
    private const double Left = 70;
    private const double Right = 620;
    private const double Top = 16;
    private const double Bottom = 360;

    /// <summary>The picture's values.</summary>
    [Parameter, EditorRequired]
    public required CornerChart Chart { get; set; }

    /// <summary>The place's name.</summary>
    [Parameter, EditorRequired]
    public required string PlaceName { get; set; }

    private string InWords
    {
        get
        {
            CornerPoint now = Chart.Now!;
            string co2 = Chart.Co2Edges.Count == 0 ? "" : $", next limit {NumberText.Plain("co2", Next(Chart.Co2Edges.Select(e => e.Value), now.Co2MgL))}";
            string ammonia = Chart.AmmoniaEdges.Count == 0 ? "" : $", next limit {NumberText.Plain("nh3-n", Next(Chart.AmmoniaEdges.Select(e => e.Value), now.Nh3NMgL))}";
            return $"{PlaceName}: CO2 {NumberText.WithUnit("co2", now.Co2MgL)}{co2}; un-ionised ammonia {NumberText.WithUnit("nh3-n", now.Nh3NMgL)}{ammonia}.";
        }
    }

    private string Trail => string.Join(' ', Chart.Trail.Select(p => $"{F(X(p.Co2MgL))},{F(Y(p.Nh3NMgL))}"));

    /// <summary>CO2 × NH3 is nearly constant at fixed alkalinity and TAN: the line through now, cut by the paper's edges.</summary>
    private (double X1, double Y1, double X2, double Y2) Slope
    {
        get
        {
            CornerPoint now = Chart.Now!;
            double product = now.Co2MgL * now.Nh3NMgL;
            double from = Math.Max(Chart.Co2Range.Low, product / Chart.AmmoniaRange.High), to = Math.Min(Chart.Co2Range.High, product / Chart.AmmoniaRange.Low);
            return (X(from), Y(product / from), X(to), Y(product / to));
        }
    }

    private double X(double co2) => Left + (Right - Left) * Share(co2, Chart.Co2Range);

    private double Y(double ammonia) => Bottom - (Bottom - Top) * Share(ammonia, Chart.AmmoniaRange);

    private static double Share(double value, (double Low, double High) range) =>
        Math.Clamp(Math.Log(Math.Max(value, 1e-12) / range.Low) / Math.Log(range.High / range.Low), 0, 1);

    private static double Next(IEnumerable<double> limits, double value)
    {
        double[] sorted = [.. limits.Order()];
        int above = Array.FindIndex(sorted, l => l > value);
        return above < 0 ? sorted[^1] : sorted[above];
    }

    private static IEnumerable<double> Ticks((double Low, double High) range)
    {
        for (double decade = Math.Pow(10, Math.Floor(Math.Log10(range.Low))); decade <= range.High; decade *= 10)
        {
            foreach (double factor in new[] { 1.0, 2, 5 })
            {
                if (decade * factor >= range.Low && decade * factor <= range.High)
                    yield return decade * factor;
            }
        }
    }

    private string Line(Remedy remedy) => string.Join(' ', remedy.Path.Where(p => p.Nh3NMgL is not null).Select(p => $"{F(X(p.Co2MgL.Value))},{F(Y(p.Nh3NMgL!.Value.Value))}"));

    /// <summary>As wide as it is uncertain, at its widest, but never so wide that it hides the limits.</summary>
    private double WidthOf(Remedy remedy) => Math.Clamp(remedy.Path.Max(p => X(p.Co2MgL.Value + p.Co2MgL.StandardUncertainty) - X(Math.Max(p.Co2MgL.Value - p.Co2MgL.StandardUncertainty, Chart.Co2Range.Low))), 4, 60);

    private static int Percent(RoomStrip strip) => (int)Math.Round(100 * Math.Clamp(1 - strip.Room / Math.Max(Math.Abs(strip.Limit.Value), 1e-9), 0, 1));

    private static string Amount(RoomStrip strip) => NumberText.WithUnit(strip.Limit.Quantity, Math.Abs(strip.Room));

    private static string F(double value) => value.ToString("0.#", CultureInfo.InvariantCulture);

    private static string N(double value) => value.ToString("0.####", CultureInfo.InvariantCulture);
}
