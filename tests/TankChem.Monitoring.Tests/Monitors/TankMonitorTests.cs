using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Monitors;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Tests.Monitors;

public sealed class TankMonitorTests
{
    private static Watch Salmonids() => new Watch(Farm.Tank("salmonid")).At(0, ("alkalinity", 2.0), ("tan", 0.3), ("temperature", 14), ("ph", 7.3));

    [Fact]
    public void Advance_GoodWater_IsCalmAndSaysSo()
    {
        Watch watch = Salmonids().Every(1, 30, ("ph", 7.3), ("temperature", 14));

        Assert.Empty(watch.ActiveRules());
        Assert.Equal(WaterStatus.Ok, watch.Water.Status);
        Assert.Equal(PlaceUrgency.Calm, watch.Snapshot.Urgency);
        Assert.Matches(@"^CO2 \d+\.\d mg/L, pH 7\.30, all within limits for salmonids$", watch.Snapshot.Sentence);
    }

    [Fact]
    public void Advance_Co2OverTheLimit_IsRaisedAfterTheOnDelayAndNamesTheGroup()
    {
        Watch watch = Salmonids().At(1, ("ph", 7.15)).At(2, ("ph", 7.15));
        Assert.Empty(watch.ActiveRules());

        watch.At(3, ("ph", 7.15));

        AlarmView alarm = watch.Active("co2-high");
        Assert.Equal(15, alarm.SetPoint);
        Assert.Equal("salmonids", alarm.SetBy);
        Assert.Matches(@"^CO2 is high: 1\d(\.\d)? mg/L, limit 15 mg/L for salmonids\.$", alarm.Sentence);
        Assert.EndsWith("Gas off, more air; no base.", watch.Snapshot.Sentence, StringComparison.Ordinal);
        Assert.Equal(PlaceUrgency.Warning, watch.Snapshot.Urgency);
        Assert.Single(watch.Journal, entry => entry is { Change: AlarmChange.Raised, Key.Rule: "co2-high" });
    }

    [Fact]
    public void Advance_Co2BackInside_ReturnsAfterTheOffDelayAndWaitsForConfirmation()
    {
        Watch watch = Salmonids().Every(1, 5, ("ph", 7.15)).Every(6, 10, ("ph", 7.4));
        Assert.True(watch.Alarm("co2-high")!.IsActive);

        watch.Every(11, 12, ("ph", 7.4));

        Assert.Equal(AlarmPhase.ReturnedUnacknowledged, watch.Alarm("co2-high")!.State.Phase);
        Assert.EndsWith("; 1 past alarm to confirm", watch.Snapshot.Sentence, StringComparison.Ordinal);
        watch.Do(13, "co2-high", AlarmAction.Acknowledge);
        Assert.Null(watch.Alarm("co2-high"));
    }

    [Fact]
    public void Advance_StuckGasValve_GoesFromCalmToCriticalInOrder()
    {
        var place = Farm.Tank("planted") with { Co2Injection = true };
        Watch watch = new Watch(place).At(0, ("alkalinity", 1.43), ("temperature", 24), ("ph", 7.2));
        double ph = 7.2;
        for (int minute = 1; minute <= 60; minute++)
            watch.At(minute, ("ph", ph -= 0.015), ("temperature", 24));

        string[] co2 = [.. watch.Raised().Where(rule => rule.StartsWith("co2", StringComparison.Ordinal))];
        Assert.Equal(["co2-high", "co2-high-urgent", "co2-high-danger"], co2);
        Assert.Equal(PlaceUrgency.Critical, watch.Snapshot.Urgency);
        Assert.StartsWith("CO2 is high: ", watch.Snapshot.Sentence, StringComparison.Ordinal);
        Assert.Contains("danger limit 40 mg/L for planted tanks. Gas off", watch.Snapshot.Sentence, StringComparison.Ordinal);
    }

