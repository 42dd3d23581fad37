using System.Collections.Concurrent;
using System.Globalization;
using System.Text;
using System.Text.Json;
using MQTTnet;
using MQTTnet.Protocol;
using TankChem.TestKit;

namespace TankChem.EndToEnd.Tests.Processes;

public sealed class PowerCutTests : IDisposable
{
    private const int Clients = 50;
    private const int AcknowledgedBeforeTheCut = 1_500;
    private static readonly DateTimeOffset First = new(2026, 5, 1, 0, 0, 0, TimeSpan.Zero);
    private readonly TemporaryFolder data = new();
    private readonly ConcurrentDictionary<(int Client, DateTimeOffset Time), double> acknowledged = new();

    public void Dispose() => data.Dispose();

    [Fact]
    public async Task KillWhileFiftyClientsPublish_EveryAcknowledgedReadingIsThereOnce()
    {
        await using (ServiceProcess first = await ServiceProcess.StartAsync("run", data.FullName))
        {
            Task[] clients = [.. Enumerable.Range(0, Clients).Select(c => PublishUntilCutAsync(first.MqttPort, c))];
            await Deadline.UntilAsync(TimeSpan.FromSeconds(30), () => Task.FromResult(acknowledged.Count), count => count >= AcknowledgedBeforeTheCut);
            await first.KillAsync();
            await Task.WhenAll(clients);
        }

        await using ServiceProcess again = await ServiceProcess.StartAsync("run", data.FullName);
        for (int client = 0; client < Clients; client++)
        {
            List<(DateTimeOffset Time, double Value)> stored = await ReadAllAsync(again, client);
            Assert.Equal(stored.Count, stored.DistinctBy(r => r.Time).Count());
            var known = stored.ToDictionary(r => r.Time, r => r.Value);
            foreach (((int of, DateTimeOffset time), double value) in acknowledged)
            {
                if (of == client)
                    Assert.True(known.TryGetValue(time, out double found) && found == value, $"client {client}: the acknowledged reading of {time:O} is missing or changed");
            }
        }
    }

    private async Task PublishUntilCutAsync(int port, int number)
    {
        using IMqttClient client = new MqttClientFactory().CreateMqttClient();
        try
        {
            await client.ConnectAsync(new MqttClientOptionsBuilder().WithTcpServer("127.0.0.1", port).WithClientId($"probe-{number}").Build());
            for (int i = 0; ; i++)
            {
                DateTimeOffset time = First.AddSeconds(i);
                double value = 6 + i % 200 / 100.0;
                byte[] payload = Encoding.UTF8.GetBytes(string.Create(CultureInfo.InvariantCulture, $$"""{"value":{{value}},"time":"{{time:yyyy-MM-dd'T'HH:mm:ss'Z'}}"}"""));
                MqttClientPublishResult result = await client.PublishAsync(
                    new MqttApplicationMessageBuilder().WithTopic($"tankchem/in/mill-pond/tank-{number}/ph").WithPayload(payload).WithQualityOfServiceLevel(MqttQualityOfServiceLevel.AtLeastOnce).Build());
                if (result.IsSuccess)
                    acknowledged[(number, time)] = value;
            }
        }
        catch (Exception e) when (e is MQTTnet.Exceptions.MqttCommunicationException or OperationCanceledException or IOException)
        {
            // The power went: what was not acknowledged by then is not claimed.
            return;
        }
    }

    private static async Task<List<(DateTimeOffset, double)>> ReadAllAsync(ServiceProcess service, int client)
    {
        var readings = new List<(DateTimeOffset, double)>();
        string? next = $"/api/v1/places/mill-pond/tank-{client}/readings?quantity=ph&from=2026-04-30T00:00:00Z&to=2026-06-01T00:00:00Z&limit=500";
        while (next is not null)
        {
            using JsonDocument page = JsonDocument.Parse(await service.Http.GetStringAsync(next));
            foreach (JsonElement reading in page.RootElement.GetProperty("readings").EnumerateArray())
                readings.Add((reading.GetProperty("time").GetDateTimeOffset(), reading.GetProperty("value").GetDouble()));
            next = page.RootElement.GetProperty("next").GetString();
        }

        return readings;
    }
}
