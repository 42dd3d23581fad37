using System.Buffers;
using System.Text.Json;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;

namespace TankChem.Monitoring.Bodies;

/// <summary>An alarm as JSON: the same bytes over HTTP and MQTT.</summary>
public static class AlarmBody
{
    /// <summary>All names of <see cref="StateName"/>.</summary>
    public static IReadOnlyList<string> StateNames { get; } =
        ["normal", "unacknowledged", "acknowledged", "returned-unacknowledged", "latched-unacknowledged", "latched-acknowledged", "shelved", "suppressed-by-design", "out-of-service"];

    /// <summary>The state in one word: how it is kept back, when it is, otherwise where it stands.</summary>
    public static string StateName(AlarmState state)
    {
        ArgumentNullException.ThrowIfNull(state);
        return state.Suppression switch
        {
            AlarmSuppression.Shelved => "shelved",
            AlarmSuppression.ByDesign => "suppressed-by-design",
            AlarmSuppression.OutOfService => "out-of-service",
            AlarmSuppression.None => state.Phase switch
            {
                AlarmPhase.Normal => "normal",
                AlarmPhase.Unacknowledged => "unacknowledged",
                AlarmPhase.Acknowledged => "acknowledged",
                AlarmPhase.ReturnedUnacknowledged => "returned-unacknowledged",
                AlarmPhase.LatchedUnacknowledged => "latched-unacknowledged",
                AlarmPhase.LatchedAcknowledged => "latched-acknowledged",
            },
        };
    }

    /// <summary>The body as UTF-8.</summary>
    public static byte[] ToUtf8(AlarmView alarm, bool isDemo)
    {
        var buffer = new ArrayBufferWriter<byte>(1024);
        using (var writer = new Utf8JsonWriter(buffer, WaterBody.Options))
            Write(writer, alarm, isDemo);
        return buffer.WrittenSpan.ToArray();
    }

    /// <summary>Writes the body.</summary>
    public static void Write(Utf8JsonWriter writer, AlarmView alarm, bool isDemo)
    {
        ArgumentNullException.ThrowIfNull(writer);
        ArgumentNullException.ThrowIfNull(alarm);
        writer.WriteStartObject();
        writer.WriteString("site", alarm.Key.Place.Site);
        writer.WriteString("place", alarm.Key.Place.Place);
        writer.WriteString("rule", alarm.Key.Rule);
        writer.WriteString("title", alarm.Title);
        writer.WriteString("quantity", alarm.Quantity);
        writer.WriteString("priority", PriorityName(alarm.Priority));
        writer.WriteString("state", StateName(alarm.State));
        writer.WriteBoolean("active", alarm.IsActive);
        Number(writer, "value", alarm.Value);
        writer.WriteString("unit", alarm.Unit);
        Number(writer, "setPoint", alarm.SetPoint);
        writer.WriteString("setBy", alarm.SetBy);
        writer.WriteString("sentence", alarm.Sentence);
        writer.WriteString("firstAction", alarm.FirstAction);
        writer.WriteString("consequence", alarm.Consequence);
        writer.WriteBoolean("dangerToPeople", alarm.DangerToPeople);
        Time(writer, "raisedAt", alarm.State.RaisedAt);
        Time(writer, "changedAt", alarm.State.ChangedAt);
        if (alarm.State.AcknowledgedBy is { } who)
        {
            writer.WriteStartObject("acknowledged");
            writer.WriteString("by", who);
            Time(writer, "at", alarm.State.AcknowledgedAt);
            writer.WriteString("reason", alarm.State.AcknowledgedReason);
            writer.WriteBoolean("verified", false);
            writer.WriteEndObject();
        }
        else
        {
            writer.WriteNull("acknowledged");
        }

        Time(writer, "shelvedUntil", alarm.State.ShelvedUntil);
        if (isDemo)
            writer.WriteBoolean("demo", true);
        writer.WriteEndObject();
    }

    /// <summary>A priority in one word.</summary>
    public static string PriorityName(AlarmPriority priority) => priority switch
    {
        AlarmPriority.Low => "low",
        AlarmPriority.Medium => "medium",
        AlarmPriority.High => "high",
        AlarmPriority.Critical => "critical",
    };

    private static void Number(Utf8JsonWriter writer, string name, double? value)
    {
        if (value is { } number)
            writer.WriteNumber(name, number);
        else
            writer.WriteNull(name);
    }

    private static void Time(Utf8JsonWriter writer, string name, DateTimeOffset? time)
    {
        if (time is { } at)
            writer.WriteString(name, Rfc3339.Text(at));
        else
            writer.WriteNull(name);
    }
}
