using System.Buffers;
using System.Collections.Concurrent;
using System.Text.Json;
using System.Text.Unicode;
using TankChem.Monitoring.Configuration;
using TankChem.Monitoring.Readings;
using TankChem.Mqtt.Topics;

namespace TankChem.Mqtt.Payloads;

/// <summary>Turns messages into readings, or into the reason why there are none. Never throws on what others sent.</summary>
public sealed class PayloadReader
{
    /// <summary>Bytes of an unreadable payload that are kept.</summary>
    public const int HeadMax = 4096;

    /// <summary>Topics remembered as read; a farm of 2,000 tanks has fewer.</summary>
    private const int KnownTopicsMax = 50_000;

    private static readonly char[] ContentTypeEnd = [';', ' '];
    private readonly TopicMapping[] mappings;
    private readonly ConcurrentDictionary<string, TopicName> known = new(StringComparer.Ordinal);

    /// <summary>A reader with the mappings of the configuration.</summary>
    public PayloadReader(IReadOnlyList<TopicMapping> mappings)
    {
        ArgumentNullException.ThrowIfNull(mappings);
        this.mappings = [.. mappings];
    }

    /// <summary>Reads a message of a topic for readings.</summary>
    public Arrival Read(in IncomingMessage message)
    {
        if (TryName(message.Topic, out TopicName? name, out string? fault))
        {
            return name.Kind == TopicKind.AlarmCommand
                ? Unreadable(message, "topic: a command, and no reading.", [])
                : ReadPayload(message, name);
        }

        // A mapping takes any topic that is fit to be published to and is not one of the service's own.
        string topic = message.Topic;
        TopicMapping[] matching = [.. mappings.Where(m => TopicFilter.Matches(m.Topic, topic))];
        bool mayBeMapped = matching.Length > 0 && TopicText.Fault(topic) is null && !topic.StartsWith("tankchem/", StringComparison.Ordinal);
        return mayBeMapped ? ReadMapped(message, matching) : Unreadable(message, fault!, []);
    }

    /// <summary>Reads a topic; right ones are remembered.</summary>
    internal bool TryName(string topic, [System.Diagnostics.CodeAnalysis.NotNullWhen(true)] out TopicName? name, out string? fault)
    {
        fault = null;
        if (known.TryGetValue(topic, out name))
            return true;
        if (!TopicName.TryParse(topic, out name, out fault))
            return false;
        if (known.Count < KnownTopicsMax)
            known.TryAdd(topic, name);
        return true;
    }

    /// <summary>What is kept of a message that could not be read.</summary>
    internal static Arrival Unreadable(in IncomingMessage message, string reason, IReadOnlyList<ParsedReading> readings)
    {
        long length = message.Payload.Length;
        byte[] head = message.Payload.Slice(0, Math.Min(length, HeadMax)).ToArray();
        string? client = message.Client is null ? null : TopicText.Shown(message.Client);
        return new Arrival
        {
            ReceivedAt = message.ReceivedAt,
            Origin = message.Origin,
            Readings = readings,
            Unreadable = new UnreadablePayload(TopicText.Shown(message.Topic), message.ReceivedAt, length, head, reason, client),
        };
    }

    private static Arrival ReadPayload(in IncomingMessage message, TopicName name)
    {
        if (message.Payload.IsSingleSegment)
            return ReadPayload(message, name, message.Payload.FirstSpan);
        byte[] rented = ArrayPool<byte>.Shared.Rent((int)message.Payload.Length);
        try
        {
            message.Payload.CopyTo(rented);
            return ReadPayload(message, name, rented.AsSpan(0, (int)message.Payload.Length));
        }
        finally
        {
            ArrayPool<byte>.Shared.Return(rented);
        }
    }

    private static Arrival ReadPayload(in IncomingMessage message, TopicName name, ReadOnlySpan<byte> payload)
    {
        string? fault = FaultOfBytes(payload) ?? FormOf(message.ContentType, out PayloadForm form) ?? FaultOfForm(name.Kind, form, payload);
        if (fault is not null)
            return Unreadable(message, fault, []);
        try
        {
            if (name.Kind == TopicKind.Pack)
            {
                fault = SenmlPack.Read(payload, name.Place, message.ReceivedAt, message.Origin == ReadingOrigin.Live, out List<ParsedReading> readings);
                return fault is null ? Readings(message, readings) : Unreadable(message, fault, readings);
            }

            ParsedReading reading;
            fault = name.Kind == TopicKind.DeviceState ? ReadState(payload, name, out reading) : ReadNumber(payload, name, out reading);
            return fault is null ? Readings(message, [reading]) : Unreadable(message, fault, []);
        }
        catch (JsonException e)
        {
            return Unreadable(message, NotJson(e), []);
        }
        catch (InvalidOperationException)
        {
            // The reader throws it for an escape that stands for half a character, as \ud800.
            return Unreadable(message, "payload: has a \\u escape that stands for no character.", []);
        }
    }

