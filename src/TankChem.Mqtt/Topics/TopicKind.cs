namespace TankChem.Mqtt.Topics;

/// <summary>What a topic that the service takes is for.</summary>
public enum TopicKind
{
    /// <summary>One quantity of one probe: <c>tankchem/in/site/place/quantity[/probe]</c>.</summary>
    Reading,

    /// <summary>Several quantities of one place: <c>tankchem/in/site/place</c>.</summary>
    Pack,

    /// <summary>On or off of a device: <c>tankchem/in/site/place/state/device</c>.</summary>
    DeviceState,

    /// <summary>A person's command to an alarm: <c>tankchem/cmd/site/place/alarm/rule</c>.</summary>
    AlarmCommand,
}
