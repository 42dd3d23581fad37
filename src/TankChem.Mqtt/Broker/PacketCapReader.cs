using System.Buffers;
using System.IO.Pipelines;
using System.Runtime.CompilerServices;
using System.Text;
using MQTTnet.Exceptions;

namespace TankChem.Mqtt.Broker;

/// <summary>Looks at the length that each packet announces before anything of it is collected: the broker behind it has no limit of its own.</summary>
/// <remarks>The broker consumes whole packets only, so what it is given always begins with a packet's header (MQTT 5.0, section 2.1).</remarks>
internal sealed class PacketCapReader(PipeReader inner, int packetBytesMax, ClientConnection connection) : PipeReader
{
    private const int PublishType = 3;

    public override void AdvanceTo(SequencePosition consumed) => inner.AdvanceTo(consumed);

    public override void AdvanceTo(SequencePosition consumed, SequencePosition examined) => inner.AdvanceTo(consumed, examined);

    public override void CancelPendingRead() => inner.CancelPendingRead();

    public override void Complete(Exception? exception = null) => inner.Complete(exception);

    [AsyncMethodBuilder(typeof(PoolingAsyncValueTaskMethodBuilder<>))]
    public override async ValueTask<ReadResult> ReadAsync(CancellationToken cancellationToken = default)
    {
        ReadResult result = await inner.ReadAsync(cancellationToken);
        Check(result.Buffer);
        return result;
    }

    public override bool TryRead(out ReadResult result)
    {
        if (!inner.TryRead(out result))
            return false;
        Check(result.Buffer);
        return true;
    }

    private void Check(in ReadOnlySequence<byte> buffer)
    {
        var reader = new SequenceReader<byte>(buffer);
        if (!reader.TryRead(out byte header))
            return;
        long remaining = 0;
        for (int shift = 0; shift < 28; shift += 7)
        {
            if (!reader.TryRead(out byte digit))
                return;
            remaining |= (long)(digit & 0x7f) << shift;
            if (digit < 0x80)
                break;
        }

        long length = reader.Consumed + remaining;
        if (length <= packetBytesMax)
            return;
        connection.Oversized = new OversizedPacket(length, header >> 4 == PublishType ? Topic(reader) : "");
        throw new MqttProtocolViolationException($"A packet of {length} bytes is over the limit of {packetBytesMax}.");
    }

    private static string Topic(SequenceReader<byte> reader)
    {
        if (!reader.TryReadBigEndian(out short announced))
            return "";
        ReadOnlySequence<byte> rest = reader.UnreadSequence;
        return Encoding.UTF8.GetString(rest.Slice(0, Math.Min((ushort)announced, rest.Length)));
    }
}
