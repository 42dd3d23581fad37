using System.Globalization;
using System.Text.Json;
using TankChem.Monitoring.Bodies;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;

namespace TankChem.Service.Http;

/// <summary>Trends and raw readings.</summary>
internal static class HistoryEndpoints
{
    private const int PointsDefault = 300;
    private const int PointsMax = 10_000;
    private const int PageDefault = 1_000;
    private const int PageMax = 10_000;

    public static async Task<IResult> TrendAsync(string site, string place, string? quantity, string? from, string? to, int? points, IFarm farm, IHistory history, CancellationToken cancellationToken)
    {
        var key = new PlaceKey(site, place);
        if (farm.Find(key) is null)
            return Problem.NotFound($"There is no place {key}.");
        if (FaultOfQuantity(quantity) is { } quantityFault)
            return Problem.BadRequest(quantityFault);
        if (!QueryTime.TryReadRange(from, to, farm.Now, out DateTimeOffset start, out DateTimeOffset end, out string? fault))
            return Problem.BadRequest(fault!);
        if (points is < 1 or > PointsMax)
            return Problem.BadRequest($"points: must be 1 to {PointsMax}.");

        IReadOnlyList<TrendBucket> buckets = await history.TrendAsync(key, quantity!, start, end, points ?? PointsDefault, cancellationToken);
        return new JsonBody(w =>
        {
            w.WriteStartObject();
            w.WriteString("quantity", quantity);
            w.WriteString("unit", QuantityCatalog.Get(quantity!).Unit);
            w.WriteStartArray("buckets");
            foreach (TrendBucket bucket in buckets)
            {
                w.WriteStartObject();
                WriteTime(w, "from", bucket.From);
                WriteTime(w, "to", bucket.To);
                w.WriteNumber("min", bucket.Min);
                w.WriteNumber("mean", bucket.Mean);
                w.WriteNumber("max", bucket.Max);
                w.WriteNumber("count", bucket.Count);
                w.WriteEndObject();
            }

            w.WriteEndArray();
            w.WriteEndObject();
        });
    }

    public static async Task<IResult> ReadingsAsync(string site, string place, string? quantity, string? from, string? to, string? after, int? limit, IFarm farm, IHistory history, CancellationToken cancellationToken)
    {
        var key = new PlaceKey(site, place);
        if (farm.Find(key) is null)
            return Problem.NotFound($"There is no place {key}.");
        if (FaultOfQuantity(quantity) is { } quantityFault)
            return Problem.BadRequest(quantityFault);
        if (!QueryTime.TryReadRange(from, to, farm.Now, out DateTimeOffset start, out DateTimeOffset end, out string? fault))
            return Problem.BadRequest(fault!);
        if (limit is < 1 or > PageMax)
            return Problem.BadRequest($"limit: must be 1 to {PageMax}.");
        ReadingCursor? cursor = null;
        if (after is not null)
        {
            if (!TryReadCursor(after, out ReadingCursor parsed))
                return Problem.BadRequest("after: not a place to go on from; use the path in \"next\" as it is.");
            cursor = parsed;
        }

        int page = limit ?? PageDefault;
        IReadOnlyList<Reading> readings = await history.ReadingsAsync(key, quantity!, start, end, cursor, page, cancellationToken);
        string? next = readings.Count < page ? null : NextPath(key, quantity!, start, end, page, readings[^1]);
        return new JsonBody(w =>
        {
            w.WriteStartObject();
            w.WriteStartArray("readings");
            foreach (Reading reading in readings)
                Write(w, reading);
            w.WriteEndArray();
            w.WriteString("next", next);
            w.WriteEndObject();
        });
    }

    private static void Write(Utf8JsonWriter w, Reading reading)
    {
        w.WriteStartObject();
        w.WriteString("quantity", reading.Series.Quantity);
        w.WriteString("probe", reading.Series.Probe);
        WriteTime(w, "time", reading.Time);
        w.WriteNumber("value", reading.Value ?? reading.RawValue);
        w.WriteString("unit", reading.Value is null ? reading.RawUnit : QuantityCatalog.Get(reading.Series.Quantity).Unit);
        w.WriteString("flag", QualityFlagNames.Of(reading.Flag));
        w.WriteString("reason", reading.Reason);
        w.WriteEndObject();
    }

    private static string NextPath(PlaceKey key, string quantity, DateTimeOffset from, DateTimeOffset to, int limit, Reading last) => string.Create(
        CultureInfo.InvariantCulture,
        $"/api/v1/places/{key.Site}/{key.Place}/readings?quantity={quantity}&from={Rfc3339.Text(from)}&to={Rfc3339.Text(to)}&limit={limit}&after={last.Time.ToUnixTimeMilliseconds()}-{last.Series.Probe}");

    private static bool TryReadCursor(string text, out ReadingCursor cursor)
    {
        cursor = default;
        int dash = text.IndexOf('-', StringComparison.Ordinal);
        if (dash < 1 || !long.TryParse(text.AsSpan(0, dash), NumberStyles.None, CultureInfo.InvariantCulture, out long ms) || ms > 253_402_300_799_999)
            return false;
        cursor = new ReadingCursor(DateTimeOffset.FromUnixTimeMilliseconds(ms), text[(dash + 1)..]);
        return true;
    }

    private static string? FaultOfQuantity(string? quantity)
    {
        if (string.IsNullOrEmpty(quantity))
            return "quantity: which one? For example quantity=ph or quantity=co2.";
        return PlaceNames.IsValidId(quantity) ? null : $"quantity: \"{quantity}\" is not a quantity; its name is 1 to 64 of a-z 0-9 - _.";
    }

    private static void WriteTime(Utf8JsonWriter w, string name, DateTimeOffset time) => w.WriteString(name, Rfc3339.Text(time));
}
