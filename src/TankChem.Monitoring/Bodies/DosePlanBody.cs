using System.Text.Json;
using TankChem.Dosing;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Bodies;

/// <summary>The question for a dose plan, and its answer.</summary>
public static class DosePlanBody
{
    private const int ReagentsMax = 10;
    private static readonly string[] Members = ["target", "reagents"];
    private static readonly string[] TargetMembers = ["quantity", "value", "unit"];

    /// <summary>Reads a question.</summary>
    /// <param name="utf8">The body.</param>
    /// <param name="target">What the water shall be, canonical unit.</param>
    /// <param name="reagents">Reagent ids; empty when the planner chooses.</param>
    /// <param name="fault">What is wrong and what would be right; null when read.</param>
    public static bool TryParse(ReadOnlyMemory<byte> utf8, out DoseTarget? target, out IReadOnlyList<string> reagents, out string? fault)
    {
        target = null;
        reagents = [];
        if (!JsonObjectReader.TryRead(utf8, Members, out Dictionary<string, JsonElement> members, out fault))
            return false;
        if (!members.TryGetValue("target", out JsonElement targetElement))
        {
            fault = "target: missing; right would be {\"quantity\":\"alkalinity\",\"value\":2.0,\"unit\":\"mmol/L\"}.";
            return false;
        }

        return TryParseTarget(targetElement, out target, out fault) && TryParseReagents(members, out reagents, out fault);
    }

    /// <summary>Writes an answer.</summary>
    public static void Write(Utf8JsonWriter writer, DosePlan plan, DateTimeOffset now, bool isDemo)
    {
        ArgumentNullException.ThrowIfNull(writer);
        ArgumentNullException.ThrowIfNull(plan);
        writer.WriteStartObject();
        writer.WriteBoolean("allowed", plan.Allowed);
        writer.WriteStartArray("grounds");
        foreach (DoseGround ground in plan.Grounds)
        {
            writer.WriteStartObject();
            writer.WriteString("kind", ground.Kind);
            writer.WriteString("quantity", ground.Quantity);
            writer.WriteString("text", ground.Text);
            if (ground.Probability is { } probability)
                writer.WriteNumber("probability", probability);
            else
                writer.WriteNull("probability");
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteStartArray("steps");
        foreach (DoseStep step in plan.Steps)
            Write(writer, step, now);
        writer.WriteEndArray();
        Texts(writer, "reasons", plan.Reasons);
        Texts(writer, "cautions", plan.Cautions);
        writer.WriteString("nearest", plan.Nearest);
        if (isDemo)
            writer.WriteBoolean("demo", true);
        writer.WriteEndObject();
    }

    private static void Write(Utf8JsonWriter writer, DoseStep step, DateTimeOffset now)
    {
        writer.WriteStartObject();
        writer.WriteNumber("afterS", step.AfterS);
        writer.WriteString("reagent", step.Reagent);
        writer.WriteStartObject("amount");
        writer.WriteNumber("value", step.AmountG);
        writer.WriteString("unit", "g");
        writer.WriteEndObject();
        string time = Rfc3339.Text(now.AddSeconds(step.AfterS));
        Write(writer, "closed", step.Closed, time);
        Write(writer, "settled", step.Settled, time);
        Write(writer, "air", step.Air, time);
        writer.WriteEndObject();
    }

    private static void Write(Utf8JsonWriter writer, string name, PredictedWater water, string time)
    {
        writer.WriteStartObject(name);
        Write(writer, "ph", water.PH, time);
        Write(writer, "alkalinity", water.AlkalinityMmolL, time);
        Write(writer, "co2", water.Co2MgL, time);
        if (water.Nh3NMgL is { } nh3)
            Write(writer, "nh3-n", nh3, time);
        if (water.OmegaCalcite is { } omega)
            Write(writer, "omega-calcite", new Estimate(omega, double.NaN), time);
        writer.WriteEndObject();
    }

    private static void Write(Utf8JsonWriter writer, string quantity, Estimate value, string time)
    {
        writer.WriteStartObject(quantity);
        writer.WriteNumber("value", value.Value);
        writer.WriteString("unit", QuantityCatalog.Get(quantity).Unit);
        if (double.IsFinite(value.StandardUncertainty))
            writer.WriteNumber("u", value.StandardUncertainty);
        else
            writer.WriteNull("u");
        writer.WriteString("time", time);
        writer.WriteStartArray("inputs");
        writer.WriteEndArray();
        writer.WriteStartArray("caveats");
        writer.WriteStringValue("predicted");
        writer.WriteEndArray();
        writer.WriteEndObject();
    }

    private static void Texts(Utf8JsonWriter writer, string name, IReadOnlyList<string> texts)
    {
        writer.WriteStartArray(name);
        foreach (string text in texts)
            writer.WriteStringValue(text);
        writer.WriteEndArray();
    }

    private static bool TryParseTarget(JsonElement element, out DoseTarget? target, out string? fault)
    {
        target = null;
        var members = new Dictionary<string, JsonElement>(StringComparer.Ordinal);
        if (!JsonObjectReader.TryRead(element, "target", TargetMembers, members, out fault)
            || !JsonObjectReader.TryText(members, "quantity", out string? quantity, out fault)
            || !JsonObjectReader.TryText(members, "unit", out string? unit, out fault))
            return false;
        double value = double.NaN;
        if (quantity is null)
            fault = "target.quantity: missing; right would be alkalinity.";
        else if (!members.TryGetValue("value", out JsonElement number) || number.ValueKind != JsonValueKind.Number || !number.TryGetDouble(out value) || !double.IsFinite(value))
            fault = "target.value: must be a number.";
        else if (unit is null)
            fault = "target.unit: missing; say which unit the number is in, like mmol/L or dKH.";
        else if (!UnitConverter.TryConvert(quantity, unit, value, out value, out string? unitFault))
            fault = $"target.unit: {unitFault}.";
        if (fault is not null)
            return false;
        target = new DoseTarget(quantity!, value);
        return true;
    }

    private static bool TryParseReagents(Dictionary<string, JsonElement> members, out IReadOnlyList<string> reagents, out string? fault)
    {
        reagents = [];
        fault = null;
        if (!members.TryGetValue("reagents", out JsonElement element) || element.ValueKind == JsonValueKind.Null)
            return true;
        if (element.ValueKind != JsonValueKind.Array || element.GetArrayLength() > ReagentsMax || element.EnumerateArray().Any(e => e.ValueKind != JsonValueKind.String))
        {
            fault = $"reagents: must be a list of at most {ReagentsMax} reagent names, like [\"sodium-bicarbonate\"].";
            return false;
        }

        reagents = [.. element.EnumerateArray().Select(e => e.GetString()!)];
        return true;
    }
}
