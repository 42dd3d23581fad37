using Prometheus;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Bodies;
using TankChem.Monitoring.Ports;
using TankChem.Mqtt;

namespace TankChem.Service.Http;

/// <summary>Metrics that are counted when they are asked for.</summary>
internal static class ServiceMetrics
{
    public static void Add(CollectorRegistry registry, IMetricFactory metrics, IFarm farm, MqttCounters mqtt)
    {
        Gauge alarms = metrics.CreateGauge("tankchem_alarms", "Alarms that are active or wait for an acknowledgement.", ["priority", "acknowledged"]);
        Gauge connections = metrics.CreateGauge("tankchem_mqtt_connections", "Connections to the embedded broker.");
        Counter messages = metrics.CreateCounter("tankchem_mqtt_messages_total", "MQTT messages by what became of them.", ["outcome"]);
        registry.AddBeforeCollectCallback(() =>
        {
            AlarmView[] shown = [.. farm.Places.SelectMany(p => p.Alarms).Where(a => a.IsActive || a.NeedsAcknowledgement)];
            foreach (AlarmPriority priority in Enum.GetValues<AlarmPriority>())
            {
                string name = AlarmBody.PriorityName(priority);
                alarms.WithLabels(name, "no").Set(shown.Count(a => a.Priority == priority && a.NeedsAcknowledgement));
                alarms.WithLabels(name, "yes").Set(shown.Count(a => a.Priority == priority && !a.NeedsAcknowledgement));
            }

            connections.Set(mqtt.Connections);
            messages.WithLabels("taken").IncTo(mqtt.Taken);
            messages.WithLabels("unreadable").IncTo(mqtt.Unreadable);
            messages.WithLabels("refused").IncTo(mqtt.Refused);
            messages.WithLabels("too large").IncTo(mqtt.Oversized);
            messages.WithLabels("not stored").IncTo(mqtt.CommitFailures);
            messages.WithLabels("sent").IncTo(mqtt.Sent);
            messages.WithLabels("dropped").IncTo(mqtt.Dropped);
        });
    }
}
