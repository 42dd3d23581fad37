using System.Net;
using System.Net.Sockets;

namespace TankChem.TestKit;

/// <summary>Ports of this machine that nobody listens on.</summary>
public static class FreePort
{
    /// <summary>One that was free a moment ago.</summary>
    public static int Next()
    {
        using var listener = new TcpListener(IPAddress.Loopback, 0);
        listener.Start();
        return ((IPEndPoint)listener.LocalEndpoint).Port;
    }
}
