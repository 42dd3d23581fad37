using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace TankChem.Storage.Model;

internal sealed class SeriesConfiguration : IEntityTypeConfiguration<SeriesRow>
{
    public void Configure(EntityTypeBuilder<SeriesRow> builder)
    {
        builder.ToTable("series").HasKey(r => r.Id);
        builder.HasIndex(r => new { r.Site, r.Place, r.Quantity, r.Probe }).IsUnique();
    }
}

internal sealed class ReadingConfiguration : IEntityTypeConfiguration<ReadingRow>
{
    public void Configure(EntityTypeBuilder<ReadingRow> builder) => builder.ToTable("reading").HasKey(r => new { r.SeriesId, r.TimeMs });
}

internal sealed class CorrectionConfiguration : IEntityTypeConfiguration<CorrectionRow>
{
    public void Configure(EntityTypeBuilder<CorrectionRow> builder)
    {
        builder.ToTable("correction").HasKey(r => r.Id);
        builder.HasIndex(r => new { r.SeriesId, r.TimeMs });
    }
}

internal sealed class StateSeriesConfiguration : IEntityTypeConfiguration<StateSeriesRow>
{
    public void Configure(EntityTypeBuilder<StateSeriesRow> builder)
    {
        builder.ToTable("state_series").HasKey(r => r.Id);
        builder.HasIndex(r => new { r.Site, r.Place, r.Quantity }).IsUnique();
    }
}

internal sealed class StateValueConfiguration : IEntityTypeConfiguration<StateValueRow>
{
    public void Configure(EntityTypeBuilder<StateValueRow> builder) => builder.ToTable("state_value").HasKey(r => new { r.StateSeriesId, r.TimeMs });
}

internal sealed class ReadingRollupConfiguration : IEntityTypeConfiguration<ReadingRollupRow>
{
    public void Configure(EntityTypeBuilder<ReadingRollupRow> builder) => builder.ToTable("reading_rollup").HasKey(r => new { r.SeriesId, r.StepH, r.StartH });
}

internal sealed class StateRollupConfiguration : IEntityTypeConfiguration<StateRollupRow>
{
    public void Configure(EntityTypeBuilder<StateRollupRow> builder) => builder.ToTable("state_rollup").HasKey(r => new { r.StateSeriesId, r.StepH, r.StartH });
}
