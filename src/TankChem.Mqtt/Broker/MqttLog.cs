using Microsoft.Extensions.Logging;
using MQTTnet.Diagnostics.Logger;

namespace TankChem.Mqtt.Broker;

/// <summary>Passes warnings and errors of MQTTnet on to the service's log.</summary>
internal sealed class MqttLog(ILogger logger) : IMqttNetLogger
{
    public bool IsEnabled => true;

    public void Publish(MqttNetLogLevel logLevel, string source, string message, object[] parameters, Exception exception)
    {
        if (logLevel < MqttNetLogLevel.Warning)
            return;
        string text = parameters is { Length: > 0 } ? string.Format(System.Globalization.CultureInfo.InvariantCulture, message, parameters) : message;

        // A client that goes away or breaks the protocol is its own trouble, and no error of this service.
        logger.LogWarning(exception, "{Source}: {Text}", source, Topics.TopicText.Shown(text));
    }
}
