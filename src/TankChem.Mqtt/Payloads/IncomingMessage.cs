using System.Buffers;
using TankChem.Monitoring.Readings;

namespace TankChem.Mqtt.Payloads;

/// <summary>A message as a broker handed it over. Its payload is only valid until the call it is passed to returns.</summary>
/// <param name="Topic">Its topic, unchecked.</param>
/// <param name="Payload">Its payload.</param>
/// <param name="ContentType">The content type of MQTT 5; null when there is none.</param>
/// <param name="Client">The client that sent it; null when not known.</param>
/// <param name="ReceivedAt">When it came, UTC.</param>
/// <param name="Origin">How it came.</param>
public readonly record struct IncomingMessage(string Topic, ReadOnlySequence<byte> Payload, string? ContentType, string? Client, DateTimeOffset ReceivedAt, ReadingOrigin Origin);
