namespace TankChem.Mqtt.Topics;

/// <summary>Matches topics against a filter with <c>+</c> and <c>#</c> (MQTT 5.0, section 4.7).</summary>
internal static class TopicFilter
{
    /// <summary>Whether a filter takes a topic.</summary>
    public static bool Matches(ReadOnlySpan<char> filter, ReadOnlySpan<char> topic)
    {
        while (true)
        {
            ReadOnlySpan<char> wanted = Level(filter, out ReadOnlySpan<char> filterRest, out bool filterEnds);
            if (wanted is "#")
                return true;
            ReadOnlySpan<char> level = Level(topic, out ReadOnlySpan<char> topicRest, out bool topicEnds);
            if (wanted is not "+" && !wanted.SequenceEqual(level))
                return false;

            // "a/#" takes "a" as well.
            if (topicEnds)
                return filterEnds || filterRest is "#";
            if (filterEnds)
                return false;
            filter = filterRest;
            topic = topicRest;
        }
    }

    private static ReadOnlySpan<char> Level(ReadOnlySpan<char> text, out ReadOnlySpan<char> rest, out bool ends)
    {
        int slash = text.IndexOf('/');
        ends = slash < 0;
        rest = ends ? default : text[(slash + 1)..];
        return ends ? text : text[..slash];
    }
}