    private static Arrival ReadMapped(in IncomingMessage message, TopicMapping[] matching)
    {
        byte[] payload = message.Payload.ToArray();
        if (FaultOfBytes(payload) is { } bytesFault)
            return Unreadable(message, bytesFault, []);
        try
        {
            string? fault = MappedPayload.Read(payload, matching, out List<ParsedReading> readings);
            return fault is null ? Readings(message, readings) : Unreadable(message, fault, readings);
        }
        catch (JsonException e)
        {
            return Unreadable(message, NotJson(e), []);
        }
        catch (InvalidOperationException)
        {
            return Unreadable(message, "payload: has a \\u escape that stands for no character.", []);
        }
    }

    private static Arrival Readings(in IncomingMessage message, IReadOnlyList<ParsedReading> readings) =>
        new() { ReceivedAt = message.ReceivedAt, Origin = message.Origin, Readings = readings };

    private static string? ReadNumber(ReadOnlySpan<byte> payload, TopicName name, out ParsedReading reading)
    {
        string? unit = null;
        DateTimeOffset? time = null;
        bool read = IsObject(payload)
            ? JsonReading.TryRead(payload, out double value, out unit, out time, out string? fault)
            : PlainNumber.TryRead(payload, out value, out fault);
        reading = new ParsedReading(name.Series, value, unit, time);
        return read ? null : fault;
    }

    private static string? ReadState(ReadOnlySpan<byte> payload, TopicName name, out ParsedReading reading)
    {
        ReadOnlySpan<byte> text = payload.Trim(" \t\r\n"u8);
        bool on = text.SequenceEqual("on"u8);
        reading = new ParsedReading(name.Series, on ? 1 : 0, null, null);
        return on || text.SequenceEqual("off"u8)
            ? null
            : $"payload: \"{TopicText.Shown(System.Text.Encoding.UTF8.GetString(text[..Math.Min(text.Length, 40)]))}\" is no state of a device; on or off would be right.";
    }

    private static string? FaultOfBytes(ReadOnlySpan<byte> payload)
    {
        if (payload.IsEmpty)
            return "payload: empty; a number, a JSON object or a SenML pack would be right.";
        if (payload is [0xef, 0xbb, 0xbf, ..])
            return "payload: begins with a byte order mark (EF BB BF), which JSON does not allow (RFC 8259, section 8.1); send it without.";
        return Utf8.IsValid(payload) ? null : $"payload: byte {FirstInvalid(payload)} is not UTF-8.";
    }

    private static int FirstInvalid(ReadOnlySpan<byte> payload)
    {
        int at = 0;
        while (System.Text.Rune.DecodeFromUtf8(payload[at..], out _, out int consumed) == OperationStatus.Done)
            at += consumed;
        return at + 1;
    }

    private static string? FormOf(string? contentType, out PayloadForm form)
    {
        form = PayloadForm.Unsaid;
        if (string.IsNullOrEmpty(contentType))
            return null;
        int end = contentType.IndexOfAny(ContentTypeEnd);
        switch ((end < 0 ? contentType : contentType[..end]).ToLowerInvariant())
        {
            case "text/plain":
                form = PayloadForm.Plain;
                return null;
            case "application/json":
                form = PayloadForm.Json;
                return null;
            case "application/senml+json":
                form = PayloadForm.Senml;
                return null;
            default:
                return $"payload: the content type \"{TopicText.Shown(contentType)}\" is not taken; text/plain, application/json or application/senml+json would be right, or none.";
        }
    }

    private static string? FaultOfForm(TopicKind kind, PayloadForm form, ReadOnlySpan<byte> payload)
    {
        bool isArray = payload.TrimStart(" \t\r\n"u8) is [(byte)'[', ..];
        switch (kind)
        {
            case TopicKind.Pack when form == PayloadForm.Plain:
                return "payload: content type text/plain; this topic takes a SenML pack (RFC 8428), application/senml+json.";
            case TopicKind.Pack:
                return isArray ? null : "payload: no SenML pack; an array of records (RFC 8428) would be right here, or the topic tankchem/in/<site>/<place>/<quantity> for a single number.";
            case TopicKind.DeviceState when form is PayloadForm.Senml or PayloadForm.Json:
                return "payload: the content type says JSON; this topic takes on or off.";
            case TopicKind.Reading when form == PayloadForm.Senml || isArray:
                return "payload: a SenML pack; it belongs to the topic tankchem/in/<site>/<place>.";
            case TopicKind.Reading when form == PayloadForm.Plain && IsObject(payload):
                return "payload: content type text/plain, but an object; application/json would be right.";
            default:
                return null;
        }
    }

    private static bool IsObject(ReadOnlySpan<byte> payload) => payload.TrimStart(" \t\r\n"u8) is [(byte)'{', ..];

    private static string NotJson(JsonException e) =>
        $"payload: no valid JSON at line {(e.LineNumber ?? 0) + 1}, byte {(e.BytePositionInLine ?? 0) + 1}: {TopicText.Shown(FirstSentence(e.Message))}";

    private static string FirstSentence(string message)
    {
        int end = message.IndexOf(" LineNumber:", StringComparison.Ordinal);
        return end < 0 ? message : message[..end];
    }
}
