using System.Buffers;
using System.Text.Encodings.Web;
using System.Text.Json;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Bodies;

/// <summary>A water state as JSON: the same bytes over HTTP and MQTT.</summary>
public static class WaterBody
{
    /// <summary>Writer options of all bodies: °C and µ stay readable.</summary>
    public static JsonWriterOptions Options { get; } = new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    /// <summary>The body as UTF-8.</summary>
    /// <param name="state">The state.</param>
    /// <param name="isDemo">Adds <c>"demo": true</c>.</param>
    public static byte[] ToUtf8(WaterState state, bool isDemo)
    {
        var buffer = new ArrayBufferWriter<byte>(2048);
        using (var writer = new Utf8JsonWriter(buffer, Options))
            Write(writer, state, isDemo);
        return buffer.WrittenSpan.ToArray();
    }

    /// <summary>Writes the body.</summary>
    public static void Write(Utf8JsonWriter writer, WaterState state, bool isDemo)
    {
        ArgumentNullException.ThrowIfNull(writer);
        ArgumentNullException.ThrowIfNull(state);
        writer.WriteStartObject();
        writer.WriteString("site", state.Place.Site);
        writer.WriteString("place", state.Place.Place);
        writer.WriteString("kind", PlaceKindNames.Of(state.Kind));
        writer.WriteBoolean("assigned", state.Assigned);
        if (state.Time is { } time)
            writer.WriteString("time", Rfc3339.Text(time));
        else
            writer.WriteNull("time");
        writer.WriteString("status", StatusName(state.Status));
        writer.WriteString("reason", state.Reason);
        writer.WriteStartObject("values");
        foreach ((string name, WaterValue value) in state.Values)
            Write(writer, name, value);
        writer.WriteEndObject();
        if (isDemo)
            writer.WriteBoolean("demo", true);
        writer.WriteEndObject();
    }

    private static void Write(Utf8JsonWriter writer, string name, WaterValue value)
    {
        writer.WriteStartObject(name);
        writer.WriteNumber("value", value.Value);
        writer.WriteString("unit", value.Unit);
        if (value.U is { } u)
            writer.WriteNumber("u", u);
        else
            writer.WriteNull("u");
        writer.WriteString("time", Rfc3339.Text(value.Time));
        writer.WriteStartArray("inputs");
        foreach (WaterInput input in value.Inputs)
        {
            writer.WriteStartObject();
            writer.WriteString("quantity", input.Quantity);
            writer.WriteString("probe", input.Probe);
            writer.WriteString("place", input.Place.Place);
            writer.WriteString("time", Rfc3339.Text(input.Time));
            writer.WriteNumber("ageS", input.AgeS);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteStartArray("caveats");
        foreach (string caveat in value.Caveats)
            writer.WriteStringValue(caveat);
        writer.WriteEndArray();
        writer.WriteEndObject();
    }

    private static string StatusName(WaterStatus status) => status switch
    {
        WaterStatus.None => "none",
        WaterStatus.Partial => "partial",
        WaterStatus.Ok => "ok",
    };
}
