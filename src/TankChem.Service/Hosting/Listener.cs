using System.Net;
using System.Net.Sockets;
using TankChem.Service.CommandLine;

namespace TankChem.Service.Hosting;

/// <summary>Looks, before anything starts, whether the ports are free: the message can then name the option that changes it.</summary>
internal static class Listener
{
    /// <summary>The addresses behind a host name that means this machine.</summary>
    public static IReadOnlyList<IPAddress> Addresses(string host) => host.Trim('[', ']') switch
    {
        "localhost" => Socket.OSSupportsIPv6 ? [IPAddress.Loopback, IPAddress.IPv6Loopback] : [IPAddress.Loopback],
        var text => [IPAddress.Parse(text)],
    };

    /// <summary>Throws when a port is taken.</summary>
    /// <exception cref="RunFailedException">It names the port and the option.</exception>
    public static void EnsureFree(string host, int port, string what, string option)
    {
        foreach (IPAddress address in Addresses(host))
        {
            using var socket = new Socket(address.AddressFamily, SocketType.Stream, ProtocolType.Tcp);
            try
            {
                socket.Bind(new IPEndPoint(address, port));
            }
            catch (SocketException e)
            {
                throw new RunFailedException($"{what}: port {port} on {address} cannot be used ({e.SocketErrorCode switch { SocketError.AddressAlreadyInUse => "another program listens there", SocketError.AccessDenied => "ports below 1024 need a privilege", _ => e.Message }}); {option} takes another.", e);
            }
        }
    }
}
