using Microsoft.EntityFrameworkCore;

namespace TankChem.Storage.Model;

/// <summary>The store's model. Times are UTC milliseconds since 1970, amounts in the quantity's canonical unit.</summary>
public sealed class StoreContext(DbContextOptions<StoreContext> options) : DbContext(options)
{
    internal DbSet<AlarmStateRow> AlarmStates => Set<AlarmStateRow>();

    internal DbSet<AlarmEntryRow> AlarmEntries => Set<AlarmEntryRow>();

    internal DbSet<UnreadableRow> Unreadable => Set<UnreadableRow>();

    internal DbSet<LogRow> Log => Set<LogRow>();

    internal DbSet<LossRow> Losses => Set<LossRow>();

    internal DbSet<PlaceRow> Places => Set<PlaceRow>();

    /// <inheritdoc/>
    protected override void OnModelCreating(ModelBuilder modelBuilder)
    {
        ArgumentNullException.ThrowIfNull(modelBuilder);
        modelBuilder.ApplyConfigurationsFromAssembly(typeof(StoreContext).Assembly, t => t.Namespace == typeof(StoreContext).Namespace);
        foreach (var entity in modelBuilder.Model.GetEntityTypes())
        {
            foreach (var property in entity.GetProperties())
                property.SetColumnName(SnakeCase.Of(property.Name));
        }
    }
}
