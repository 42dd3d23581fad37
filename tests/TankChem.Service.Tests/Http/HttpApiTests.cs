using System.Globalization;
using System.Net;
using System.Text;
using System.Text.Json;
using TankChem.TestKit;

namespace TankChem.Service.Tests.Http;

/// <summary>The routes of docs/api.md on the built program with the demo's month behind it.</summary>
public sealed class HttpApiTests(HttpApiTests.DemoService demo) : IClassFixture<HttpApiTests.DemoService>
{
    private HttpClient Http => demo.Service.Http;

    [Fact]
    public async Task Places_AllOfThem_WithWorstAlarmAndWater()
    {
        JsonElement places = await GetAsync("/api/v1/places");
        JsonElement raceway = places.EnumerateArray().Single(p => p.GetProperty("id").GetString() == "raceway-c");

        Assert.True(places.GetArrayLength() >= 8);
        Assert.Equal("alkalinity-low", raceway.GetProperty("worstAlarm").GetProperty("rule").GetString());
        Assert.Equal("mg/L", raceway.GetProperty("water").GetProperty("values").GetProperty("co2").GetProperty("unit").GetString());
        Assert.False(places.EnumerateArray().Single(p => p.GetProperty("id").GetString() == "bench-trial").GetProperty("assigned").GetBoolean());
    }

    [Theory]
    [InlineData("ph")]
    [InlineData("co2")]
    public async Task Trend_AWeek_HasAtMostTheBucketsAskedFor(string quantity)
    {
        DateTimeOffset to = TimeProvider.System.GetUtcNow(), from = to.AddDays(-7);

        JsonElement trend = await GetAsync($"/api/v1/places/osier-reach/north-1/trend?quantity={quantity}&from={Text(from)}&to={Text(to)}&points=100");

        JsonElement[] buckets = [.. trend.GetProperty("buckets").EnumerateArray()];
        Assert.InRange(buckets.Length, 90, 100);
        Assert.All(buckets, b => Assert.True(b.GetProperty("min").GetDouble() <= b.GetProperty("mean").GetDouble() && b.GetProperty("mean").GetDouble() <= b.GetProperty("max").GetDouble()));
    }

