namespace TankChem.Service.Http;

/// <summary>Shapes of the bodies, for the machine-readable description only: the bodies themselves are written by hand, byte for byte as over MQTT.</summary>
internal sealed record HealthSchema(string Status, IReadOnlyList<string> Troubles);

internal sealed record PlaceSchema(string Site, string Id, string Kind, string Name, bool Assigned, string Sentence, AlarmSchema? WorstAlarm, WaterSchema Water);

internal sealed record WaterSchema(string Site, string Place, string Kind, bool Assigned, DateTimeOffset? Time, string Status, string? Reason, IReadOnlyDictionary<string, WaterValueSchema> Values);

internal sealed record WaterValueSchema(double Value, string Unit, double? U, DateTimeOffset Time, IReadOnlyList<WaterInputSchema> Inputs, IReadOnlyList<string> Caveats);

internal sealed record WaterInputSchema(string Quantity, string Probe, DateTimeOffset Time, double AgeS);

internal sealed record TrendSchema(string Quantity, string Unit, IReadOnlyList<TrendBucketSchema> Buckets);

internal sealed record TrendBucketSchema(DateTimeOffset From, DateTimeOffset To, double Min, double Mean, double Max, long Count);

internal sealed record ReadingsSchema(IReadOnlyList<ReadingSchema> Readings, string? Next);

internal sealed record ReadingSchema(string Quantity, string Probe, DateTimeOffset Time, double Value, string? Unit, string Flag, string? Reason);

internal sealed record AlarmCommandSchema(string Action, string Who, string? Reason, DateTimeOffset? Until);

internal sealed record AlarmSchema(string Site, string Place, string Rule, string Title, string Quantity, string Priority, string State, bool Active, double? Value, string? Unit, double? SetPoint, string Sentence, string FirstAction, string Consequence, bool DangerToPeople, DateTimeOffset? RaisedAt, DateTimeOffset? ChangedAt, DateTimeOffset? ShelvedUntil);

internal sealed record DosePlanRequestSchema(DoseTargetSchema Target, IReadOnlyList<string>? Reagents);

internal sealed record DoseTargetSchema(string Quantity, double Value, string Unit);

internal sealed record DosePlanSchema(bool Allowed, IReadOnlyList<DoseGroundSchema> Grounds, IReadOnlyList<DoseStepSchema> Steps, IReadOnlyList<string> Reasons, IReadOnlyList<string> Cautions, string? Nearest);

internal sealed record DoseGroundSchema(string Kind, string Quantity, string Text, double? Probability);

internal sealed record DoseStepSchema(double AfterS, string Reagent, AmountSchema Amount, IReadOnlyDictionary<string, WaterValueSchema> Closed, IReadOnlyDictionary<string, WaterValueSchema> Settled, IReadOnlyDictionary<string, WaterValueSchema> Air);

internal sealed record AmountSchema(double Value, string Unit);
