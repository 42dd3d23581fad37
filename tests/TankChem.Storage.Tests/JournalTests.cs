using Microsoft.Data.Sqlite;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Logbook;
using TankChem.Monitoring.Losses;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using static TankChem.Storage.Tests.StoreFixture;

namespace TankChem.Storage.Tests;

public sealed class JournalTests : IDisposable
{
    private static readonly AlarmJournalEntry Raised = new()
    {
        Key = new AlarmKey(Tank, "co2-high"),
        At = Noon,
        Change = AlarmChange.Raised,
        Priority = AlarmPriority.High,
        Title = "CO2 high",
        Sentence = "CO2 is high: 24 mg/L",
        Value = 24,
        SetPoint = 15,
    };

    private readonly StoreFixture fixture = new();

    private SqliteStore Store => fixture.Store;

    public void Dispose() => fixture.Dispose();

    [Fact]
    public async Task Commit_SameReadingTwice_IsStoredOnce()
    {
        Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon, 7.2), Reading(Noon, 7.2)] });
        Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon, 7.2)] });

        Assert.Single(await AllAsync());
        Assert.Equal(0, Count("correction"));
    }

    [Fact]
    public async Task Commit_OtherValueForTheSameIdentity_CountsAndKeepsTheOldOne()
    {
        Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon, 7.2)] });

        Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon, 7.4)] });

        Assert.Equal(7.4, Assert.Single(await AllAsync()).Value);
        Assert.Equal(1, Count("correction"));
    }

    [Fact]
    public async Task Commit_RowThatCannotBeStored_StoresNothingOfTheBatchAndTakesTheNext()
    {
        Reading bad = Reading(Noon.AddSeconds(1), 7) with { Series = new SeriesKey(Tank, null!, "main") };

        Assert.Throws<JournalRowException>(() => Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon, 7.2), bad] }));

        Assert.Empty(await AllAsync());
        Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon, 7.2)] });
        Assert.Single(await AllAsync());
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public async Task Commit_NotAFiniteNumber_IsARowException(double number)
    {
        Assert.Throws<JournalRowException>(() => Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon, number)] }));
        Assert.Throws<JournalRowException>(() => Store.Journal.Commit(new JournalBatch { States = [State(Noon, number)] }));

        Assert.Empty(await AllAsync());
        Assert.Empty(await Store.History.StateValuesAsync(Tank, Noon, Noon.AddHours(1), CancellationToken.None));
    }

    [Fact]
    public async Task Commit_AlarmWhoseValueIsNoNumber_KeepsTheLineWithoutTheNumber()
    {
        Store.Journal.Commit(new JournalBatch { AlarmEntries = [Raised with { Value = double.NaN }] });

        Assert.Equal(Raised with { Value = null }, Assert.Single(await Store.History.AlarmJournalAsync(null, Noon, Noon.AddHours(1), CancellationToken.None)));
    }

    [Fact]
    public async Task Commit_LastRecordOfABatchCannotBeStored_StoresNothingOfIt()
    {
        LogEntry bad = new() { Place = Tank, At = Noon, RecordedAt = Noon, Kind = LogKind.Note, Who = null!, Text = "without a name" };

        Assert.Throws<JournalRowException>(() => Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon, 7.2)], States = [State(Noon, 12)], AlarmEntries = [Raised], Log = [bad] }));

        Assert.Empty(await AllAsync());
        Assert.Empty(await Store.History.AlarmJournalAsync(null, Noon, Noon.AddHours(1), CancellationToken.None));
        Assert.Equal((0, 0, 0), (Count("state_value"), Count("reading_rollup"), Count("state_rollup")));
    }

    [Fact]
    public async Task Commit_StoreFull_TakesNothingAndGoesOnWhenThereIsRoom()
    {
        using SqliteStore small = SqliteStore.Open(fixture.Path + "-small");
        var batch = new JournalBatch { Readings = [.. Enumerable.Range(0, 20_000).Select(i => Reading(Noon.AddSeconds(i), 7 + i * 1e-6))] };
        small.Journal.Commit(new JournalBatch { Readings = [Reading(Noon.AddDays(-1), 7)] });
        LimitPages(small, 60);

        JournalUnavailableException full = Assert.Throws<JournalUnavailableException>(() => small.Journal.Commit(batch));

        Assert.Contains("full", full.Message, StringComparison.Ordinal);
        Assert.Single(await small.History.ReadingsAsync(Tank, "ph", Noon.AddDays(-2), Noon.AddDays(2), null, 10, CancellationToken.None));
        small.Journal.Commit(batch);
        Assert.Equal(10, (await small.History.ReadingsAsync(Tank, "ph", Noon, Noon.AddDays(2), null, 10, CancellationToken.None)).Count);
    }

    [Fact]
    public async Task Commit_Rederived_ChangesValueAndFlagAndNothingElse()
    {
        Reading kept = Reading(Noon, 5, "alkalinity", flag: QualityFlag.NotEvaluated);
        Store.Journal.Commit(new JournalBatch { Readings = [kept] });
        Assert.Equal(kept, Assert.Single(Store.Recovery.LoadUnconfirmed(kept.Series, DateTimeOffset.UnixEpoch, 10)));

        Store.Journal.Commit(new JournalBatch { Rederived = [kept with { Value = 1.78, Flag = QualityFlag.Pass, Reason = null, RawValue = 99 }] });

        Reading now = Assert.Single(await Store.History.ReadingsAsync(Tank, "alkalinity", Noon, Noon.AddHours(1), null, 10, CancellationToken.None));
        Assert.Equal((5.0, 1.78, QualityFlag.Pass), (now.RawValue, now.Value, now.Flag));
    }

    [Fact]
    public void Reopen_AlarmStatesAndPlaces_AreThere()
    {
        var key = new AlarmKey(Tank, "co2-high");
        var state = new AlarmState { Phase = AlarmPhase.Acknowledged, RaisedAt = Noon, AcknowledgedAt = Noon.AddMinutes(1), AcknowledgedBy = "Ada", AcknowledgedReason = "seen" };
        var place = new PlaceDefinition
        {
            Key = Tank,
            Kind = PlaceKind.Tank,
            Name = "Grow-out 1",
            VolumeM3 = 9,
            Stock = ["salmonid"],
            GasHours = new DailyHours(new TimeOnly(9, 0), new TimeOnly(17, 0)),
            Probes = [new ProbeDefinition { Quantity = "alkalinity", Unit = "dKH", OldestUsed = TimeSpan.FromDays(3), CalibratedAt = Noon }],
        };

        Store.Journal.Commit(new JournalBatch { AlarmStates = [new(key, state)], Places = [place] });
        Store.Journal.Commit(new JournalBatch { AlarmStates = [new(new AlarmKey(Tank, "ph-low"), AlarmState.Normal)] });
        fixture.Reopen();

        Assert.Equal([new(key, state)], Store.Recovery.LoadAlarmStates());
        Assert.Equivalent(place, Assert.Single(Store.Recovery.LoadPlaces()));
    }

    [Fact]
    public void LoadLatestReadings_NewestOfEachSeriesAndNewestUsable()
    {
        Reading usable = Reading(Noon, 7.2), suspect = Reading(Noon.AddMinutes(1), 9, flag: QualityFlag.Suspect), other = Reading(Noon, 15, "temperature");
        Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon.AddHours(-1), 7), usable, suspect, other] });

        Assert.Equal([usable, suspect, other], Store.Recovery.LoadLatestReadings().OrderBy(r => r.Series.Quantity, StringComparer.Ordinal).ThenBy(r => r.Time));
    }

    [Fact]
    public async Task Records_RoundTrip()
    {
        var log = new LogEntry { Place = Tank, At = Noon, RecordedAt = Noon.AddMinutes(5), Kind = LogKind.Feed, Who = "Ada", Text = "fed", Amount = 2.5, Unit = "kg" };
        var loss = new LossRecord { Place = Tank, FoundAt = Noon, Count = 12, Stock = "salmonid", Who = "Ada", Notes = "gills pale", RecordedAt = Noon.AddMinutes(9) };
        var unreadable = new UnreadablePayload("tankchem/in/x", Noon, 3, "abc"u8.ToArray(), "not a number", "probe-1");

        Store.Journal.Commit(new JournalBatch { AlarmEntries = [Raised], Log = [log], Losses = [loss], Unreadable = [unreadable] });

        Assert.Equal(Raised, Assert.Single(await Store.History.AlarmJournalAsync(Tank, Noon, Noon.AddHours(1), CancellationToken.None)));
        Assert.Equal(log, Assert.Single(await Store.History.LogAsync(null, Noon, Noon.AddHours(1), 5, CancellationToken.None)) with { Id = 0 });
        LossRecord back = Assert.Single(await Store.History.LossesAsync(CancellationToken.None));
        Assert.Equal(loss, back with { Id = 0 });
        Assert.Equal(back, await Store.History.LossAsync(back.Id, CancellationToken.None));
        Assert.Null(await Store.History.LossAsync(back.Id + 1, CancellationToken.None));
        UnreadablePayload payload = Assert.Single(await Store.History.UnreadableAsync(5, CancellationToken.None));
        Assert.Equal(unreadable with { Head = payload.Head }, payload);
        Assert.Equal("abc"u8.ToArray(), payload.Head.ToArray());
    }

    [Fact]
    public void Info_CountsWhatIsThere()
    {
        Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon, 7), Reading(Noon.AddHours(30), 8), Reading(Noon, 15, "temperature"), Reading(Noon.AddMinutes(1), 9, flag: QualityFlag.Suspect)], States = [State(Noon, 12)] });
        Store.Journal.Commit(new JournalBatch { Readings = [Reading(Noon, 7.1)] });

        StoreInfo info = Store.Info();

        Assert.Equal((2, 3, 1, 1), (info.Series, info.UsableReadings, info.StateValues, info.Corrections));
        Assert.True(info.FileBytes > 4096);
        Assert.True(info.FreeDiskBytes > 0);
    }

    private Task<IReadOnlyList<Reading>> AllAsync() => Store.History.ReadingsAsync(Tank, "ph", Noon.AddDays(-1), Noon.AddDays(1), null, 100, CancellationToken.None);

    private long Count(string table)
    {
        using var connection = new SqliteConnection($"Data Source={fixture.Path};Pooling=false");
        connection.Open();
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = $"SELECT count(*) FROM {table}";
        return (long)command.ExecuteScalar()!;
    }

    /// <summary>The writer's own connection gets a cap on the file's size, which SQLite reports exactly as a full disk; the cap goes with that connection.</summary>
    private static void LimitPages(SqliteStore store, int pages) => ((SqliteJournal)store.Journal).ExecuteOnWriter($"PRAGMA max_page_count={pages}");
}