    [Fact]
    public void Advance_NormalDayOfInjectedCo2_RaisesNothing()
    {
        // 4 dKH; between 7.5 at night and 6.75 before lights-out CO2 goes from about 4 to about 24 mg/L, and swings back.
        Watch watch = new Watch(Farm.Tank("planted") with { Co2Injection = true }).At(0, ("alkalinity", 1.43));
        for (int minute = 0; minute < 2 * 1440; minute++)
        {
            double ph = 7.125 + 0.375 * Math.Cos(2 * Math.PI * minute / 1440);
            watch.At(minute, ("ph", ph), ("temperature", 24.5), ("oxygen-saturation", 90));
        }

        Assert.Empty(watch.Raised());
    }

    [Fact]
    public void Advance_TwoGroups_TheStrictestLimitHoldsAndIsNamed()
    {
        Watch watch = new Watch(Farm.Tank("warm-water", "salmonid"))
            .At(0, ("alkalinity", 2.0), ("temperature", 14), ("ph", 7.15)).Every(1, 3, ("ph", 7.15));

        Assert.Equal("salmonids", watch.Active("co2-high").SetBy);
        PlaceLimit low = Assert.Single(watch.Snapshot.Limits, limit => limit is { Quantity: "temperature", IsUpper: false, IsUrgent: false });
        Assert.Equal(22, low.Value);
        Assert.Contains("warm-water fish", low.Text, StringComparison.Ordinal);
    }

    [Fact]
    public void Advance_SharedLimitOfTwoGroups_NamesBoth()
    {
        Watch watch = new Watch(Farm.Tank("salmonid", "warm-water"));

        Assert.Contains(watch.Snapshot.Limits, limit => limit.Text == "Oxygen saturation limit 80 % for salmonids and warm-water fish");
    }

    [Fact]
    public void Advance_UnassignedPlace_HasWaterButNoAlarm()
    {
        Watch watch = new Watch(Farm.Tank() with { Assigned = false, Salinity = null })
            .At(0, ("alkalinity", 2.0), ("temperature", 14), ("ph", 6.2), ("air-co2", 9000)).Every(1, 30, ("ph", 6.2));

        Assert.True(watch.Water.Values["co2"].Value > 50);
        Assert.Empty(watch.Snapshot.Alarms);
        Assert.Empty(watch.Journal);
        Assert.Equal(PlaceUrgency.Unknown, watch.Snapshot.Urgency);
        Assert.Contains("not set up yet", watch.Do(31, "co2-high", AlarmAction.Acknowledge).Refusal, StringComparison.Ordinal);
    }

    [Fact]
    public void Advance_RoomAirOver5000Ppm_IsADangerToPeopleAtOnce()
    {
        Watch watch = new Watch(Farm.WholeSite).At(0, ("air-co2", 6200));

        AlarmView alarm = watch.Active("air-co2-people");
        Assert.True(alarm.DangerToPeople);
        Assert.Equal(AlarmPriority.Critical, alarm.Priority);
        Assert.Equal("Room air CO2 is 6,200 ppm, limit 5,000 ppm for people: do not enter, ventilate.", alarm.Sentence);
        Assert.Equal(PlaceUrgency.Critical, watch.Snapshot.Urgency);
        Assert.Contains("immediately dangerous to life", watch.At(1, ("air-co2", 41000)).Active("air-co2-people").Sentence, StringComparison.Ordinal);
    }

    [Fact]
    public void Advance_RoomAirProbeFailsWhileDangerous_HoldsTheAlarm()
    {
        Watch watch = new Watch(Farm.WholeSite).At(0, ("air-co2", 6200)).Every(1, 200);

        Assert.Contains("when last known", watch.Active("air-co2-people").Sentence, StringComparison.Ordinal);
        Assert.Contains("air-co2-silent", watch.ActiveRules());
    }

    [Fact]
    public void Advance_ProbeFallsSilent_HoldsTheWaterAlarmAndRaisesTheOneAboutKnowledge()
    {
        Watch watch = Salmonids().Every(1, 5, ("ph", 7.15), ("temperature", 14)).Every(6, 19);

        Assert.Contains("when last known", watch.Active("co2-high").Sentence, StringComparison.Ordinal);
        AlarmView silent = watch.Active("ph-silent");
        Assert.Equal("Nothing heard from the pH probe for 14 min.", silent.Sentence);
        Assert.True(silent.AboutKnowledge);
        Assert.Null(watch.Alarm("cannot-vouch"));
        Assert.Equal(WaterStatus.Partial, watch.Water.Status);
    }

