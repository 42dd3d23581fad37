using System.Globalization;
using System.Text;
using System.Text.Json;
using MQTTnet;
using MQTTnet.Protocol;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Bodies;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Mqtt.Broker;
using TankChem.Simulation.Demo;

namespace TankChem.Service.Demo;

/// <summary>Lets the simulated site live: its probes publish over real MQTT, its people write in the logbook.</summary>
internal sealed class DemoPublisher(DemoScenario scenario, EmbeddedBroker broker, IOperations operations, IFarm farm, TimeProvider clock, IHostApplicationLifetime lifetime, ILogger<DemoPublisher> logger) : BackgroundService
{
    private static readonly TimeSpan Every = TimeSpan.FromSeconds(1);
    private static readonly TimeSpan RetryAfter = TimeSpan.FromSeconds(5);

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        var started = new TaskCompletionSource(TaskCreationOptions.RunContinuationsAsynchronously);
        using CancellationTokenRegistration whenStarted = lifetime.ApplicationStarted.Register(started.SetResult);
        await started.Task.WaitAsync(stoppingToken);
        using IMqttClient client = new MqttClientFactory().CreateMqttClient();
        using var timer = new PeriodicTimer(Every, clock);
        while (await timer.WaitForNextTickAsync(stoppingToken))
        {
            try
            {
                if (!client.IsConnected)
                {
                    await client.ConnectAsync(new MqttClientOptionsBuilder().WithTcpServer("127.0.0.1", broker.Port).WithClientId("demo-site").Build(), stoppingToken);
                }

                foreach (SimulatedEvent happened in scenario.Advance(clock.GetUtcNow()))
                    await TellAsync(client, happened, stoppingToken);
            }
            catch (Exception e) when (e is MQTTnet.Exceptions.MqttCommunicationException or OperationCanceledException or InvalidOperationException && !stoppingToken.IsCancellationRequested)
            {
                logger.LogWarning("The demo's probes lost the broker ({Reason}); they try again", e.Message);
                await Task.Delay(RetryAfter, clock, stoppingToken);
            }
        }
    }

    private async Task TellAsync(IMqttClient client, SimulatedEvent happened, CancellationToken cancellationToken)
    {
        switch (happened)
        {
            case SimulatedReading reading:
                await PublishAsync(client, $"tankchem/in/{DemoSite.Id}/{reading.Place}/{reading.Quantity}/{reading.Probe}", Payload(reading), cancellationToken);
                break;
            case SimulatedDeviceState device:
                await PublishAsync(client, $"tankchem/in/{DemoSite.Id}/{device.Place}/state/{device.Device}", Encoding.UTF8.GetBytes(device.IsOn ? "on" : "off"), cancellationToken);
                break;
            case SimulatedLogEntry entry when DemoRecords.Titration(entry) is { } titration:
                await operations.RecordMeasurementAsync(
                    titration.Series.Place, titration.Series.Quantity, titration.RawValue.ToString(CultureInfo.InvariantCulture), titration.RawUnit!, entry.HappenedAt, entry.Who, cancellationToken);
                break;
            case SimulatedLogEntry entry:
                await operations.RecordAsync(DemoRecords.Log(entry), cancellationToken);
                break;
            case SimulatedLoss loss:
                await operations.RecordLossAsync(DemoRecords.Loss(loss), cancellationToken);
                break;
            case SimulatedAcknowledgement acknowledgement:
                await AcknowledgeAsync(acknowledgement, cancellationToken);
                break;
        }
    }

    private async Task AcknowledgeAsync(SimulatedAcknowledgement acknowledgement, CancellationToken cancellationToken)
    {
        PlaceKey place = DemoRecords.Key(acknowledgement.Place);
        foreach (AlarmView alarm in farm.Find(place)?.Alarms ?? [])
        {
            if (alarm.NeedsAcknowledgement && alarm.Key.Rule.StartsWith(acknowledgement.RulePrefix, StringComparison.Ordinal))
                await operations.CommandAlarmAsync(new AlarmCommand(alarm.Key, AlarmAction.Acknowledge, acknowledgement.Who, acknowledgement.Reason, null), cancellationToken);
        }
    }

    private static Task PublishAsync(IMqttClient client, string topic, byte[] payload, CancellationToken cancellationToken) => client.PublishAsync(
        new MqttApplicationMessageBuilder().WithTopic(topic).WithPayload(payload).WithQualityOfServiceLevel(MqttQualityOfServiceLevel.AtLeastOnce).Build(), cancellationToken);

    private static byte[] Payload(SimulatedReading reading)
    {
        using var stream = new MemoryStream();
        using (var writer = new Utf8JsonWriter(stream))
        {
            writer.WriteStartObject();
            writer.WriteNumber("value", reading.Value);
            if (DemoUnits.Sent(reading) is { } unit)
                writer.WriteString("unit", unit);
            writer.WriteString("time", Rfc3339.Text(reading.At));
            writer.WriteEndObject();
        }

        return stream.ToArray();
    }
}
