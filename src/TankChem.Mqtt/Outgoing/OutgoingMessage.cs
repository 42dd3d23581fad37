using System.Text;
using MQTTnet;
using MQTTnet.Packets;
using MQTTnet.Protocol;

namespace TankChem.Mqtt.Outgoing;

/// <summary>A message of the service's own; all of them are states, and retained.</summary>
/// <param name="Topic">Its topic.</param>
/// <param name="Body">Its payload.</param>
/// <param name="IsJson">Whether the payload is JSON; otherwise it is one word.</param>
/// <param name="IsDemo">Whether it tells of an invented site.</param>
internal sealed record OutgoingMessage(string Topic, byte[] Body, bool IsJson, bool IsDemo)
{
    /// <summary>A message of one word.</summary>
    public static OutgoingMessage Word(string topic, string word, bool isDemo) => new(topic, Encoding.ASCII.GetBytes(word), false, isDemo);

    /// <summary>As MQTTnet wants it.</summary>
    /// <param name="properties">The list that takes its user properties.</param>
    public MqttApplicationMessage ToMqtt(List<MqttUserProperty> properties)
    {
        if (IsDemo)
            properties.Add(new MqttUserProperty(DemoProperty, Encoding.UTF8.GetBytes("true")));
        return new MqttApplicationMessage
        {
            Topic = Topic,
            PayloadSegment = Body,
            ContentType = IsJson ? "application/json" : "text/plain",
            QualityOfServiceLevel = MqttQualityOfServiceLevel.AtLeastOnce,
            Retain = true,
            UserProperties = properties,
        };
    }

    /// <summary>Name of the user property (MQTT 5) that marks a demo's messages.</summary>
    public const string DemoProperty = "demo";
}
