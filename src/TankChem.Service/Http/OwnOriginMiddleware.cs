using System.Net;
using Microsoft.AspNetCore.Http.Extensions;

namespace TankChem.Service.Http;

/// <summary>Lets only requests through that are meant for this service: their Host must be loopback, and an Origin, when one is sent, the service's own.</summary>
/// <remarks>Without it a page from anywhere, open in a browser on this machine, could acknowledge alarms (cross-site requests, DNS rebinding).</remarks>
internal sealed class OwnOriginMiddleware(RequestDelegate next)
{
    public async Task InvokeAsync(HttpContext context)
    {
        HttpRequest request = context.Request;
        if (!IsLoopback(request.Host))
        {
            await Problem.Of(StatusCodes.Status421MisdirectedRequest, "Not this service", $"The host {request.Host} is not this service's own; use 127.0.0.1, localhost or [::1].").ExecuteAsync(context);
            return;
        }

        if (ChangesSomething(request.Method))
        {
            string origin = request.Headers.Origin.ToString();
            string own = UriHelper.BuildAbsolute(request.Scheme, request.Host);
            if (origin.Length > 0 && !string.Equals(origin.TrimEnd('/'), own.TrimEnd('/'), StringComparison.OrdinalIgnoreCase))
            {
                await Problem.Of(StatusCodes.Status403Forbidden, "Another origin", $"A page of {origin} may not change anything here.").ExecuteAsync(context);
                return;
            }

            if (request.Path.StartsWithSegments("/api", StringComparison.Ordinal) && !IsJson(request.ContentType))
            {
                await Problem.Of(StatusCodes.Status415UnsupportedMediaType, "Not JSON", "Send Content-Type: application/json.").ExecuteAsync(context);
                return;
            }
        }

        await next(context);
    }

    private static bool ChangesSomething(string method) => !(HttpMethods.IsGet(method) || HttpMethods.IsHead(method) || HttpMethods.IsOptions(method));

    private static bool IsJson(string? contentType) =>
        contentType is not null && contentType.Split(';')[0].Trim().Equals("application/json", StringComparison.OrdinalIgnoreCase);

    private static bool IsLoopback(HostString host) =>
        host.Host.Equals("localhost", StringComparison.OrdinalIgnoreCase) || (IPAddress.TryParse(host.Host.Trim('[', ']'), out IPAddress? address) && IPAddress.IsLoopback(address));
}