    [Fact]
    public void Advance_OnlyKnowledgeMissing_IsDoubtAndNotWarning()
    {
        Watch watch = Salmonids().Every(1, 5, ("ph", 7.3), ("temperature", 14)).Every(6, 18);

        Assert.Equal(["ph-silent"], watch.ActiveRules());
        Assert.Equal(PlaceUrgency.Doubt, watch.Snapshot.Urgency);
        Assert.Equal("Nothing heard from the pH probe for 13 min.", watch.Snapshot.Sentence);
    }

    [Fact]
    public void Advance_ProbeThatWasNeverHeardButIsSetUp_IsSilentAfterItsGrace()
    {
        var place = Farm.Tank("salmonid") with { Probes = [new ProbeDefinition { Quantity = "ph" }] };
        Watch watch = new Watch(place).Every(0, 9);
        Assert.Empty(watch.ActiveRules());

        watch.At(10);

        Assert.Equal("Nothing heard from the pH probe yet.", watch.Active("ph-silent").Sentence);
    }

    [Fact]
    public void Advance_ValueMeasuredByHand_IsNeverCalledSilent()
    {
        Watch watch = new Watch(Farm.Tank("salmonid")).Take(0, Farm.Read("ph", 7.2, Farm.Start, origin: ReadingOrigin.Manual)).Every(1, 120);

        Assert.Null(watch.Alarm("ph-silent"));
    }

    [Fact]
    public void Advance_AlkalinityTooOld_CannotVouchAndSaysSinceWhen()
    {
        DateTimeOffset titrated = Farm.Start.AddDays(-14).AddMinutes(1);
        Watch watch = new Watch(Farm.Tank("salmonid"))
            .Take(0, Farm.Read("alkalinity", 4.0, titrated, origin: ReadingOrigin.Manual), Farm.Read("ph", 8.2, Farm.Start), Farm.Read("temperature", 14, Farm.Start))
            .Every(1, 8, ("ph", 8.2), ("temperature", 14));

        AlarmView alarm = watch.Active("cannot-vouch");
        Assert.Equal("Cannot vouch for CO2: alkalinity last known 17 Apr 10:01 UTC; titrate now.", alarm.Sentence);
        Assert.True(alarm.AboutKnowledge);
        Assert.Equal("Titrate now.", alarm.FirstAction);
        Assert.Equal(PlaceUrgency.Doubt, watch.Snapshot.Urgency);
    }

    [Fact]
    public void Advance_OnlyATemperatureProbe_NagsNobodyAboutCo2()
    {
        Watch watch = new Watch(Farm.Tank("reef") with { Salinity = 35 }).Every(0, 60, ("temperature", 25));

        Assert.Empty(watch.Journal);
        Assert.Equal("25.0 °C, all that is known within limits for the reef; CO2 cannot be computed: pH not known", watch.Snapshot.Sentence);
    }

    [Fact]
    public void Advance_PhWithoutAnyTitration_AsksForOneAfterADay()
    {
        Watch watch = new Watch(Farm.Tank("salmonid")).Every(0, 1439, ("temperature", 14), ("ph", 7.2));
        Assert.Empty(watch.ActiveRules());

        watch.At(1440, ("temperature", 14), ("ph", 7.2));

        Assert.Equal("Cannot vouch for CO2: alkalinity not known; titrate now.", watch.Active("cannot-vouch").Sentence);
    }

    [Fact]
    public void Apply_RefusedCommand_ChangesNothing()
    {
        Watch watch = Salmonids().Every(1, 4, ("ph", 7.15));
        PlaceSnapshot before = watch.Snapshot;

        MonitorOutcome outcome = watch.Do(5, "co2-high", AlarmAction.Reset);

        Assert.StartsWith("Cannot reset: its condition still holds.", outcome.Refusal, StringComparison.Ordinal);
        Assert.Empty(outcome.AlarmStates);
        Assert.Same(before, watch.Snapshot);
    }

