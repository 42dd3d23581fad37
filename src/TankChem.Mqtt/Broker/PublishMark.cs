using MQTTnet.Packets;

namespace TankChem.Mqtt.Broker;

/// <summary>Ties a message to the packet and connection it came in by. It travels in the place of the message's user properties, the one thing that
/// MQTTnet hands through unchanged from packet to message; a will message, which comes in no packet of its own, has none.</summary>
internal sealed class PublishMark(ClientConnection connection, ushort packetIdentifier, List<MqttUserProperty>? properties) : List<MqttUserProperty>
{
    public ClientConnection Connection => connection;

    public ushort PacketIdentifier => packetIdentifier;

    public List<MqttUserProperty>? Properties => properties;
}

/// <summary>The user properties of the service's own messages, which no client can make.</summary>
internal sealed class OwnProperties : List<MqttUserProperty>
{
}
