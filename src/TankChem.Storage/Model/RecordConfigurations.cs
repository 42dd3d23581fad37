using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace TankChem.Storage.Model;

internal sealed class AlarmStateConfiguration : IEntityTypeConfiguration<AlarmStateRow>
{
    public void Configure(EntityTypeBuilder<AlarmStateRow> builder) => builder.ToTable("alarm_state").HasKey(r => new { r.Site, r.Place, r.Rule });
}

internal sealed class AlarmEntryConfiguration : IEntityTypeConfiguration<AlarmEntryRow>
{
    public void Configure(EntityTypeBuilder<AlarmEntryRow> builder)
    {
        builder.ToTable("alarm_journal").HasKey(r => r.Id);
        builder.HasIndex(r => new { r.Site, r.Place, r.AtMs });
        builder.HasIndex(r => r.AtMs);
    }
}

internal sealed class UnreadableConfiguration : IEntityTypeConfiguration<UnreadableRow>
{
    public void Configure(EntityTypeBuilder<UnreadableRow> builder) => builder.ToTable("unreadable").HasKey(r => r.Id);
}

internal sealed class LogConfiguration : IEntityTypeConfiguration<LogRow>
{
    public void Configure(EntityTypeBuilder<LogRow> builder)
    {
        builder.ToTable("logbook").HasKey(r => r.Id);
        builder.HasIndex(r => new { r.Site, r.Place, r.AtMs });
        builder.HasIndex(r => r.AtMs);
    }
}

internal sealed class LossConfiguration : IEntityTypeConfiguration<LossRow>
{
    public void Configure(EntityTypeBuilder<LossRow> builder) => builder.ToTable("loss").HasKey(r => r.Id);
}

internal sealed class PlaceConfiguration : IEntityTypeConfiguration<PlaceRow>
{
    public void Configure(EntityTypeBuilder<PlaceRow> builder) => builder.ToTable("place").HasKey(r => new { r.Site, r.Place });
}