    [Fact]
    public void Advance_DoubtAloneReachesTheUrgentLimit_IsSaidAsDoubt()
    {
        DateTimeOffset titrated = Farm.Start.AddDays(-9);
        Watch watch = new Watch(Farm.Tank("salmonid"))
            .Take(0, Farm.Read("alkalinity", 1.6, titrated, origin: ReadingOrigin.Manual), Farm.Read("ph", 7.1, Farm.Start), Farm.Read("temperature", 14, Farm.Start))
            .Every(1, 8, ("ph", 7.1), ("temperature", 14));

        Assert.Equal(["cannot-vouch"], watch.ActiveRules());
        Assert.Matches(@"^Cannot vouch for CO2: .* ± .* mg/L may be past the urgent limit 20; titrate now\.$", watch.Active("cannot-vouch").Sentence);
    }

    [Fact]
    public void Advance_UnitNotConfirmed_CannotVouchAndSaysWhy()
    {
        Watch watch = new Watch(Farm.Tank("salmonid"))
            .Take(0, Farm.Unconfirmed("alkalinity", 5.6, Farm.Start), Farm.Read("ph", 7.3, Farm.Start), Farm.Read("temperature", 14, Farm.Start))
            .Every(1, 8, ("ph", 7.3), ("temperature", 14));

        Assert.Contains("alkalinity not usable (unit not confirmed)", watch.Active("cannot-vouch").Sentence, StringComparison.Ordinal);

        watch.Take(9, Farm.Read("alkalinity", 2.0, Farm.Start));

        Assert.True(watch.Water.Values.ContainsKey("co2"));
        Assert.Empty(watch.ActiveRules());
    }

    [Fact]
    public void Advance_DeviceOff_IsRaisedWithItsFirstAction()
    {
        Watch watch = Salmonids().Take(1, Farm.Device("degasser", false, Watch.Minute(1))).Every(2, 3, ("ph", 7.3));

        AlarmView alarm = watch.Active("state-degasser-off");
        Assert.Equal("Degasser is off.", alarm.Sentence);
        Assert.Equal(PlaceUrgency.Urgent, watch.Snapshot.Urgency);
        watch.Take(4, Farm.Device("degasser", true, Watch.Minute(4))).Every(5, 6, ("ph", 7.3));
        Assert.False(watch.Alarm("state-degasser-off")!.IsActive);
    }

    [Fact]
    public void Advance_MainsOff_KeepsBackWhatFollowsFromItButRecordsIt()
    {
        Watch watch = Salmonids()
            .Take(1, Farm.Device("mains", false, Watch.Minute(1)), Farm.Device("blower", false, Watch.Minute(1)), Farm.Device("oxygen-supply", false, Watch.Minute(1)), Farm.Device("generator", true, Watch.Minute(1)))
            .Every(2, 4, ("ph", 7.3));

        Assert.Equal(["state-mains-off", "state-oxygen-supply-off", "state-generator-on"], watch.ActiveRules());
        Assert.Equal(AlarmSuppression.ByDesign, watch.Alarm("state-blower-off")!.State.Suppression);
        Assert.Contains("state-blower-off", watch.Raised());

        watch.Take(5, Farm.Device("mains", true, Watch.Minute(5)));

        Assert.Contains("state-blower-off", watch.ActiveRules());
    }

    [Fact]
    public void Advance_FeederOff_IsRecordedOnly()
    {
        Watch watch = Salmonids().Take(1, Farm.Device("feeder", false, Watch.Minute(1))).Every(2, 10, ("ph", 7.3));

        Assert.Empty(watch.ActiveRules());
        Assert.Contains(watch.Snapshot.Latest, reading => reading.Series.Probe == "feeder");
    }

