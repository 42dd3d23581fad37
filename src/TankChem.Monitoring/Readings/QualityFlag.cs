namespace TankChem.Monitoring.Readings;

/// <summary>Quality of a reading, with the flag numbers of QARTOD (US IOOS, Manual for Real-Time Quality Control).</summary>
public enum QualityFlag
{
    /// <summary>All tests that ran passed.</summary>
    Pass = 1,

    /// <summary>Kept, but not judged; drives nothing.</summary>
    NotEvaluated = 2,

    /// <summary>Of doubtful quality; drives no state and no permit.</summary>
    Suspect = 3,

    /// <summary>Known to be wrong; drives nothing.</summary>
    Fail = 4,

    /// <summary>No value.</summary>
    Missing = 9,
}
