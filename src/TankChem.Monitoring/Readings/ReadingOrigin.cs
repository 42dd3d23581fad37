namespace TankChem.Monitoring.Readings;

/// <summary>How a reading came in.</summary>
public enum ReadingOrigin
{
    /// <summary>Published just now.</summary>
    Live = 1,

    /// <summary>A retained message of an outside broker: of unknown age unless it bears its own time.</summary>
    Retained = 2,

    /// <summary>Out of a resumed session's backlog: of unknown age unless it bears its own time.</summary>
    Backlog = 3,

    /// <summary>Typed by a person.</summary>
    Manual = 4,

    /// <summary>Imported, or made for a demo's history.</summary>
    Imported = 5,
}