    [Fact]
    public void Advance_OxygenFalls_WarnsThenUrges()
    {
        Watch watch = Salmonids().Every(1, 3, ("ph", 7.3), ("temperature", 14), ("oxygen-saturation", 76));
        Assert.Equal(["oxygen-saturation-low"], watch.ActiveRules());

        watch.Every(4, 7, ("ph", 7.3), ("temperature", 14), ("oxygen-saturation", 57));

        Assert.Contains("oxygen-saturation-low-urgent", watch.ActiveRules());
        Assert.Contains("oxygen-low-urgent", watch.ActiveRules());
        Assert.Equal(PlaceUrgency.Urgent, watch.Snapshot.Urgency);
    }

    [Fact]
    public void Advance_LateReading_NeverReplacesANewerOne()
    {
        Watch watch = Salmonids().At(5, ("ph", 7.3)).Take(6, Farm.Read("ph", 6.2, Watch.Minute(3)));

        Assert.Equal(7.3, watch.Water.Values["ph"].Value);
        Assert.Equal(Watch.Minute(5), watch.Water.Values["ph"].Time);
    }

    [Fact]
    public void Advance_CorrectionOfTheNewestReading_CountsAsKnownNow()
    {
        Watch watch = Salmonids().At(5, ("ph", 6.2)).Take(6, Farm.Read("ph", 7.2, Watch.Minute(5)) with { ReceivedAt = Watch.Minute(6) });

        Assert.Equal(7.2, watch.Water.Values["ph"].Value);
    }

    [Fact]
    public void Advance_SuspectReading_DrivesNothing()
    {
        Watch watch = Salmonids().Take(1, Farm.Read("ph", 6.0, Watch.Minute(1)) with { Flag = QualityFlag.Suspect, Reason = "out of a backlog, no time of its own" });

        Assert.Equal(7.3, watch.Water.Values["ph"].Value);
        Assert.Equal(QualityFlag.Suspect, watch.Snapshot.Latest.Single(reading => reading.Series.Quantity == "ph").Flag);
        Assert.True(watch.Last.Changed);
    }

    [Fact]
    public void Advance_NothingNew_IsNothing()
    {
        Watch watch = Salmonids();

        watch.At(0.1);

        Assert.Same(MonitorOutcome.Nothing, watch.Last);
    }

    [Fact]
    public void Advance_SteadyWater_KeepsAStateEveryFiveMinutesAndAtAMove()
    {
        Watch watch = Salmonids();
        watch.Kept.Clear();
        watch.Every(1, 60, ("ph", 7.3), ("temperature", 14));
        Assert.Equal(12, watch.Kept.Count);

        watch.At(61, ("ph", 7.25)).At(61.1, ("ph", 7.2)).At(61.2, ("ph", 7.15));

        Assert.Equal(13, watch.Kept.Count(state => state.Time <= Watch.Minute(61.1)));
        Assert.Equal(14, watch.Kept.Count);
    }

    [Fact]
    public void Advance_RestartInTheMiddleOfAnOnDelay_GoesOnWithIt()
    {
        Watch watch = Salmonids().At(1, ("ph", 7.15)).Restart().At(2, ("ph", 7.15)).Restart().At(3, ("ph", 7.15));

        Assert.Equal(Watch.Minute(3), watch.Active("co2-high").State.RaisedAt);
    }

    [Fact]
    public void Apply_AcknowledgementOverARestart_IsRemembered()
    {
        Watch watch = Salmonids().Every(1, 4, ("ph", 7.15));
        Assert.Null(watch.Do(4.5, "co2-high", AlarmAction.Acknowledge, "Ada", "gas is off").Refusal);
        watch.Restart().At(5, ("ph", 7.15));

        AlarmView alarm = watch.Active("co2-high");
        Assert.Equal(AlarmPhase.Acknowledged, alarm.State.Phase);
        Assert.Equal("Ada", alarm.State.AcknowledgedBy);
        Assert.Contains(watch.Journal, entry => entry is { Change: AlarmChange.Acknowledged, Who: "Ada", Why: "gas is off" });
    }

