using System.Buffers;
using System.Text;
using TankChem.Monitoring.Configuration;
using TankChem.Monitoring.Readings;
using TankChem.Mqtt.Payloads;

namespace TankChem.Mqtt.Tests.Payloads;

/// <summary>Reads one message without a broker.</summary>
internal static class PayloadCase
{
    public static readonly DateTimeOffset ReceivedAt = new(2026, 5, 1, 10, 0, 5, TimeSpan.Zero);
    private static readonly PayloadReader Plain = new([]);

    public static Arrival Read(string topic, string payload, string? contentType = null, ReadingOrigin origin = ReadingOrigin.Live) =>
        Read(Plain, topic, Encoding.UTF8.GetBytes(payload), contentType, origin);

    public static Arrival Read(string topic, byte[] payload) => Read(Plain, topic, payload, null, ReadingOrigin.Live);

    public static Arrival ReadMapped(TopicMapping[] mappings, string topic, string payload) =>
        Read(new PayloadReader(mappings), topic, Encoding.UTF8.GetBytes(payload), null, ReadingOrigin.Live);

    public static string Reason(Arrival arrival) => Assert.IsType<UnreadablePayload>(arrival.Unreadable).Reason;

    private static Arrival Read(PayloadReader reader, string topic, byte[] payload, string? contentType, ReadingOrigin origin) =>
        reader.Read(new IncomingMessage(topic, new ReadOnlySequence<byte>(payload), contentType, "probe-1", ReceivedAt, origin));
}
