using TankChem.Monitoring.Configuration;
using TankChem.Monitoring.Places;
using TankChem.TestKit;

namespace TankChem.Monitoring.Tests.Configuration;

public class ConfigurationReaderTests
{
    public static TheoryData<string> Samples => [.. Directory.GetFiles(Path.Combine(Repository.Root, "config", "samples"), "*.json").Select(f => Path.GetFileName(f))];

    [Theory]
    [MemberData(nameof(Samples))]
    public void Read_EachSample_HasNeitherFaultsNorWarnings(string file)
    {
        ConfigurationResult result = ConfigurationReader.Read(File.ReadAllText(Path.Combine(Repository.Root, "config", "samples", file)));

        Assert.Empty(result.Faults);
        Assert.Empty(result.Warnings);
        Assert.NotEmpty(result.Configuration!.Sites);
    }

    [Fact]
    public void Read_Tank_TakesVolumeIonsStockAndUnits()
    {
        PlaceDefinition tank = ReadTank("""
            { "id": "tank-1", "volume": "310 L", "salinity": 0.2, "stock": ["salmonid", "planted"], "ions": { "calcium": "42 mg/L" },
              "gasHours": { "start": "09:00", "end": "17:30" }, "co2Injection": true,
              "probes": [ { "quantity": "alkalinity", "unit": "dKH", "oldestUsed": "3 d" } ] }
            """);

        Assert.Equal(0.31, tank.VolumeM3!.Value, 1e-12);
        Assert.Equal(42, tank.Ions!.CalciumMgL);
        Assert.Equal(["salmonid", "planted"], tank.Stock);
        Assert.Equal(new DailyHours(new TimeOnly(9, 0), new TimeOnly(17, 30)), tank.GasHours);
        Assert.Equal(("dKH", TimeSpan.FromDays(3)), (tank.Probes[0].Unit, tank.Probes[0].OldestUsed));
    }

    [Fact]
    public void Read_ManyFaults_FindsAllAtOnceWithTheirPaths()
    {
        ConfigurationResult result = ConfigurationReader.Read("""
            { "sites": [ { "id": "Farm A", "tanks": [] },
                         { "id": "b", "tanks": [ { "id": "t", "volum": "9 m3", "volume": "9 cubits", "stock": ["tuna"], "loop": "nowhere" }, { "id": "t", "stock": "reef" } ] } ],
              "http": { "url": "http://0.0.0.0:5080" },
              "mqtt": { "embedded": { "port": 70000 } },
              "storag": {} }
            """);

        Assert.Null(result.Configuration);
        Assert.Superset(
            new HashSet<string>
            {
                "$.sites[0].id", "$.sites[1].tanks[0].volum", "$.sites[1].tanks[0].volume", "$.sites[1].tanks[0].stock[0]", "$.sites[1].tanks[0].loop",
                "$.sites[1].tanks[1].id", "$.http.url", "$.mqtt.embedded.port", "$.storag",
            },
            result.Faults.Select(f => f.Path).ToHashSet(StringComparer.Ordinal));
        Assert.Contains("volume", result.Faults.Single(f => f.Path == "$.sites[1].tanks[0].volum").Text, StringComparison.Ordinal);
        Assert.Contains("no sign-in", result.Faults.Single(f => f.Path == "$.http.url").Text, StringComparison.Ordinal);
    }

    [Fact]
    public void Read_LoopSmallerThanItsTanks_IsAWarning()
    {
        ConfigurationResult result = ConfigurationReader.Read("""
            { "sites": [ { "id": "a", "loops": [ { "id": "l", "volume": "10 m3" } ],
              "tanks": [ { "id": "t", "loop": "l", "volume": "6 m3", "stock": "salmonid" }, { "id": "u", "loop": "l", "volume": "6 m3", "stock": "salmonid" } ] } ] }
            """);

        Assert.NotNull(result.Configuration);
        Assert.Equal("$.sites[0].loops[0].volume", Assert.Single(result.Warnings).Path);
    }

    [Theory]
    [InlineData("{", "line 1")]
    [InlineData("[]", "must be an object")]
    [InlineData("""{ "sites": [], "sites": [] }""", "twice")]
    [InlineData("""{ "sites": [ { "id": "site" } ] }""", "reserved")]
    [InlineData("""{ "sites": [ { "id": "a", "elevationM": "high" } ] }""", "must be a number")]
    [InlineData("""{ "sites": [ { "id": "a", "timeZone": "Mars/Base" } ] }""", "time zone")]
    [InlineData("""{ "mqtt": { "mappings": [ { "topic": "tankchem/in/x", "site": "a", "place": "b", "quantity": "ph" } ] } }""", "not mapped")]
    [InlineData("""{ "mqtt": { "outside": { } } }""", "missing")]
    public void Read_OneFault_SaysWhatWouldBeRight(string json, string words)
    {
        ConfigurationResult result = ConfigurationReader.Read(json);

        Assert.Null(result.Configuration);
        Assert.Contains(result.Faults, f => f.Text.Contains(words, StringComparison.Ordinal));
    }

    [Fact]
    public void Document_NamesEveryKeyOfTheCode()
    {
        string source = string.Concat(Directory.GetFiles(Path.Combine(Repository.Root, "src", "TankChem.Monitoring", "Configuration"), "*.cs").Select(File.ReadAllText));
        string document = File.ReadAllText(Path.Combine(Repository.Root, "docs", "configuration.md"));
        var keys = System.Text.RegularExpressions.Regex.Matches(source, "(?:Text|Number|Flag|Items|Element|Has)\\(\"(?<key>[a-zA-Z0-9]+)\"", System.Text.RegularExpressions.RegexOptions.ExplicitCapture, TimeSpan.FromSeconds(5)).Select(m => m.Groups["key"].Value).Distinct();

        Assert.All(keys, key => Assert.Contains(key, document, StringComparison.Ordinal));
    }

    private static PlaceDefinition ReadTank(string tank)
    {
        ConfigurationResult result = ConfigurationReader.Read($$"""{ "sites": [ { "id": "a", "tanks": [ {{tank}} ] } ] }""");
        Assert.Empty(result.Faults);
        return result.Configuration!.Sites[0].Places[0];
    }
}
