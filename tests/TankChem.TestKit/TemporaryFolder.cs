namespace TankChem.TestKit;

/// <summary>An empty folder that goes away with the test.</summary>
public sealed class TemporaryFolder : IDisposable
{
    /// <summary>Makes it.</summary>
    public TemporaryFolder() => FullName = Directory.CreateTempSubdirectory("tankchem-test-").FullName;

    /// <summary>Its path.</summary>
    public string FullName { get; }

    /// <summary>A file in it.</summary>
    public string File(string name) => Path.Combine(FullName, name);

    /// <inheritdoc/>
    public void Dispose() => Directory.Delete(FullName, true);
}
