namespace TankChem.Monitoring.Configuration;

/// <summary>What was found in a file.</summary>
internal sealed class ConfigurationNotes
{
    public List<ConfigurationNote> Faults { get; } = [];

    public List<ConfigurationNote> Warnings { get; } = [];

    public void Fault(string path, string text) => Faults.Add(new ConfigurationNote(path, text));

    public void Warning(string path, string text) => Warnings.Add(new ConfigurationNote(path, text));
}
