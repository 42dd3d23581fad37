using System.IO.Pipelines;

namespace TankChem.Mqtt.Broker;

/// <summary>A connection's two directions, the incoming one behind the cap.</summary>
internal sealed class CappedTransport(PipeReader input, PipeWriter output) : IDuplexPipe
{
    public PipeReader Input => input;

    public PipeWriter Output => output;
}
