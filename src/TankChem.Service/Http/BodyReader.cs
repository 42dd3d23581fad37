namespace TankChem.Service.Http;

/// <summary>Reads a request body up to a bound.</summary>
internal static class BodyReader
{
    private const int BytesMax = 64 * 1024;

    /// <summary>The body, or null when it is longer than the bound.</summary>
    public static async Task<byte[]?> ReadAsync(HttpRequest request, CancellationToken cancellationToken)
    {
        if (request.ContentLength > BytesMax)
            return null;
        using var buffer = new MemoryStream();
        byte[] chunk = new byte[8192];
        int read;
        while ((read = await request.Body.ReadAsync(chunk, cancellationToken)) > 0)
        {
            if (buffer.Length + read > BytesMax)
                return null;
            buffer.Write(chunk, 0, read);
        }

        return buffer.ToArray();
    }
}
