using System.Diagnostics.CodeAnalysis;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Mqtt.Topics;

/// <summary>A topic that the service takes, read.</summary>
/// <param name="Kind">What it is for.</param>
/// <param name="Place">Where.</param>
/// <param name="Series">Which series; only meaningful for a reading and a device's state.</param>
/// <param name="Rule">Which alarm rule; empty unless it is a command.</param>
public sealed record TopicName(TopicKind Kind, PlaceKey Place, SeriesKey Series, string Rule)
{
    /// <summary>Where readings come in.</summary>
    public const string In = "tankchem/in/";

    /// <summary>Where only the service speaks.</summary>
    public const string Out = "tankchem/out/";

    /// <summary>Where commands come in.</summary>
    public const string Command = "tankchem/cmd/";

    private const string Answer = "tankchem/answer/";
    private const string Shape = "tankchem/in/<site>/<place>/<quantity>";

    /// <summary>Characters of the longest topic that can be right: the prefix and four levels of 64.</summary>
    private const int LengthMax = 12 + 4 * TopicText.IdLengthMax + 3;

    /// <summary>Reads a topic.</summary>
    /// <param name="topic">The topic.</param>
    /// <param name="name">What it says.</param>
    /// <param name="fault">What is wrong, where, and what would be right.</param>
    public static bool TryParse(string topic, [NotNullWhen(true)] out TopicName? name, [NotNullWhen(false)] out string? fault)
    {
        ArgumentNullException.ThrowIfNull(topic);
        name = null;
        fault = TopicText.Fault(topic);
        if (fault is not null)
            return false;
        if (topic.StartsWith(In, StringComparison.Ordinal))
            return TryLength(topic, out fault) && TryParseIn(topic.Split('/'), out name, out fault);
        if (topic.StartsWith(Command, StringComparison.Ordinal))
            return TryLength(topic, out fault) && TryParseCommand(topic.Split('/'), out name, out fault);
        fault = Foreign(topic);
        return false;
    }

    private static bool TryLength(string topic, [NotNullWhen(false)] out string? fault)
    {
        fault = topic.Length <= LengthMax ? null : $"topic: {topic.Length} characters long; each level has at most {TopicText.IdLengthMax}, the whole at most {LengthMax}.";
        return fault is null;
    }

    private static string Foreign(string topic)
    {
        if (topic.StartsWith(Out, StringComparison.Ordinal))
            return $"topic: only the service speaks under {Out}; readings go to {Shape}.";
        if (topic.StartsWith(Answer, StringComparison.Ordinal))
            return "topic: an answer to a dose order, but this service has given no order.";
        if (topic.StartsWith(In, StringComparison.OrdinalIgnoreCase) || topic.StartsWith(Command, StringComparison.OrdinalIgnoreCase))
            return $"topic: begins with capitals; lower case would be right: {Shape}.";
        return topic.StartsWith("tankchem", StringComparison.Ordinal)
            ? $"topic: not one of this service's; right would be {Shape}, or tankchem/cmd/<site>/<place>/alarm/<rule>."
            : $"topic: no mapping of the configuration takes it; readings go to {Shape}, other topics need an entry in \"mappings\".";
    }

    private static bool TryParseIn(string[] levels, [NotNullWhen(true)] out TopicName? name, [NotNullWhen(false)] out string? fault)
    {
        name = null;
        if (levels.Length is < 4 or > 6)
        {
            fault = $"topic: {levels.Length} levels; right would be {Shape}, {Shape}/<probe>, or tankchem/in/<site>/<place> with a SenML pack.";
            return false;
        }

        if (!TryIds(levels, 2, "<site>", out fault) || !TryIds(levels, 3, "<place>", out fault))
            return false;
        var place = new PlaceKey(levels[2], levels[3]);
        if (levels.Length == 4)
        {
            name = new TopicName(TopicKind.Pack, place, default, "");
            return true;
        }

        if (!TryIds(levels, 4, "<quantity>", out fault))
            return false;
        bool isState = levels[4] == SeriesKey.DeviceState;
        if (levels.Length == 5)
        {
            if (isState)
            {
                fault = "topic: names no device; right would be tankchem/in/<site>/<place>/state/<device>.";
                return false;
            }

            name = new TopicName(TopicKind.Reading, place, new SeriesKey(place, levels[4], SeriesKey.MainProbe), "");
            return true;
        }

        if (!TryIds(levels, 5, isState ? "<device>" : "<probe>", out fault))
            return false;
        name = new TopicName(isState ? TopicKind.DeviceState : TopicKind.Reading, place, new SeriesKey(place, levels[4], levels[5]), "");
        return true;
    }

    private static bool TryParseCommand(string[] levels, [NotNullWhen(true)] out TopicName? name, [NotNullWhen(false)] out string? fault)
    {
        name = null;
        if (levels.Length != 6 || levels[4] != "alarm")
        {
            fault = "topic: not a command; right would be tankchem/cmd/<site>/<place>/alarm/<rule>.";
            return false;
        }

        if (!TryIds(levels, 2, "<site>", out fault) || !TryIds(levels, 3, "<place>", out fault) || !TryIds(levels, 5, "<rule>", out fault))
            return false;
        name = new TopicName(TopicKind.AlarmCommand, new PlaceKey(levels[2], levels[3]), default, levels[5]);
        return true;
    }

    private static bool TryIds(string[] levels, int index, string what, [NotNullWhen(false)] out string? fault)
    {
        fault = TopicText.IdFault(levels[index]) is { } wrong ? $"topic: level {index + 1}, {what}, {wrong}." : null;
        return fault is null;
    }
}
