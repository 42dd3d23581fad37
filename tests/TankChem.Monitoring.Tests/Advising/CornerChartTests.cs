using TankChem.Dosing;
using TankChem.Monitoring.Advising;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Tests.Monitors;

namespace TankChem.Monitoring.Tests.Advising;

public sealed class CornerChartTests
{
    private static readonly (string, double)[] Water = [("ph", 6.6), ("temperature", 12), ("alkalinity", 1.0), ("tan", 0.5)];

    [Fact]
    public void Of_KnownWater_HasNowAndEdgesInTheirRanges()
    {
        PlaceSnapshot place = Tank().At(0, Water).Snapshot;

        CornerChart chart = CornerChart.Of(place, [], Remedies(place));

        Assert.Equal(place.Water.Values["co2"].Value, chart.Now!.Co2MgL);
        Assert.Equal(place.Water.Values["nh3-n"].Value, chart.Now.Nh3NMgL);
        Assert.True(chart.Now.Co2U > 0 && chart.Now.Nh3NU > 0);
        Assert.Equal([15, 20, 40], chart.Co2Edges.Select(e => e.Value).Order());
        Assert.All(chart.Co2Edges, e => Assert.InRange(e.Value, chart.Co2Range.Low, chart.Co2Range.High));
        Assert.All(chart.AmmoniaEdges, e => Assert.InRange(e.Value, chart.AmmoniaRange.Low, chart.AmmoniaRange.High));
        Assert.InRange(chart.Now.Nh3NMgL, chart.AmmoniaRange.Low, chart.AmmoniaRange.High);
        Assert.Empty(chart.Strips);
    }

    [Fact]
    public void Of_Remedies_DrawsThoseThatLeadSomewhereAlongTheSlope()
    {
        PlaceSnapshot place = Tank().At(0, Water).Snapshot;

        Remedy air = Assert.Single(CornerChart.Of(place, [], Remedies(place)).Remedies);

        Assert.Equal("add-air", air.Id);
        Assert.Equal([0, 900, 3600, 21600], air.Path.Select(p => p.AfterS));
        double product = air.Path[0].Co2MgL.Value * air.Path[0].Nh3NMgL!.Value.Value;
        Assert.All(air.Path, p => Assert.Equal(1, p.Co2MgL.Value * p.Nh3NMgL!.Value.Value / product, 0.1));
    }

    [Fact]
    public void Of_History_IsATrailOfPairsOldestFirst()
    {
        StateValue[] history =
        [
            new(Farm.Start.AddHours(2), "co2", 12, 1), new(Farm.Start.AddHours(2), "nh3-n", 0.002, null),
            new(Farm.Start.AddHours(1), "nh3-n", 0.001, 0.0001), new(Farm.Start.AddHours(1), "co2", 20, 2),
            new(Farm.Start.AddHours(3), "co2", 11, 1), new(Farm.Start.AddHours(4), "nh3-n", 0.002, 0.0001), new(Farm.Start.AddHours(1), "ph", 7, 0.1),
        ];

        CornerChart chart = CornerChart.Of(Tank().At(0, Water).Snapshot, history, []);

        Assert.Equal([new CornerPoint(Farm.Start.AddHours(1), 20, 2, 0.001, 0.0001), new CornerPoint(Farm.Start.AddHours(2), 12, 1, 0.002, 0)], chart.Trail);
    }

    [Fact]
    public void Of_TanNotKnown_HasAStripForEachKnownLimitWithTheRoomAfterEachRemedy()
    {
        PlaceSnapshot place = Tank().At(0, ("ph", 6.6), ("temperature", 12), ("alkalinity", 1.0)).Snapshot;

        CornerChart chart = CornerChart.Of(place, [], Remedies(place));

        Assert.Null(chart.Now);
        Assert.DoesNotContain(chart.Strips, s => s.Limit.Quantity == "nh3-n");
        RoomStrip co2 = Assert.Single(chart.Strips, s => s.Limit is { Quantity: "co2", Value: 15 });
        Assert.Equal(15 - place.Water.Values["co2"].Value, co2.Room, 1e-9);
        Assert.True(co2.Room < 0);
        RoomAfter after = Assert.Single(co2.After);
        Assert.Equal(("add-air", 21600), (after.RemedyId, after.AfterS));
        Assert.True(after.Room > co2.Room);
        RoomStrip pHLow = Assert.Single(chart.Strips, s => s.Limit is { Quantity: "ph", Value: 6.5 });
        Assert.Equal(0.1, pHLow.Room, 1e-9);
        Assert.True(pHLow.After[0].Room > 0.1);
        Assert.Empty(chart.Strips.First(s => s.Limit.Quantity == "temperature").After);
    }

    [Fact]
    public void Of_NothingKnown_HasUsableRangesAndNoZero()
    {
        CornerChart chart = CornerChart.Of(Tank().Snapshot, [], []);

        Assert.Null(chart.Now);
        Assert.Empty(chart.Trail);
        Assert.Empty(chart.Strips);
        Assert.True(chart.Co2Range.Low > 0 && chart.AmmoniaRange.Low > 0);
    }

    private static Watch Tank() => new(Farm.Tank("salmonid") with { VolumeM3 = 9 });

    private static IReadOnlyList<Remedy> Remedies(PlaceSnapshot place) =>
        RemedyAdvisor.ForHighCo2(DoseAdvice.Problem(place, null, [], Farm.Start, 0), hasInjection: false);
}
