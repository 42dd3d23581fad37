using TankChem.Alarms;
using TankChem.Monitoring.Ports;

namespace TankChem.Dashboard.Text;

/// <summary>Each urgency has a word and a shape beside its colour.</summary>
internal static class UrgencyText
{
    public static string Word(PlaceUrgency urgency) => urgency switch
    {
        PlaceUrgency.Calm => "Calm",
        PlaceUrgency.Unknown => "Not known",
        PlaceUrgency.Doubt => "In doubt",
        PlaceUrgency.Warning => "Warning",
        PlaceUrgency.Urgent => "Urgent",
        PlaceUrgency.Critical => "Danger",
    };

    public static string Class(PlaceUrgency urgency) => urgency switch
    {
        PlaceUrgency.Calm => "calm",
        PlaceUrgency.Unknown => "unknown",
        PlaceUrgency.Doubt => "doubt",
        PlaceUrgency.Warning => "warning",
        PlaceUrgency.Urgent => "urgent",
        PlaceUrgency.Critical => "danger",
    };

    public static PlaceUrgency Of(AlarmPriority priority, bool aboutKnowledge) => priority switch
    {
        AlarmPriority.Critical => PlaceUrgency.Critical,
        AlarmPriority.High => PlaceUrgency.Urgent,
        AlarmPriority.Medium or AlarmPriority.Low => aboutKnowledge ? PlaceUrgency.Doubt : PlaceUrgency.Warning,
    };

    /// <summary>Points of the shape in a 24 × 24 box: a bar, a ring of dots, a diamond, a triangle, a square, an octagon.</summary>
    public static string Shape(PlaceUrgency urgency) => urgency switch
    {
        PlaceUrgency.Calm => "M5 11h14v2H5z",
        PlaceUrgency.Unknown => "M5 10h4v4H5zM10 10h4v4h-4zM15 10h4v4h-4z",
        PlaceUrgency.Doubt => "M12 3l9 9-9 9-9-9zM12 7.2L7.2 12l4.8 4.8 4.8-4.8z",
        PlaceUrgency.Warning => "M12 3l10 18H2z",
        PlaceUrgency.Urgent => "M4 4h16v16H4z",
        PlaceUrgency.Critical => "M8 2h8l6 6v8l-6 6H8l-6-6V8z",
    };
}
