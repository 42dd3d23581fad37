using System.Text.Json;
using TankChem.TestKit;

namespace TankChem.EndToEnd.Tests.Processes;

/// <summary>The main job on the built program: readings in over MQTT from a client that we did not write, the water state out over HTTP.</summary>
public sealed class MainJobTests : IDisposable
{
    private const int Rows = 4;
    private static readonly TimeSpan Within = TimeSpan.FromSeconds(1);
    private readonly TemporaryFolder data = new();

    public void Dispose() => data.Dispose();

    [Fact]
    public async Task Run_EmbeddedBroker_ReferenceWatersComeOutOverHttpWithinASecond()
    {
        ReferenceWater[] waters = [.. ReferenceWater.Fresh(Rows), .. ReferenceWater.Sea(Rows)];
        await using ServiceProcess service = await ServiceProcess.StartAsync("run", data.FullName, "--config", Configuration(waters, ""));

        foreach (ReferenceWater water in waters)
            await CheckAsync(service, service.MqttPort, water);
    }

    [Fact]
    public async Task Run_OutsideBroker_ReferenceWatersComeOutOverHttpWithinASecond()
    {
        using var broker = new Mosquitto();
        ReferenceWater[] waters = [.. ReferenceWater.Fresh(Rows), .. ReferenceWater.Sea(Rows)];
        await using ServiceProcess service = await ServiceProcess.StartAsync("run", data.FullName, "--config", Configuration(waters, $$""", "mqtt": { "outside": { "host": "127.0.0.1", "port": {{broker.Port}} }, "embedded": { "port": 1883 } }"""));
        await Deadline.UntilAsync(
            TimeSpan.FromSeconds(20),
            async () =>
            {
                await Mosquitto.PublishAsync(broker.Port, "tankchem/in/mill-pond/hello/ph", "7");
                return await service.Http.GetStringAsync("/api/v1/places");
            },
            places => places.Contains("\"hello\"", StringComparison.Ordinal));

        foreach (ReferenceWater water in waters)
            await CheckAsync(service, broker.Port, water);
    }

    [Fact]
    public async Task Run_PlaceWithoutReadings_AnswersStatusNone()
    {
        await using ServiceProcess service = await ServiceProcess.StartAsync("run", data.FullName, "--config", Configuration([.. ReferenceWater.Fresh(1)], ""));

        using JsonDocument water = JsonDocument.Parse(await service.Http.GetStringAsync("/api/v1/places/mill-pond/fresh-0/water"));

        Assert.Equal("none", water.RootElement.GetProperty("status").GetString());
        Assert.Empty(water.RootElement.GetProperty("values").EnumerateObject());
    }

    private static async Task CheckAsync(ServiceProcess service, int port, ReferenceWater water)
    {
        foreach ((string quantity, string payload) in water.Readings)
            await Mosquitto.PublishAsync(port, $"tankchem/in/mill-pond/{water.Id}/{quantity}", payload);

        double co2 = await Deadline.UntilAsync(
            Within,
            async () =>
            {
                using JsonDocument body = JsonDocument.Parse(await service.Http.GetStringAsync($"/api/v1/places/mill-pond/{water.Id}/water"));
                return body.RootElement.GetProperty("values").TryGetProperty("co2", out JsonElement value) ? value.GetProperty("value").GetDouble() : double.NaN;
            },
            seen => !double.IsNaN(seen));

        Assert.True(Math.Abs(co2 / water.Co2MgL - 1) <= water.Relative, $"{water.Id}: CO2 is {co2} mg/L, the table says {water.Co2MgL} ({co2 / water.Co2MgL - 1:P3})");
    }

    private string Configuration(IEnumerable<ReferenceWater> waters, string more)
    {
        string file = data.File("config.json");
        File.WriteAllText(file, $$"""{ "sites": [ { "id": "mill-pond", "name": "Mill pond", "tanks": [ {{string.Join(", ", waters.Select(w => w.Configuration))}} ] } ]{{more}} }""");
        return file;
    }
}
