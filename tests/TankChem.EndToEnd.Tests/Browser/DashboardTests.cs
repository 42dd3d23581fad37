using System.Text.Json;
using System.Text.RegularExpressions;
using Deque.AxeCore.Commons;
using Deque.AxeCore.Playwright;
using Microsoft.Playwright;
using TankChem.TestKit;
using static Microsoft.Playwright.Assertions;

namespace TankChem.EndToEnd.Tests.Browser;

/// <summary>The demo's pages in a real browser, at a desk and on a phone.</summary>
public sealed partial class DashboardTests(DemoInBrowser demo) : IClassFixture<DemoInBrowser>
{
    private const string Raceway = "/place/osier-reach/raceway-c";
    private const string Salmonids = "/place/osier-reach/north-1";

    public static TheoryData<string> Pages => [.. new[] { "/", Salmonids, $"{Salmonids}?view=next", $"{Raceway}?view=act", $"{Raceway}?view=log", "/alarms", "/losses", "/losses/1", "/probes", "/setup", "/setup?site=osier-reach&place=bench-trial" }];

    [Theory]
    [MemberData(nameof(Pages))]
    public async Task EachPage_DeskAndPhone_FitsHasNoSeriousFaultAndSaysThatItIsADemo(string path)
    {
        foreach (bool phone in new[] { false, true })
        {
            IPage page = await demo.OpenAsync(path, phone);
            await Expect(page.GetByText("Invented site, simulated water.")).ToBeVisibleAsync();
            await Expect(page.Locator("h1")).ToBeVisibleAsync();
            await Expect(page.GetByText("Reading…", new PageGetByTextOptions { Exact = true })).ToHaveCountAsync(0);

            int over = await page.EvaluateAsync<int>("() => document.documentElement.scrollWidth - window.innerWidth");
            AxeResult axe = await page.RunAxe();

            Assert.True(over <= 0, $"{path} is {over} px wider than the {(phone ? "phone" : "screen")}");
            Assert.DoesNotContain(axe.Violations.Select(v => $"{v.Id} ({v.Impact}): {string.Join(" ", v.Nodes.Select(n => n.Html))}"), v => v.Contains("(serious)", StringComparison.Ordinal) || v.Contains("(critical)", StringComparison.Ordinal));
            await SaveAsync(page, path, phone);
            await page.Context.CloseAsync();
        }

        Assert.Empty(demo.Errors);
    }

    [Fact]
    public async Task Rounds_WorstFirst_EachPlaceInOneSentence()
    {
        IPage page = await demo.OpenAsync("/");

        await Expect(page.Locator(".rounds li").First).ToContainTextAsync("Warm raceway");
        await Expect(page.Locator(".rounds li").First).ToContainTextAsync("Alkalinity is low");
        await Expect(page.Locator(".rounds li", new PageLocatorOptions { HasText = "Shrimp 4" })).ToContainTextAsync("Nothing heard from the pH probe");
        await Expect(page.Locator(".rounds li", new PageLocatorOptions { HasText = "bench-trial" })).ToContainTextAsync("Not set up yet");
        await page.Context.CloseAsync();
    }

    [Fact]
    public async Task Acknowledge_OnThePhone_AsksWhoAndIsRecorded()
    {
        IPage page = await demo.OpenAsync("/", phone: true);
        ILocator row = page.Locator(".rounds li", new PageLocatorOptions { HasText = "Shrimp 4" });

        await row.GetByRole(AriaRole.Button, new() { Name = "Acknowledge Shrimp 4" }).ClickAsync();
        await row.Locator("button[type=submit]").ClickAsync();
        await Expect(row).ToContainTextAsync("Say who you are");
        await row.GetByLabel("Who").FillAsync("Mara");
        await row.GetByLabel("Why").FillAsync("probe is in the bucket");
        await row.Locator("button[type=submit]").ClickAsync();

        await Expect(row.GetByRole(AriaRole.Button, new() { Name = "Acknowledge Shrimp 4" })).ToHaveCountAsync(0);
        using JsonDocument alarms = JsonDocument.Parse(await demo.Http.GetStringAsync("/api/v1/alarms?state=acknowledged"));
        JsonElement alarm = alarms.RootElement.EnumerateArray().Single(a => a.GetProperty("place").GetString() == "shrimp-4" && a.GetProperty("rule").GetString() == "ph-silent");
        Assert.Equal("Mara", alarm.GetProperty("acknowledged").GetProperty("by").GetString());
        Assert.False(alarm.GetProperty("acknowledged").GetProperty("verified").GetBoolean());
        await page.Context.CloseAsync();
    }

