using System.Text.Json;
using TankChem.Monitoring.Bodies;

namespace TankChem.Service.Http;

/// <summary>A JSON answer written straight to the response.</summary>
internal sealed class JsonBody(Action<Utf8JsonWriter> write) : IResult
{
    public async Task ExecuteAsync(HttpContext httpContext)
    {
        ArgumentNullException.ThrowIfNull(httpContext);
        httpContext.Response.ContentType = "application/json; charset=utf-8";
        await using (var writer = new Utf8JsonWriter(httpContext.Response.BodyWriter, WaterBody.Options))
            write(writer);
        await httpContext.Response.BodyWriter.FlushAsync(httpContext.RequestAborted);
    }
}
