namespace TankChem.Service.CommandLine;

/// <summary>Exit status of the program.</summary>
internal static class ExitCode
{
    /// <summary>Done.</summary>
    public const int Done = 0;

    /// <summary>A failure while running.</summary>
    public const int Failed = 1;

    /// <summary>Wrong use or wrong input.</summary>
    public const int WrongUse = 2;
}
