using TankChem.Dosing;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;

namespace TankChem.Service.Pipeline;

/// <summary>What went into each water lately, so that "dosed today" belongs to the water and not to the tank.</summary>
internal sealed class DoseLedger
{
    private static readonly TimeSpan Kept = TimeSpan.FromDays(2);
    private readonly Lock gate = new();
    private readonly List<LogEntry> doses = [];

    /// <summary>A ledger of what the logbook says.</summary>
    public static DoseLedger Load(IHistory history, DateTimeOffset now)
    {
        var ledger = new DoseLedger();
        foreach (LogEntry entry in history.LogAsync(null, now - Kept, now + Kept, int.MaxValue, CancellationToken.None).GetAwaiter().GetResult())
            ledger.Take(entry);
        return ledger;
    }

    /// <summary>Takes a logbook entry; other kinds than doses are ignored.</summary>
    public void Take(LogEntry entry)
    {
        if (entry.Kind != LogKind.Dose)
            return;
        lock (gate)
        {
            doses.RemoveAll(d => entry.RecordedAt - d.At > Kept);
            doses.Add(entry);
        }
    }

    /// <summary>Alkalinity added since midnight, site's time, mmol/L of the water's volume.</summary>
    /// <param name="site">The site, for its time zone.</param>
    /// <param name="sharedBy">The loop and its tanks, or the tank alone.</param>
    /// <param name="volumeM3">The water's volume; without one nothing can be said and 0 is returned (the plan is refused for the volume anyway).</param>
    /// <param name="now">Now.</param>
    public double DosedTodayMmolL(SiteDefinition site, IReadOnlyCollection<PlaceKey> sharedBy, double? volumeM3, DateTimeOffset now)
    {
        if (volumeM3 is not > 0)
            return 0;
        DateTimeOffset midnight = SiteClock.StartOfDay(site, now);
        double mmol = 0;
        lock (gate)
        {
            foreach (LogEntry dose in doses)
            {
                if (dose.At < midnight || dose.At > now || dose.Amount is not { } grams || !sharedBy.Contains(dose.Place))
                    continue;
                // An acid given the same day does not make room for more base.
                if (dose.Subject is { } id && ReagentCatalog.Find(id) is { EquivalentsPerMole: > 0 } reagent)
                    mmol += grams * reagent.EquivalentsPerMole / reagent.MolarMassGMol * 1000;
            }
        }

        return mmol / (volumeM3.Value * 1000);
    }
}
