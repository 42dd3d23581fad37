using TankChem.Monitoring.Logbook;

namespace TankChem.Dashboard.Text;

/// <summary>Kinds of logbook entries in words.</summary>
internal static class LogText
{
    public static string Kind(LogKind kind) => kind switch
    {
        LogKind.Note => "Note",
        LogKind.Feed => "Feed",
        LogKind.Loss => "Loss",
        LogKind.WaterExchange => "Water exchange",
        LogKind.Titration => "Measured by hand",
        LogKind.Dose => "Dose",
        LogKind.Cleaning => "Cleaning",
        LogKind.Calibration => "Calibration",
        LogKind.Setup => "Set-up",
    };
}