    [Fact]
    public void Apply_Shelf_HidesUntilItsEndAndRoundsSaysSo()
    {
        Watch watch = Salmonids().Every(1, 4, ("ph", 7.15));
        watch.Do(5, "co2-high", AlarmAction.Shelve, "Ada", "cleaning", 60);
        Assert.Empty(watch.ActiveRules());
        Assert.Contains("1 alarm shelved or out of service", watch.Snapshot.Sentence, StringComparison.Ordinal);

        watch.Every(6, 61, ("ph", 7.15), ("temperature", 14));

        Assert.Contains(watch.Journal, entry => entry is { Change: AlarmChange.ShelfExpired, Who: null });
        Assert.Contains("co2-high", watch.ActiveRules());
    }

    [Fact]
    public void Apply_UnknownRule_NamesTheRulesThatAre() =>
        Assert.Contains("co2-high, co2-high-urgent", Salmonids().Do(1, "ammonia", AlarmAction.Acknowledge).Refusal, StringComparison.Ordinal);

    [Fact]
    public void Apply_OtherPlace_IsRefused()
    {
        var monitor = new TankMonitor(Farm.Site(Farm.Tank("salmonid")), Farm.Tank("salmonid"), [], []);

        MonitorOutcome outcome = monitor.Apply(new AlarmCommand(new AlarmKey(Farm.LoopKey, "co2-high"), AlarmAction.Acknowledge, "Ada", null, null), Farm.Start);

        Assert.Contains("is not one of hollow-weir/tank-1", outcome.Refusal, StringComparison.Ordinal);
    }

    [Fact]
    public void Reconfigure_StockThatSetTheLimitLeaves_EndsItsAlarmAndSaysWhy()
    {
        Watch watch = Salmonids().Every(1, 4, ("ph", 7.15));
        Assert.Contains("co2-high", watch.ActiveRules());

        watch.Reconfigure(Farm.Tank("reef")).At(5, ("ph", 7.15));

        Assert.Null(watch.Alarm("co2-high"));
        Assert.Contains(watch.Journal, entry => entry is { Key.Rule: "co2-high", Change: AlarmChange.ReturnedToNormal } && entry.Sentence.Contains("set-up was changed", StringComparison.Ordinal));
    }

    [Fact]
    public void Reconfigure_SameRules_KeepsTheAlarmStates()
    {
        Watch watch = Salmonids().Every(1, 4, ("ph", 7.15)).Reconfigure(Farm.Tank("salmonid") with { VolumeM3 = 9 }).At(5, ("ph", 7.15));

        Assert.Contains("co2-high", watch.ActiveRules());
        Assert.Single(watch.Raised(), "co2-high");
    }

    [Fact]
    public void Loop_WithoutAPhProbe_MissesNoCo2()
    {
        Watch loop = new Watch(Farm.Loop, Farm.Tank("salmonid") with { Loop = "loop-a" }).At(0, ("alkalinity", 2), ("temperature", 14), ("tan", 0.3));

        Assert.Equal(WaterStatus.Ok, loop.Water.Status);
        Assert.Equal("14.0 °C, alkalinity 2.00 mmol/L, all within limits for the stock of its tanks", loop.Snapshot.Sentence);
    }

    [Fact]
    public void Loop_AlkalinityLow_IsToldAtTheLoopAndKeptBackInItsTanks()
    {
        PlaceDefinition tank = Farm.Tank("salmonid") with { Loop = "loop-a" };
        Reading[] loopReadings = [Farm.Read("alkalinity", 0.8, Farm.Start, Farm.LoopKey), Farm.Read("temperature", 14, Farm.Start, Farm.LoopKey)];
        Watch loop = new Watch(Farm.Loop, tank).Take(0, loopReadings);
        Watch inTank = new Watch(tank, Farm.Loop).Take(0, [.. loopReadings, Farm.Read("ph", 7.3, Farm.Start)]);

        Assert.Contains("alkalinity-low", loop.ActiveRules());
        Assert.DoesNotContain(loop.Snapshot.Limits, limit => limit.Quantity.StartsWith("oxygen", StringComparison.Ordinal));
        Assert.Equal(AlarmSuppression.ByDesign, inTank.Alarm("alkalinity-low")!.State.Suppression);
        Assert.Contains("alkalinity-low", inTank.Raised());
    }
}