    [Fact]
    public async Task Readings_PageByPage_NoneTwice()
    {
        DateTimeOffset to = TimeProvider.System.GetUtcNow().AddHours(-1), from = to.AddHours(-10);
        string? next = $"/api/v1/places/osier-reach/north-1/readings?quantity=ph&from={Text(from)}&to={Text(to)}&limit=50";
        var times = new List<string>();
        while (next is not null)
        {
            JsonElement page = await GetAsync(next);
            times.AddRange(page.GetProperty("readings").EnumerateArray().Select(r => r.GetProperty("time").GetString()!));
            next = page.GetProperty("next").GetString();
        }

        Assert.InRange(times.Count, 100, 130);
        Assert.Equal(times.Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal), times);
    }

    [Fact]
    public async Task DosePlan_AllowedAndRefused_AreBoth200()
    {
        JsonElement allowed = await PostAsync("/api/v1/places/osier-reach/raceway-c/dose-plan", """{"target":{"quantity":"alkalinity","value":1.1,"unit":"mmol/L"},"reagents":["sodium-bicarbonate"]}""", HttpStatusCode.OK);
        JsonElement refused = await PostAsync("/api/v1/places/osier-reach/raceway-c/dose-plan", """{"target":{"quantity":"alkalinity","value":0.1,"unit":"mmol/L"}}""", HttpStatusCode.OK);

        Assert.True(allowed.GetProperty("allowed").GetBoolean());
        Assert.Equal("g", allowed.GetProperty("steps")[0].GetProperty("amount").GetProperty("unit").GetString());
        Assert.True(allowed.GetProperty("steps")[0].GetProperty("closed").GetProperty("ph").GetProperty("value").GetDouble() > 5);
        Assert.NotEmpty(allowed.GetProperty("cautions").EnumerateArray());
        Assert.False(refused.GetProperty("allowed").GetBoolean());
        Assert.Equal("alkalinity", refused.GetProperty("grounds")[0].GetProperty("quantity").GetString());
    }

    [Fact]
    public async Task AlarmCommand_WithoutWho_IsRefusedWithWho_IsTaken()
    {
        const string path = "/api/v1/alarms/osier-reach/raceway-c/alkalinity-low";
        await PostAsync(path, """{"action":"acknowledge"}""", HttpStatusCode.BadRequest);
        await PostAsync("/api/v1/alarms/osier-reach/raceway-c/no-such-rule", """{"action":"acknowledge","who":"Ada"}""", HttpStatusCode.Conflict);

        JsonElement taken = await PostAsync(path, """{"action":"acknowledge","who":"Ada","reason":"dosing"}""", HttpStatusCode.OK);

        Assert.Equal("acknowledged", taken.GetProperty("state").GetString());
        Assert.Contains((await GetAsync("/api/v1/alarms?state=acknowledged")).EnumerateArray(), a => a.GetProperty("rule").GetString() == "alkalinity-low");
    }

    [Theory]
    [InlineData("/api/v1/places/osier-reach/nowhere/water", 404)]
    [InlineData("/api/v1/places/osier-reach/north-1/trend", 400)]
    [InlineData("/api/v1/places/osier-reach/north-1/trend?quantity=PH", 400)]
    [InlineData("/api/v1/places/osier-reach/north-1/trend?quantity=ph&from=yesterday", 400)]
    [InlineData("/api/v1/places/osier-reach/north-1/trend?quantity=ph&points=0", 400)]
    [InlineData("/api/v1/places/osier-reach/north-1/readings?quantity=ph&after=x", 400)]
    [InlineData("/api/v1/alarms?state=loud", 400)]
    public async Task WrongQuestion_IsAProblemInWords(string path, int status)
    {
        using HttpResponseMessage answer = await Http.GetAsync(path);

        Assert.Equal(status, (int)answer.StatusCode);
        Assert.Equal("application/problem+json", answer.Content.Headers.ContentType?.MediaType);
        using JsonDocument problem = JsonDocument.Parse(await answer.Content.ReadAsStringAsync());
        Assert.NotEmpty(problem.RootElement.GetProperty("detail").GetString()!);
    }

    [Fact]
    public async Task ChangingRequest_FromAnotherOriginOrNotJson_IsRefused()
    {
        const string path = "/api/v1/alarms/osier-reach/shrimp-4/ph-silent";
        using var foreign = new HttpRequestMessage(HttpMethod.Post, path) { Content = new StringContent("{}", Encoding.UTF8, "application/json") };
        foreign.Headers.Add("Origin", "http://elsewhere.example");
        using var text = new HttpRequestMessage(HttpMethod.Post, path) { Content = new StringContent("{}", Encoding.UTF8, "text/plain") };
        using var host = new HttpRequestMessage(HttpMethod.Get, "/api/v1/places");
        host.Headers.Host = "rebound.example";

        Assert.Equal(HttpStatusCode.Forbidden, (await Http.SendAsync(foreign)).StatusCode);
        Assert.Equal(HttpStatusCode.UnsupportedMediaType, (await Http.SendAsync(text)).StatusCode);
        Assert.Equal(HttpStatusCode.MisdirectedRequest, (await Http.SendAsync(host)).StatusCode);
    }

    [Fact]
    public async Task HealthMetricsAndDescription_Answer()
    {
        Assert.Equal("live", (await GetAsync("/health/live")).GetProperty("status").GetString());
        Assert.Equal("ready", (await GetAsync("/health/ready")).GetProperty("status").GetString());
        Assert.Contains("tankchem_readings_taken_total", await Http.GetStringAsync("/metrics"), StringComparison.Ordinal);
        Assert.True((await GetAsync("/openapi/v1.json")).GetProperty("paths").TryGetProperty("/api/v1/places/{site}/{place}/water", out _));
    }

    private static string Text(DateTimeOffset time) => time.UtcDateTime.ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture);

    private async Task<JsonElement> GetAsync(string path)
    {
        using JsonDocument body = JsonDocument.Parse(await Http.GetStringAsync(path));
        return body.RootElement.Clone();
    }

    private async Task<JsonElement> PostAsync(string path, string json, HttpStatusCode expected)
    {
        using HttpResponseMessage answer = await Http.PostAsync(path, new StringContent(json, Encoding.UTF8, "application/json"));
        string text = await answer.Content.ReadAsStringAsync();
        Assert.True(expected == answer.StatusCode, $"{answer.StatusCode}: {text}");
        using JsonDocument body = JsonDocument.Parse(text);
        return body.RootElement.Clone();
    }

    /// <summary>One demo for all of them.</summary>
    public sealed class DemoService : IAsyncLifetime
    {
        private readonly TemporaryFolder data = new();

        private ServiceProcess? started;

        public ServiceProcess Service => started ?? throw new InvalidOperationException("The demo did not start.");

        public async ValueTask InitializeAsync() => started = await ServiceProcess.StartAsync("demo", data.FullName);

        public async ValueTask DisposeAsync()
        {
            if (started is not null)
                await started.DisposeAsync();
            data.Dispose();
        }
    }
}
