using Microsoft.AspNetCore.Components;
using TankChem.Dashboard.Text;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Dashboard.Components.Parts;

/// <summary>What the water is: each value with its uncertainty, its age and what it came from.</summary>
public sealed partial class NowView
{
    private static readonly string[] Carbon = ["ph", "co2", "alkalinity", "pco2", "pco2-measured", "dic", "hco3", "co3"];
    private static readonly string[] Life = ["temperature", "oxygen", "oxygen-saturation", "gas-pressure", "tan", "nh3-n", "nitrite"];
    private static readonly string[] Salt = ["salinity", "conductivity", "calcium", "omega-calcite", "omega-aragonite", "buffer-closed", "buffer-open"];
    private static readonly string[] Around = ["air-co2", "air-pressure", "injection", "injection-on", "light", "flow", "level", "feed"];
    private static readonly string[] Besides = ["ph-air", "ph-injected", "co2-air", SeriesKey.DeviceState];

    /// <summary>The place.</summary>
    [Parameter, EditorRequired]
    public required PlaceSnapshot Place { get; set; }

    /// <summary>Now.</summary>
    [Parameter, EditorRequired]
    public DateTimeOffset Now { get; set; }

    private IEnumerable<(string Heading, string[] Names)> Groups =>
    [
        ("CO2, pH and alkalinity", Carbon),
        ("What the animals breathe and bear", Life),
        ("Salts and buffer", Salt),
        ("Around the water", Around),
        ("Other readings", [.. Place.Water.Values.Keys.Where(k => !Carbon.Contains(k) && !Life.Contains(k) && !Salt.Contains(k) && !Around.Contains(k) && !Besides.Contains(k)).Order(StringComparer.Ordinal)]),
    ];

    private IEnumerable<Reading> Unconfirmed => Place.Latest.Where(r => r.Reason == ReadingResolver.UnitNotConfirmed);

    private IReadOnlyList<Reading> Devices => [.. Place.Latest.Where(r => r.Series.Quantity == SeriesKey.DeviceState).OrderBy(r => r.Series.Probe, StringComparer.Ordinal)];

    /// <summary>pH and CO2 stand beside what they would be with this place's air.</summary>
    private string? Beside(string name) => name switch
    {
        "ph" => Join(With("ph-air", "with this air"), With("ph-injected", "with pure CO2")),
        "co2" => With("co2-air", "with this air"),
        _ => null,
    };

    private string? With(string name, string words) => Place.Water.Values.TryGetValue(name, out WaterValue? value) ? $"{words} {NumberText.Full(name, value)}" : null;

    private static string? Join(string? a, string? b) => a is null ? b : b is null ? a : $"{a}; {b}";
}
