using System.Globalization;
using System.Text.Json;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;

namespace TankChem.Monitoring.Bodies;

/// <summary>A command to an alarm: <c>{"action", "who", "reason", "until"}</c>.</summary>
public static class AlarmCommandBody
{
    private const int WhoMax = 80;
    private const int ReasonMax = 1_000;
    private static readonly string[] Members = ["action", "who", "reason", "until"];

    private static readonly (string Name, AlarmAction Action)[] Actions =
    [
        ("acknowledge", AlarmAction.Acknowledge),
        ("shelve", AlarmAction.Shelve),
        ("unshelve", AlarmAction.Unshelve),
        ("out-of-service", AlarmAction.OutOfService),
        ("return-to-service", AlarmAction.ReturnToService),
        ("reset", AlarmAction.Reset),
    ];

    /// <summary>Reads a command.</summary>
    /// <param name="utf8">The body.</param>
    /// <param name="key">The alarm that it is for.</param>
    /// <param name="command">The command.</param>
    /// <param name="fault">What is wrong and what would be right; null when read.</param>
    public static bool TryParse(ReadOnlyMemory<byte> utf8, AlarmKey key, out AlarmCommand? command, out string? fault)
    {
        command = null;
        if (!JsonObjectReader.TryRead(utf8, Members, out Dictionary<string, JsonElement> members, out fault)
            || !JsonObjectReader.TryText(members, "action", out string? action, out fault)
            || !JsonObjectReader.TryText(members, "who", out string? who, out fault)
            || !JsonObjectReader.TryText(members, "reason", out string? reason, out fault)
            || !JsonObjectReader.TryText(members, "until", out string? until, out fault))
            return false;

        int at = Array.FindIndex(Actions, a => a.Name == action);
        DateTimeOffset end = default;
        if (at < 0)
            fault = $"action: {(action is null ? "missing" : $"\"{action}\" is not known")}; right would be {string.Join(", ", Actions.Select(a => a.Name))}.";
        else if (string.IsNullOrWhiteSpace(who))
            fault = "who: missing; say who asks, a name or initials.";
        else if (who.Length > WhoMax)
            fault = $"who: longer than {WhoMax} characters.";
        else if (reason?.Length > ReasonMax)
            fault = $"reason: longer than {ReasonMax} characters.";
        else if (until is not null && !DateTimeOffset.TryParse(until, CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal | DateTimeStyles.AdjustToUniversal, out end))
            fault = $"until: \"{until}\" is not a time; right would be RFC 3339, like 2026-05-01T10:00:00Z.";
        if (fault is not null)
            return false;
        command = new AlarmCommand(key, Actions[at].Action, who!.Trim(), reason, until is null ? null : end);
        return true;
    }
}
