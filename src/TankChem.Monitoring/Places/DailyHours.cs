namespace TankChem.Monitoring.Places;

/// <summary>Daily hours of CO2 injection or of light, in the site's local time.</summary>
/// <param name="Start">Begins at.</param>
/// <param name="End">Ends at; before <paramref name="Start"/> when it runs over midnight.</param>
public readonly record struct DailyHours(TimeOnly Start, TimeOnly End);
