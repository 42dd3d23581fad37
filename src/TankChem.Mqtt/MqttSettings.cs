using TankChem.Monitoring.Configuration;

namespace TankChem.Mqtt;

/// <summary>What the MQTT room needs to know.</summary>
public sealed record MqttSettings
{
    /// <summary>The embedded broker; null when there is none.</summary>
    public EmbeddedBrokerOptions? Embedded { get; init; }

    /// <summary>The outside broker; null when there is none.</summary>
    public OutsideBrokerOptions? Outside { get; init; }

    /// <summary>Mappings of other topics and payloads.</summary>
    public IReadOnlyList<TopicMapping> Mappings { get; init; } = [];

    /// <summary>Whether the whole is an invented demo; every outgoing message then says so.</summary>
    public bool IsDemo { get; init; }

    /// <summary>Most clients connected to the embedded broker at one time.</summary>
    public int ClientsMax { get; init; } = 2_500;

    /// <summary>Takes what is wrong with a broker, as a plain sentence under a short key, or (null) that it no longer is.</summary>
    public Action<string, string?> ReportTrouble { get; init; } = (_, _) => { };
}
