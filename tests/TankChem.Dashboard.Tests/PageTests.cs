using AngleSharp.Dom;
using Bunit;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Time.Testing;
using TankChem.Alarms;
using TankChem.Dashboard.Components.Layout;
using TankChem.Dashboard.Components.Pages;
using TankChem.Dashboard.Components.Parts;
using TankChem.Dashboard.Tests.Doubles;
using TankChem.Dosing;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Ports;
using static TankChem.Dashboard.Tests.Doubles.FakeFarm;

namespace TankChem.Dashboard.Tests;

public sealed class PageTests : IDisposable
{
    private readonly BunitContext page = new();
    private readonly FakeFarm farm = new();
    private readonly FakeOperations operations = new();
    private readonly FakeTimeProvider clock = new(Noon);

    public PageTests()
    {
        page.JSInterop.Mode = JSRuntimeMode.Loose;
        page.Services.AddSingleton<IFarm>(farm);
        page.Services.AddSingleton<IOperations>(operations);
        page.Services.AddSingleton<IHistory>(new EmptyHistory());
        page.Services.AddSingleton<TimeProvider>(clock);
    }

    public void Dispose() => page.Dispose();

    [Fact]
    public void Rounds_WorstFirst_WithWordShapeAndSentence()
    {
        farm.Put(Tank("a", "Calm tank", PlaceUrgency.Calm, "All is well"));
        farm.Put(Tank("b", "Bad tank", PlaceUrgency.Urgent, "CO2 is high"));

        IElement first = page.Render<RoundsPage>().FindAll(".rounds li")[0];

        Assert.Contains("Bad tank", first.TextContent, StringComparison.Ordinal);
        Assert.Contains("Urgent", first.QuerySelector(".urgency")!.TextContent, StringComparison.Ordinal);
        Assert.NotNull(first.QuerySelector("svg.shape"));
        Assert.Contains("CO2 is high", first.TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void Rounds_WhileSomebodyIsInTheList_KeepsItsOrder()
    {
        farm.Put(Tank("a", "First", PlaceUrgency.Warning, "look"));
        farm.Put(Tank("b", "Second", PlaceUrgency.Calm, "fine"));
        IRenderedComponent<RoundsPage> rounds = page.Render<RoundsPage>();
        rounds.Find(".rounds").TriggerEvent("onpointerenter", new Microsoft.AspNetCore.Components.Web.PointerEventArgs());

        farm.Put(Tank("b", "Second", PlaceUrgency.Critical, "danger"));
        clock.Advance(TimeSpan.FromSeconds(1));
        rounds.WaitForState(() => rounds.Markup.Contains("danger", StringComparison.Ordinal));

        Assert.Contains("First", rounds.FindAll(".rounds li")[0].TextContent, StringComparison.Ordinal);
        rounds.Find(".rounds").TriggerEvent("onpointerleave", new Microsoft.AspNetCore.Components.Web.PointerEventArgs());
        farm.Version++;
        clock.Advance(TimeSpan.FromSeconds(1));
        rounds.WaitForState(() => rounds.FindAll(".rounds li")[0].TextContent.Contains("Second", StringComparison.Ordinal));
    }

    [Fact]
    public void Rounds_EmptyFarm_SaysHowToConnectAProbe() => Assert.Contains("mosquitto_pub", page.Render<RoundsPage>().Markup, StringComparison.Ordinal);

    [Fact]
    public void Acknowledge_EachButton_NamesThePlace()
    {
        PlaceSnapshot tank = Tank("a", "Grow-out 1", PlaceUrgency.Urgent, "CO2 is high");
        farm.Put(tank with { Alarms = [Alarm(tank)] });
        IRenderedComponent<RoundsPage> rounds = page.Render<RoundsPage>();

        rounds.Find("button.primary").Click();

        Assert.All(rounds.FindAll("button.primary"), b => Assert.Contains("Grow-out 1", b.TextContent, StringComparison.Ordinal));
        rounds.Find("input[autocomplete=name]").Input("Ada");
        rounds.Find("form").Submit();
        AlarmCommand command = Assert.IsType<AlarmCommand>(Assert.Single(operations.Asked));
        Assert.Equal((AlarmAction.Acknowledge, "Ada"), (command.Action, command.Who));
    }

    [Fact]
    public void Now_ValueUncertaintyUnitAndAge_StandTogether()
    {
        PlaceSnapshot tank = Tank("a", "Grow-out 1", PlaceUrgency.Calm, "fine", ("co2", Value(11.84, "mg/L", 1.62, TimeSpan.FromMinutes(2))), ("co2-air", Value(0.7, "mg/L", 0.02, TimeSpan.Zero)));

        string row = page.Render<NowView>(p => p.Add(v => v.Place, tank).Add(v => v.Now, Noon)).Find("tbody tr").TextContent;

        Assert.Contains("11.8 ± 1.6 mg/L", row, StringComparison.Ordinal);
        Assert.Contains("2 min ago", row, StringComparison.Ordinal);
        Assert.Contains("with this air 0.70", row, StringComparison.Ordinal);
    }

    [Fact]
    public void Now_StaleValue_LooksStaleAndSaysWhenItWasLastKnown()
    {
        PlaceSnapshot tank = Tank("a", "Grow-out 1", PlaceUrgency.Doubt, "?", ("alkalinity", Value(2, "mmol/L", 0.4, TimeSpan.FromHours(3), stale: true)));

        IElement row = page.Render<NowView>(p => p.Add(v => v.Place, tank).Add(v => v.Now, Noon)).Find("tbody tr");

        Assert.Contains("stale", row.ClassName, StringComparison.Ordinal);
        Assert.Contains("last known 09:00", row.TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void Now_WithoutAReading_SaysSoAndShowsNoZero()
    {
        string markup = page.Render<NowView>(p => p.Add(v => v.Place, Tank("a", "Grow-out 1", PlaceUrgency.Unknown, "?")).Add(v => v.Now, Noon)).Markup;

        Assert.Contains("no reading yet", markup, StringComparison.Ordinal);
        Assert.DoesNotContain("class=\"number\"", markup, StringComparison.Ordinal);
    }

    [Fact]
    public void UnitNotConfirmed_ShowsWhatTheNumberWouldMeanAndConfirmsInOneClick()
    {
        PlaceSnapshot tank = Tank("a", "Grow-out 1", PlaceUrgency.Doubt, "?");
        IRenderedComponent<NowView> now = page.Render<NowView>(p => p.Add(v => v.Place, tank with { Latest = [Bare(tank, "alkalinity", 5)] }).Add(v => v.Now, Noon));

        IElement button = now.FindAll("button").Single(b => b.TextContent.Contains("dKH", StringComparison.Ordinal));
        Assert.Contains("1.78 mmol/L", button.TextContent, StringComparison.Ordinal);
        button.Click();

        Assert.Contains("dKH", Assert.Single(operations.Asked).ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void Log_TypedNumber_GoesOnAsTypedInTheTanksOwnUnit()
    {
        IRenderedComponent<LogView> log = page.Render<LogView>(p => p.Add(v => v.Place, Tank("a", "Grow-out 1", PlaceUrgency.Calm, "fine")));

        log.FindAll("input[inputmode=decimal]")[0].Change("7,2");
        log.FindAll("form")[0].Submit();

        Assert.StartsWith("(alkalinity, 7,2, dKH", Assert.Single(operations.Asked).ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void Log_FaultOfAField_StandsBesideItAndNothingTypedIsLost()
    {
        operations.Answer = new OperationResult(false, "\"seven\" is not a number", "value");
        IRenderedComponent<LogView> log = page.Render<LogView>(p => p.Add(v => v.Place, Tank("a", "Grow-out 1", PlaceUrgency.Calm, "fine")));

        log.FindAll("input[inputmode=decimal]")[0].Change("seven");
        log.FindAll("form")[0].Submit();

        IElement field = log.FindAll("input[inputmode=decimal]")[0];
        Assert.Equal("seven", field.GetAttribute("value"));
        Assert.Contains("is not a number", field.ParentElement!.TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void Plan_Refused_ShowsGroundsAndTheNearestThatIsAllowed()
    {
        var plan = new DosePlan
        {
            Allowed = false,
            Grounds = [new DoseGround("input", "tan", "Total ammonia is not known: test TAN first.", null)],
            Steps = [],
            Reasons = [],
            Cautions = ["a competent person decides"],
            Nearest = "Allowed would be 84 g",
        };

        IRenderedComponent<PlanCard> card = page.Render<PlanCard>(p => p.Add(c => c.Plan, plan).Add(c => c.PlaceName, "Grow-out 1"));

        Assert.Contains("Refused for Grow-out 1", card.Markup, StringComparison.Ordinal);
        Assert.Contains("test TAN first", card.Markup, StringComparison.Ordinal);
        Assert.Contains("Allowed would be 84 g", card.Markup, StringComparison.Ordinal);
    }

    [Fact]
    public void EveryPage_OfADemo_SaysSo_AndShowsTheServicesTrouble()
    {
        farm.IsDemo = true;
        farm.Troubles.Add("The disk is full");

        string notices = page.Render<ServiceNotices>().Markup;

        Assert.Contains("simulated water", notices, StringComparison.Ordinal);
        Assert.Contains("The disk is full", notices, StringComparison.Ordinal);
    }
}