    [Fact]
    public async Task Titration_WithADecimalComma_IsTakenInTheTanksOwnUnit()
    {
        IPage page = await demo.OpenAsync("/place/osier-reach/foyer-scape?view=log");
        ILocator form = page.Locator("section", new PageLocatorOptions { HasText = "Measured by hand" }).First;

        await form.GetByLabel("Number").FillAsync("four");
        await form.GetByLabel("Who").FillAsync("Mara");
        await form.GetByRole(AriaRole.Button, new() { Name = "Record for Foyer scape" }).ClickAsync();
        await Expect(form).ToContainTextAsync("right would be like");
        await form.GetByLabel("Number").FillAsync("4,2");
        await form.GetByRole(AriaRole.Button, new() { Name = "Record for Foyer scape" }).ClickAsync();
        await Expect(form).ToContainTextAsync("Recorded.");

        await Expect(page.Locator(".log").First).ToContainTextAsync("4,2 dKH");
        using JsonDocument water = JsonDocument.Parse(await demo.Http.GetStringAsync("/api/v1/places/osier-reach/foyer-scape/water"));
        Assert.Equal(4.2 * 0.35665, water.RootElement.GetProperty("values").GetProperty("alkalinity").GetProperty("value").GetDouble(), 1e-3);
        await page.Context.CloseAsync();
    }

    [Fact]
    public async Task DosePlan_ForTheRaceway_ShowsPortionsAndCautions()
    {
        IPage page = await demo.OpenAsync($"{Raceway}?view=act");

        await page.GetByLabel("To", new PageGetByLabelOptions { Exact = true }).FillAsync("55");
        await page.GetByRole(AriaRole.Button, new() { Name = "Plan for Warm raceway" }).ClickAsync();

        await Expect(page.Locator(".plan.allowed")).ToContainTextAsync("sodium bicarbonate");
        await Expect(page.Locator(".plan.allowed")).ToContainTextAsync("a competent person decide");
        await Expect(page.Locator(".plan.allowed tbody tr").First).ToContainTextAsync("pH");
        await page.Context.CloseAsync();
    }

    [Fact]
    public async Task DosePlan_TargetBelowToday_IsRefusedWithTheReason()
    {
        IPage page = await demo.OpenAsync($"{Raceway}?view=act", phone: true);

        await page.GetByLabel("To", new PageGetByLabelOptions { Exact = true }).FillAsync("10");
        await page.GetByRole(AriaRole.Button, new() { Name = "Plan for Warm raceway" }).ClickAsync();

        await Expect(page.Locator(".plan.refused")).ToContainTextAsync("a base cannot lower it");
        await page.Context.CloseAsync();
    }

    [Fact]
    public async Task LossReview_OfTheStuckValve_TellsTheStoryInOrder()
    {
        IPage page = await demo.OpenAsync("/losses");
        await page.GetByRole(AriaRole.Link, new() { Name = "Review Foyer scape" }).ClickAsync();

        await Expect(page.Locator("h1")).ToHaveTextAsync(new Regex("Loss review: Foyer scape", RegexOptions.None, TimeSpan.FromSeconds(1)));
        string[] facts = [.. await page.Locator(".facts li").AllInnerTextsAsync()];
        int raised = Array.FindIndex(facts, f => f.Contains("CO2 is high", StringComparison.Ordinal));
        int acknowledged = Array.FindIndex(facts, f => f.Contains("acknowledged", StringComparison.Ordinal));
        int found = Array.FindIndex(facts, f => f.Contains("Found:", StringComparison.Ordinal));
        Assert.True(raised >= 0 && raised < acknowledged && acknowledged < found, string.Join('\n', facts));
        await page.Context.CloseAsync();
    }

    /// <summary>Pictures for the documents, when somebody asks for them: TANKCHEM_PICTURES=docs/images.</summary>
    private static async Task SaveAsync(IPage page, string path, bool phone)
    {
        if (Environment.GetEnvironmentVariable("TANKCHEM_PICTURES") is not { Length: > 0 } folder)
            return;
        string? name = path switch
        {
            "/" => "rounds",
            Salmonids => "place",
            "/losses/1" => "loss",
            $"{Salmonids}?view=next" => "next",
            _ => null,
        };
        if (name is null)
            return;
        await page.WaitForTimeoutAsync(1_500);
        await page.ScreenshotAsync(new PageScreenshotOptions { Path = Path.Combine(Repository.Root, folder, $"{name}-{(phone ? "phone" : "desktop")}.png") });
    }
}
