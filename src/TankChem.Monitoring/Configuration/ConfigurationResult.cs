namespace TankChem.Monitoring.Configuration;

/// <summary>A read configuration.</summary>
/// <param name="Configuration">The configuration; null when there are faults.</param>
/// <param name="Faults">What makes it unusable.</param>
/// <param name="Warnings">What is doubtful.</param>
public sealed record ConfigurationResult(ServiceConfiguration? Configuration, IReadOnlyList<ConfigurationNote> Faults, IReadOnlyList<ConfigurationNote> Warnings);

/// <summary>A remark on a configuration.</summary>
/// <param name="Path">JSON path: <c>$.sites[0].tanks[1].volume</c>.</param>
/// <param name="Text">What is wrong and what would be right.</param>
public sealed record ConfigurationNote(string Path, string Text);
