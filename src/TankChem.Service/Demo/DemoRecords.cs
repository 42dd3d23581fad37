using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;
using TankChem.Simulation.Demo;

namespace TankChem.Service.Demo;

/// <summary>What people of the demo do, as the service records it.</summary>
internal static class DemoRecords
{
    public static LogEntry Log(SimulatedLogEntry entry) => new()
    {
        Place = Key(entry.Place),
        At = entry.HappenedAt,
        RecordedAt = entry.At,
        Kind = entry.Kind switch
        {
            SimulatedLogKind.Note => LogKind.Note,
            SimulatedLogKind.Feed => LogKind.Feed,
            SimulatedLogKind.WaterExchange => LogKind.WaterExchange,
            SimulatedLogKind.Titration => LogKind.Titration,
            SimulatedLogKind.Dose => LogKind.Dose,
            SimulatedLogKind.Cleaning => LogKind.Cleaning,
            SimulatedLogKind.Calibration => LogKind.Calibration,
        },
        Who = entry.Who,
        Text = entry.Text,
        Amount = entry.Amount,
        Unit = entry.Unit,
        Subject = entry.Subject,
    };

    public static LossRecord Loss(SimulatedLoss loss) => new()
    {
        Place = Key(loss.Place),
        FoundAt = loss.FoundAt,
        RecordedAt = loss.At,
        Count = loss.Count,
        Stock = loss.Stock,
        Who = loss.Who,
        Notes = loss.Notes,
    };

    /// <summary>A titration in the logbook is a reading as well; other entries are none.</summary>
    public static ParsedReading? Titration(SimulatedLogEntry entry) =>
        entry is { Kind: SimulatedLogKind.Titration, Amount: { } amount, Unit: { } unit, Subject: { } quantity }
            ? new ParsedReading(new SeriesKey(Key(entry.Place), quantity, SeriesKey.MainProbe), amount, unit, entry.HappenedAt)
            : null;

    public static PlaceKey Key(string place) => new(DemoSite.Id, place);
}
