namespace TankChem.Monitoring.Logbook;

/// <summary>What a logbook entry is about.</summary>
public enum LogKind
{
    /// <summary>Anything seen or done.</summary>
    Note = 1,

    /// <summary>Feed given.</summary>
    Feed = 2,

    /// <summary>Stock lost.</summary>
    Loss = 3,

    /// <summary>Water exchanged.</summary>
    WaterExchange = 4,

    /// <summary>A titration or test kit, typed by hand.</summary>
    Titration = 5,

    /// <summary>What went in (a dose record).</summary>
    Dose = 6,

    /// <summary>A probe or a tank cleaned.</summary>
    Cleaning = 7,

    /// <summary>A probe calibrated.</summary>
    Calibration = 8,

    /// <summary>A setting changed: unit confirmed, place set up.</summary>
    Setup = 9,
}
