using System.Globalization;
using Microsoft.AspNetCore.Components;
using TankChem.Dashboard.Text;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;

namespace TankChem.Dashboard.Components.Parts;

/// <summary>The window of a loss review as stacked tracks that share one time axis.</summary>
public sealed partial class ReviewPicture
{
    private const double Width = 960;
    private const double Left = 170;
    private const double Right = 950;
    private const double First = 26;
    private const double TrackHeight = 56;
    private const double TrackStep = 68;
    private const double BandStep = 34;
    private const int PointsMax = 500;
    private static readonly string[] Order = ["co2", "ph", "nh3-n", "oxygen-saturation", "oxygen", "temperature", "alkalinity", "tan", "injection-on", "light"];

    /// <summary>What happened.</summary>
    [Parameter, EditorRequired]
    public required LossReview Review { get; set; }

    /// <summary>The place's site; null when it is no longer set up.</summary>
    [Parameter]
    public SiteDefinition? Site { get; set; }

    /// <summary>Limits of the place.</summary>
    [Parameter]
    public IReadOnlyList<PlaceLimit> Limits { get; set; } = [];

    private IReadOnlyList<ReviewTrack> Shown => [.. Review.Tracks.Where(t => t.Points.Count > 1 && Array.IndexOf(Order, t.Quantity) >= 0).OrderBy(t => Array.IndexOf(Order, t.Quantity))];

    private double Height => First + Shown.Count * TrackStep + Review.Devices.Count * BandStep + 16;

    private IEnumerable<DateTimeOffset> Ticks
    {
        get
        {
            TimeZoneInfo zone = TimeText.Zone(Site);
            DateTimeOffset local = TimeZoneInfo.ConvertTime(Review.From, zone);
            DateTimeOffset tick = new DateTimeOffset(local.Date, local.Offset).AddHours((local.Hour / 6 + 1) * 6);
            for (; tick < Review.To; tick = tick.AddHours(6))
                yield return tick;
        }
    }

    private static double TrackTop(int at) => First + at * TrackStep;

    private double BandTop(int at) => First + Shown.Count * TrackStep + at * BandStep;

    private string TickText(DateTimeOffset tick)
    {
        DateTimeOffset local = TimeZoneInfo.ConvertTime(tick, TimeText.Zone(Site));
        return local.ToString(local.Hour == 0 ? "d MMM" : "HH:mm", CultureInfo.InvariantCulture);
    }

    private double X(DateTimeOffset time) => Left + (Right - Left) * Math.Clamp((time - Review.From) / (Review.To - Review.From), 0, 1);

    private static double Y(double value, double top, double low, double high) => top + TrackHeight * (1 - (value - low) / (high - low));

    /// <summary>The data's span, with a limit nearby inside it.</summary>
    private (double Low, double High) Span(ReviewTrack track)
    {
        double low = track.Points.Min(p => p.Value), high = track.Points.Max(p => p.Value);
        double span = Math.Max(high - low, Math.Max(Math.Abs(high) * 0.02, 1e-6));
        foreach (PlaceLimit limit in Limits.Where(l => l.Quantity == track.Quantity && l.Value > low - span && l.Value < high + span))
        {
            low = Math.Min(low, limit.Value);
            high = Math.Max(high, limit.Value);
        }

        return high - low < 1e-9 ? (low - span / 2, high + span / 2) : (low, high);
    }

    /// <summary>One line between two gaps; long ones are thinned, which a picture of this width cannot show.</summary>
    private IEnumerable<string> Lines(ReviewTrack track, double top, double low, double high)
    {
        int every = Math.Max(1, track.Points.Count / PointsMax);
        var line = new List<string>();
        int gap = 0;
        for (int i = 0; i < track.Points.Count; i++)
        {
            (DateTimeOffset time, double value) = track.Points[i];
            if (gap < track.Gaps.Count && time >= track.Gaps[gap].To)
            {
                yield return string.Join(' ', line);
                line.Clear();
                gap++;
            }

            if (i % every == 0)
                line.Add($"{F(X(time))},{F(Y(value, top, low, high))}");
        }

        yield return string.Join(' ', line);
    }

    private static string F(double value) => value.ToString("0.#", CultureInfo.InvariantCulture);
}
