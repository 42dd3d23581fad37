namespace TankChem.Service.CommandLine;

/// <summary>Wrong use or wrong input: each line goes to stderr, and the exit status is 2.</summary>
internal sealed class UsageException(IReadOnlyList<string> lines) : Exception(string.Join(Environment.NewLine, lines))
{
    public UsageException(string line)
        : this([line])
    {
    }

    /// <summary>One line an error.</summary>
    public IReadOnlyList<string> Lines { get; } = lines;
}

/// <summary>A failure while running that is not a bug: its line goes to stderr, and the exit status is 1.</summary>
internal sealed class RunFailedException(string line, Exception? inner = null) : Exception(line, inner);
