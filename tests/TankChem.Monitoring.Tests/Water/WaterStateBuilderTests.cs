using CsCheck;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Tests.Monitors;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Tests.Water;

public sealed class WaterStateBuilderTests
{
    private static readonly DateTimeOffset Now = Farm.Start;

    [Fact]
    public void Build_NothingHeard_IsNone()
    {
        WaterState state = Build(Farm.Tank("salmonid"));

        Assert.Equal(WaterStatus.None, state.Status);
        Assert.Null(state.Time);
        Assert.Empty(state.Values);
        Assert.Contains("pH not known", state.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void Build_FreshWater_GivesTheTabulatedCo2()
    {
        // Tucker 1984, reprinted in SRAC 468: at pH 6.8 and 15 °C 0.367 mg/L CO2 per mg/L alkalinity as CaCO3, without ionic strength: a full computation gives 4 to 9 % less.
        WaterState state = Build(Farm.Tank(), ("ph", 6.8), ("alkalinity", 100 / 50.04), ("temperature", 15));

        Assert.InRange(state.Values["co2"].Value, 0.90 * 36.7, 0.97 * 36.7);
        Assert.Equal("mg/L", state.Values["co2"].Unit);
        Assert.Equal(WaterStatus.Ok, state.Status);
        Assert.Null(state.Reason);
    }

    [Fact]
    public void Build_FreshWater_HasEveryComputedNameOfTheContract()
    {
        var place = Farm.Tank("salmonid") with { Co2Injection = true, HardnessMmolL = 1.2 };
        WaterState state = Build(place, ("ph", 7.2), ("alkalinity", 2), ("temperature", 14), ("tan", 0.4), ("oxygen", 9));

        string[] expected = ["alkalinity", "buffer-closed", "buffer-open", "co2", "co2-air", "co3", "dic", "hco3", "nh3-n", "omega-aragonite", "omega-calcite", "oxygen", "oxygen-saturation", "pco2", "ph", "ph-air", "ph-injected", "salinity", "tan", "temperature"];
        Assert.Equal(expected, state.Values.Keys.Order(StringComparer.Ordinal));
    }

    [Fact]
    public void Build_AmountsPerLitre_AddUpToDic()
    {
        WaterState state = Build(Farm.Tank() with { Salinity = 35 }, ("ph", 8.1), ("alkalinity", 2.4), ("temperature", 25));

        double co2 = state.Values["co2"].Value / 44.009;
        Assert.Equal(state.Values["dic"].Value, co2 + state.Values["hco3"].Value + state.Values["co3"].Value, 3);
        Assert.Equal(2.4, state.Values["hco3"].Value + 2 * state.Values["co3"].Value + 0.1, 1);
    }

    [Fact]
    public void Build_IonsNotKnown_IsACaveat()
    {
        WaterState state = Build(Farm.Tank(), ("ph", 7.2), ("alkalinity", 2), ("temperature", 14));

        Assert.Contains("ions not known: ionic strength estimated from alkalinity", state.Values["co2"].Caveats);
    }

    [Fact]
    public void Build_IonsGiven_ChangeCo2AndAreNoCaveat()
    {
        WaterState without = Build(Farm.Tank(), ("ph", 7.2), ("alkalinity", 2), ("temperature", 14));
        var ions = new IonContent { CalciumMgL = 120, MagnesiumMgL = 30, SodiumMgL = 100, ChlorideMgL = 150, SulfateMgL = 150 };
        WaterState with = Build(Farm.Tank() with { Ions = ions }, ("ph", 7.2), ("alkalinity", 2), ("temperature", 14));

        Assert.DoesNotContain(with.Values["co2"].Caveats, caveat => caveat.Contains("ions", StringComparison.Ordinal));
        Assert.NotEqual(without.Values["co2"].Value, with.Values["co2"].Value, 2);
        Assert.True(with.Values.ContainsKey("omega-calcite"));
        Assert.False(without.Values.ContainsKey("omega-calcite"));
    }

    [Fact]
    public void Build_Inputs_HaveProbePlaceTimeAndAge()
    {
        WaterState state = BuildWith(Farm.Tank(), [
            Farm.Read("ph", 7.24, Now.AddSeconds(-5)),
            Farm.Read("alkalinity", 2, Now.AddMinutes(-170)),
            Farm.Read("temperature", 14, Now.AddSeconds(-30)),
        ]);

        WaterValue co2 = state.Values["co2"];
        Assert.Equal(Now.AddSeconds(-5), co2.Time);
        Assert.Equal(["ph", "alkalinity", "temperature"], co2.Inputs.Select(input => input.Quantity));
        Assert.Equal(10200, co2.Inputs[1].AgeS);
        Assert.Equal(Farm.TankKey, co2.Inputs[1].Place);
    }

    [Fact]
    public void Build_AlkalinityTooOld_NamesTheDayAndComputesNothingFromIt()
    {
        WaterState state = BuildWith(Farm.Tank(), [
            Farm.Read("ph", 7.24, Now),
            Farm.Read("temperature", 14, Now),
            Farm.Read("alkalinity", 2, Now.AddDays(-15)),
        ]);

        Assert.Equal(WaterStatus.Partial, state.Status);
        Assert.Equal("CO2 cannot be computed: alkalinity last known 16 Apr 10:00 UTC", state.Reason);
        Assert.True(state.Values["alkalinity"].Stale);
        Assert.False(state.Values.ContainsKey("co2"));
        Assert.False(state.Values.ContainsKey("ph-air"));
    }

    [Theory]
    [InlineData("ph", 10)]
    [InlineData("temperature", 60)]
    [InlineData("tan", 3 * 1440)]
    [InlineData("alkalinity", 14 * 1440)]
    public void Build_OldestAge_IsUsedAndOneSecondOlderIsNot(string quantity, int minutes)
    {
        (string, double)[] all = [("ph", 7.2), ("alkalinity", 3), ("temperature", 14), ("tan", 0.3)];
        foreach ((int seconds, bool stale) in new[] { (0, false), (-1, true) })
        {
            WaterState state = BuildWith(Farm.Tank("salmonid"), [.. all.Select(one =>
                Farm.Read(one.Item1, one.Item2, one.Item1 == quantity ? Now.AddMinutes(-minutes).AddSeconds(seconds) : Now))]);

            Assert.Equal(stale, state.Values[quantity].Stale);
            Assert.Equal(stale, state.Status == WaterStatus.Partial);
            Assert.Equal(!stale, state.Values.ContainsKey("nh3-n"));
        }
    }

    [Fact]
    public void Build_OldestAgeSetForTheProbe_StandsOverTheDefault()
    {
        var place = Farm.Tank() with { Probes = [new ProbeDefinition { Quantity = "ph", OldestUsed = TimeSpan.FromHours(2) }] };

        WaterState state = BuildWith(place, [Farm.Read("ph", 7.2, Now.AddHours(-1)), Farm.Read("alkalinity", 2, Now), Farm.Read("temperature", 14, Now)]);

        Assert.True(state.Values.ContainsKey("co2"));
    }

    [Fact]
    public void Build_UnitNotConfirmed_IsNamedAndUsedForNothing()
    {
        WaterState state = BuildWith(Farm.Tank(), [Farm.Read("ph", 7.2, Now), Farm.Read("temperature", 14, Now), Farm.Unconfirmed("alkalinity", 5.6, Now)]);

        Assert.Equal("CO2 cannot be computed: alkalinity not usable (unit not confirmed)", state.Reason);
        Assert.False(state.Values.ContainsKey("alkalinity"));
    }

    [Fact]
    public void Build_TankInALoop_TakesTheWaterOfTheLoopButNeverItsPhOxygenOrCo2()
    {
        PlaceDefinition tank = Farm.Tank("salmonid") with { Loop = "loop-a", Salinity = null };
        Reading[] loop = [.. new[] { ("alkalinity", 2.0), ("temperature", 14.0), ("tan", 0.4), ("ph", 7.6), ("oxygen", 10.0), ("pco2", 900.0) }
            .Select(one => Farm.Read(one.Item1, one.Item2, Now, Farm.LoopKey))];

        WaterState without = BuildWith(tank, loop, Farm.Loop);
        WaterState with = BuildWith(tank, [.. loop, Farm.Read("ph", 7.2, Now)], Farm.Loop);

        Assert.Equal("CO2 cannot be computed: pH not known", without.Reason);
        Assert.DoesNotContain("oxygen", without.Values.Keys);
        Assert.DoesNotContain("pco2-measured", without.Values.Keys);
        Assert.Equal(WaterStatus.Ok, with.Status);
        Assert.Equal(["from Grow-out loop"], with.Values["alkalinity"].Caveats);
        Assert.Contains("alkalinity from Grow-out loop", with.Values["co2"].Caveats);
        Assert.Contains("TAN from Grow-out loop", with.Values["nh3-n"].Caveats);
        Assert.Equal(0.2, with.Values["salinity"].Value);
        Assert.Equal(Farm.LoopKey, with.Values["co2"].Inputs.Single(input => input.Quantity == "alkalinity").Place);
    }

    [Fact]
    public void Build_TankWithAlkalinityOfItsOwn_DoesNotTakeTheLoops()
    {
        PlaceDefinition tank = Farm.Tank() with { Loop = "loop-a" };

        WaterState state = BuildWith(tank, [Farm.Read("alkalinity", 2.0, Now.AddDays(-1)), Farm.Read("alkalinity", 3.0, Now, Farm.LoopKey)], Farm.Loop);

        Assert.Equal(2.0, state.Values["alkalinity"].Value);
    }

    [Fact]
    public void Build_OwnAlkalinityTooOld_TakesTheLoopsAndSaysSo()
    {
        PlaceDefinition tank = Farm.Tank() with { Loop = "loop-a" };

        WaterState state = BuildWith(tank, [Farm.Read("alkalinity", 2.0, Now.AddDays(-20)), Farm.Read("alkalinity", 3.0, Now, Farm.LoopKey)], Farm.Loop);

        Assert.Equal(3.0, state.Values["alkalinity"].Value);
        Assert.Equal(["from Grow-out loop"], state.Values["alkalinity"].Caveats);
    }

    [Fact]
    public void Build_Salinity_IsMeasuredElseFromConductivityElseSetUpElseAssumed()
    {
        PlaceDefinition none = Farm.Tank() with { Salinity = null };

        WaterValue assumed = Build(none, ("temperature", 25)).Values["salinity"];
        WaterValue setUp = Build(none with { Salinity = 12 }, ("temperature", 25)).Values["salinity"];
        WaterValue conductivity = Build(none with { Salinity = 12 }, ("temperature", 25), ("conductivity", 53000)).Values["salinity"];
        WaterValue measured = Build(none with { Salinity = 12 }, ("temperature", 25), ("conductivity", 53000), ("salinity", 33)).Values["salinity"];

        Assert.Equal(0, assumed.Value);
        Assert.Contains("assumed", Assert.Single(assumed.Caveats), StringComparison.Ordinal);
        Assert.Equal(12, setUp.Value);
        Assert.Equal(["salinity as set up, not measured"], setUp.Caveats);
        Assert.InRange(conductivity.Value, 34.5, 35.5);
        Assert.Equal(["salinity from conductivity"], conductivity.Caveats);
        Assert.Equal(33, measured.Value);
    }

    [Fact]
    public void Build_SalinityProbeSilentAndNothingSetUp_IsNotTakenForFreshWater()
    {
        WaterState state = BuildWith(Farm.Tank() with { Salinity = null }, [
            Farm.Read("salinity", 35, Now.AddDays(-60)), Farm.Read("ph", 8.1, Now), Farm.Read("alkalinity", 2.4, Now), Farm.Read("temperature", 25, Now),
        ]);

        Assert.False(state.Values.ContainsKey("co2"));
        Assert.Contains("salinity last known 2 Mar 10:00 UTC", state.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void Build_AirOfTheSite_SetsTheAirEquilibrium()
    {
        (string, double)[] water = [("alkalinity", 2), ("temperature", 20)];
        WaterState outdoors = Build(Farm.Tank(), water);
        WaterState hall = Build(Farm.Tank() with { AirCo2Ppm = 1200 }, water);
        WaterState probe = BuildWith(Farm.Tank() with { AirCo2Ppm = 1200 }, [.. water.Select(one => Farm.Read(one.Item1, one.Item2, Now)), Farm.Read("air-co2", 2500, Now, Farm.SiteKey)]);

        Assert.True(outdoors.Values["ph-air"].Value > hall.Values["ph-air"].Value + 0.4);
        Assert.True(hall.Values["ph-air"].Value > probe.Values["ph-air"].Value + 0.2);
        Assert.Equal(2500 / 430.0, probe.Values["co2-air"].Value / outdoors.Values["co2-air"].Value, 1);
    }

    [Fact]
    public void Build_Barometer_StandsOverElevation()
    {
        WaterState high = BuildWith(Farm.Tank(), [Farm.Read("oxygen", 8, Now), Farm.Read("temperature", 20, Now), Farm.Read("air-pressure", 850, Now, Farm.SiteKey)]);
        WaterState low = Build(Farm.Tank(), ("oxygen", 8), ("temperature", 20));

        Assert.InRange(high.Values["oxygen-saturation"].Value / low.Values["oxygen-saturation"].Value, 1.15, 1.20);
    }

    [Fact]
    public void Build_OxygenEitherWay_IsTheSameWater()
    {
        double share = Build(Farm.Tank(), ("oxygen", 8), ("temperature", 20)).Values["oxygen-saturation"].Value;
        double amount = Build(Farm.Tank(), ("oxygen-saturation", share), ("temperature", 20)).Values["oxygen"].Value;

        Assert.Equal(8, amount, 9);
        Assert.InRange(share, 87, 92);
    }

    [Fact]
    public void Build_Co2Probe_StandsBesideTheComputedPco2()
    {
        WaterState state = Build(Farm.Tank(), ("pco2", 3000), ("ph", 7.2), ("alkalinity", 2), ("temperature", 14));

        Assert.Equal(3000, state.Values["pco2-measured"].Value);
        Assert.NotEqual(3000, state.Values["pco2"].Value, 0);
    }

    [Fact]
    public void Build_OtherQuantity_IsPassedThrough()
    {
        WaterValue turbidity = Build(Farm.Tank(), ("turbidity", 3.2)).Values["turbidity"];

        Assert.Equal(3.2, turbidity.Value);
        Assert.Null(turbidity.U);
    }

    [Fact]
    public void Build_DeviceState_IsNoWaterValue() =>
        Assert.Empty(BuildWith(Farm.Tank(), [Farm.Device("blower", true, Now)]).Values);

    [Fact]
    public void Build_TwoProbes_MainIsUsedAndDisagreementIsACaveat()
    {
        WaterState state = BuildWith(Farm.Tank(), [
            Farm.Read("ph", 7.2, Now.AddMinutes(-1)), Farm.Read("ph", 7.9, Now, probe: "inlet"), Farm.Read("alkalinity", 2, Now), Farm.Read("temperature", 14, Now),
        ]);

        Assert.Equal(7.2, state.Values["ph"].Value);
        Assert.Contains("probe inlet disagrees: it reads 7.90", state.Values["ph"].Caveats);
        Assert.Contains("pH probe inlet disagrees: it reads 7.90", state.Values["co2"].Caveats);
    }

    [Fact]
    public void Build_MainProbeTooOld_TheFreshestOtherIsUsed()
    {
        WaterState state = BuildWith(Farm.Tank(), [
            Farm.Read("ph", 7.2, Now.AddMinutes(-11)), Farm.Read("ph", 7.3, Now.AddMinutes(-2), probe: "inlet"), Farm.Read("ph", 7.4, Now.AddMinutes(-1), probe: "outlet"),
        ]);

        Assert.Equal(7.4, state.Values["ph"].Value);
        Assert.False(state.Values["ph"].Stale);
    }

    [Fact]
    public void Build_TanNeverMeasured_IsNamedWithFishButNotWithPlants()
    {
        (string, double)[] water = [("ph", 7.2), ("alkalinity", 2), ("temperature", 20)];

        Assert.Equal("NH3-N cannot be computed: TAN not known", Build(Farm.Tank("salmonid"), water).Reason);
        Assert.Null(Build(Farm.Tank("planted"), water).Reason);
        Assert.Null(Build(Farm.Tank("reef") with { Salinity = 35 }, water).Reason);
    }

    [Fact]
    public void Build_ImpossibleWater_SaysSoInsteadOfANumber()
    {
        WaterState state = Build(Farm.Tank(), ("ph", 11.9), ("alkalinity", 0.1), ("temperature", 20));

        Assert.Equal(WaterStatus.Partial, state.Status);
        Assert.StartsWith("CO2 cannot be computed: ", state.Reason, StringComparison.Ordinal);
        Assert.False(state.Values.ContainsKey("co2"));
    }

    [Fact]
    public void Build_WholeSite_OnlyPassesItsReadingsThrough()
    {
        WaterState state = BuildWith(Farm.WholeSite, [Farm.Read("air-co2", 800, Now, Farm.SiteKey), Farm.Read("air-pressure", 1001, Now, Farm.SiteKey)]);

        Assert.Equal(WaterStatus.Ok, state.Status);
        Assert.Equal(["air-co2", "air-pressure"], state.Values.Keys.Order(StringComparer.Ordinal));
    }

    [Fact]
    public void Build_Uncertainty_GrowsWithTheAgeOfTheTitration()
    {
        WaterState fresh = BuildWith(Farm.Tank(), [Farm.Read("ph", 7.2, Now), Farm.Read("temperature", 14, Now), Farm.Read("alkalinity", 2, Now)]);
        WaterState old = BuildWith(Farm.Tank(), [Farm.Read("ph", 7.2, Now), Farm.Read("temperature", 14, Now), Farm.Read("alkalinity", 2, Now.AddDays(-5))]);

        Assert.Equal(fresh.Values["co2"].Value, old.Values["co2"].Value, 9);
        Assert.InRange(fresh.Values["co2"].U!.Value / fresh.Values["co2"].Value, 0.2, 0.3);
        Assert.InRange(old.Values["co2"].U!.Value / old.Values["co2"].Value, 0.5, 0.65);
    }

    [Fact]
    public void Build_AnyPossibleReadings_GivesFiniteNumbersOnly()
    {
        Gen<double?> Maybe(double low, double high) => Gen.OneOf(Gen.Const((double?)null), Gen.Double[low, high].Select(value => (double?)value));
        Gen.Select(Maybe(2, 12), Maybe(-2, 40), Maybe(-5, 60), Maybe(0, 60), Maybe(0, 200), Maybe(0, 40), Gen.Int[0, 30]).Sample((ph, alkalinity, temperature, salinity, tan, oxygen, days) =>
        {
            var readings = new List<Reading>();
            void Add(string quantity, double? value, DateTimeOffset at)
            {
                if (value is { } known)
                    readings.Add(Farm.Read(quantity, known, at));
            }

            Add("ph", ph, Now);
            Add("alkalinity", alkalinity, Now.AddDays(-days));
            Add("temperature", temperature, Now);
            Add("salinity", salinity, Now);
            Add("tan", tan, Now);
            Add("oxygen", oxygen, Now);
            WaterState state = BuildWith(Farm.Tank("salmonid") with { Co2Injection = true, Salinity = null }, [.. readings]);

            foreach ((string name, WaterValue value) in state.Values)
            {
                Assert.True(double.IsFinite(value.Value), name);
                Assert.True(value.U is null or >= 0 && double.IsFinite(value.U ?? 0), name);
            }
        });
    }

    private static WaterState Build(PlaceDefinition place, params (string Quantity, double Value)[] readings) =>
        BuildWith(place, [.. readings.Select(reading => Farm.Read(reading.Quantity, reading.Value, Now, place.Key))]);

    private static WaterState BuildWith(PlaceDefinition place, Reading[] readings, params PlaceDefinition[] others)
    {
        var book = new ReadingBook();
        foreach (Reading reading in readings)
            book.Take(reading);
        return WaterStateBuilder.Build(Farm.Site([place, .. others]), place, book, Now).State;
    }
}
