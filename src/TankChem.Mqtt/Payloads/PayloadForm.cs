namespace TankChem.Mqtt.Payloads;

/// <summary>What the content type of MQTT 5 says that a payload is.</summary>
internal enum PayloadForm
{
    /// <summary>Nothing said: the first character tells.</summary>
    Unsaid,

    /// <summary><c>text/plain</c>: a number.</summary>
    Plain,

    /// <summary><c>application/json</c>.</summary>
    Json,

    /// <summary><c>application/senml+json</c>.</summary>
    Senml,
}
