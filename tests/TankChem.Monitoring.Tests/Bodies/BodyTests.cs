using System.Text;
using System.Text.Json;
using TankChem.Alarms;
using TankChem.Dosing;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Bodies;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Tests.Bodies;

public class BodyTests
{
    private static readonly DateTimeOffset Now = new(2026, 5, 1, 10, 0, 5, TimeSpan.Zero);
    private static readonly PlaceKey Tank = new("north-quay", "tank-1");

    [Fact]
    public void WaterBody_OfAState_IsTheDocumentedShape()
    {
        var state = new WaterState
        {
            Place = Tank,
            Kind = PlaceKind.Tank,
            Assigned = true,
            Time = Now,
            Status = WaterStatus.Ok,
            Reason = null,
            Values = new Dictionary<string, WaterValue>(StringComparer.Ordinal)
            {
                ["co2"] = new()
                {
                    Value = 11.8,
                    Unit = "mg/L",
                    U = 1.6,
                    Time = Now,
                    Inputs = [new WaterInput("ph", "main", Tank, Now.AddMilliseconds(-250), 0.25)],
                    Caveats = ["ions not known"],
                },
            },
        };

        Assert.Equal(
            """{"site":"north-quay","place":"tank-1","kind":"tank","assigned":true,"time":"2026-05-01T10:00:05Z","status":"ok","reason":null,"values":{"co2":{"value":11.8,"unit":"mg/L","u":1.6,"time":"2026-05-01T10:00:05Z","inputs":[{"quantity":"ph","probe":"main","place":"tank-1","time":"2026-05-01T10:00:04.75Z","ageS":0.25}],"caveats":["ions not known"]}}}""",
            Encoding.UTF8.GetString(WaterBody.ToUtf8(state, isDemo: false)));
    }

    [Fact]
    public void WaterBody_OfAPlaceWithoutReadings_HasNoTimeAndNoValues()
    {
        var state = new WaterState { Place = Tank, Kind = PlaceKind.Tank, Assigned = true, Time = null, Status = WaterStatus.None, Reason = "no reading yet", Values = new Dictionary<string, WaterValue>(StringComparer.Ordinal) };
        using JsonDocument body = JsonDocument.Parse(WaterBody.ToUtf8(state, isDemo: true));

        Assert.Equal(("none", JsonValueKind.Null, true), (body.RootElement.GetProperty("status").GetString(), body.RootElement.GetProperty("time").ValueKind, body.RootElement.GetProperty("demo").GetBoolean()));
    }

    [Fact]
    public void AlarmCommandBody_Complete_IsRead()
    {
        Assert.True(AlarmCommandBody.TryParse("""{"action":"shelve","who":"Ada","reason":"cleaning","until":"2026-05-01T11:00:00Z"}"""u8.ToArray(), new AlarmKey(Tank, "co2-high"), out AlarmCommand? command, out _));
        Assert.Equal(new AlarmCommand(new AlarmKey(Tank, "co2-high"), AlarmAction.Shelve, "Ada", "cleaning", new DateTimeOffset(2026, 5, 1, 11, 0, 0, TimeSpan.Zero)), command);
    }

    [Theory]
    [InlineData("", "not JSON")]
    [InlineData("[]", "object")]
    [InlineData("""{"action":"hush","who":"Ada"}""", "acknowledge, shelve")]
    [InlineData("""{"action":"acknowledge"}""", "who")]
    [InlineData("""{"action":"acknowledge","who":" "}""", "who")]
    [InlineData("""{"action":"acknowledge","who":7}""", "who")]
    [InlineData("""{"action":"acknowledge","who":"Ada","who":"Bob"}""", "twice")]
    [InlineData("""{"action":"acknowledge","who":"Ada","why":"x"}""", "why")]
    [InlineData("""{"action":"shelve","who":"Ada","until":"tomorrow"}""", "RFC 3339")]
    public void AlarmCommandBody_Wrong_SaysWhatWouldBeRight(string json, string words)
    {
        Assert.False(AlarmCommandBody.TryParse(Encoding.UTF8.GetBytes(json), new AlarmKey(Tank, "co2-high"), out _, out string? fault));
        Assert.Contains(words, fault, StringComparison.Ordinal);
    }

    [Fact]
    public void DosePlanBody_TargetInATradeUnit_IsCanonical()
    {
        Assert.True(DosePlanBody.TryParse("""{"target":{"quantity":"alkalinity","value":7,"unit":"dKH"},"reagents":["sodium-bicarbonate"]}"""u8.ToArray(), out DoseTarget? target, out IReadOnlyList<string> reagents, out _));
        Assert.Equal("alkalinity", target!.Quantity);
        Assert.Equal(2.4965, target.Value, 1e-4);
        Assert.Equal(["sodium-bicarbonate"], reagents);
    }

    [Theory]
    [InlineData("{}", "target")]
    [InlineData("""{"target":{"quantity":"alkalinity","value":"2","unit":"mmol/L"}}""", "target.value")]
    [InlineData("""{"target":{"quantity":"alkalinity","value":2}}""", "target.unit")]
    [InlineData("""{"target":{"quantity":"alkalinity","value":2,"unit":"stone"}}""", "right would be")]
    [InlineData("""{"target":{"quantity":"alkalinity","value":2,"unit":"mmol/L"},"reagents":"soda"}""", "reagents")]
    public void DosePlanBody_Wrong_SaysWhatWouldBeRight(string json, string words)
    {
        Assert.False(DosePlanBody.TryParse(Encoding.UTF8.GetBytes(json), out _, out _, out string? fault));
        Assert.Contains(words, fault, StringComparison.Ordinal);
    }
}
