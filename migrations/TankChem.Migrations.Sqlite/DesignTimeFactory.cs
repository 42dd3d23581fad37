using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Design;
using TankChem.Storage.Model;

namespace TankChem.Migrations.Sqlite;

/// <summary>Gives the design-time tools a context; its file is never opened.</summary>
public sealed class DesignTimeFactory : IDesignTimeDbContextFactory<StoreContext>
{
    /// <inheritdoc/>
    public StoreContext CreateDbContext(string[] args) => new(
        new DbContextOptionsBuilder<StoreContext>().UseSqlite("Data Source=design-time.db", o => o.MigrationsAssembly(typeof(DesignTimeFactory).Assembly.GetName().Name)).Options);
}
