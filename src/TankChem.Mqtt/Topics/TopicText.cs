using System.Globalization;
using System.Text;

namespace TankChem.Mqtt.Topics;

/// <summary>Characters of topics: what is allowed, and how to show what is not.</summary>
internal static class TopicText
{
    /// <summary>Characters of the longest id.</summary>
    public const int IdLengthMax = 64;

    private const int ShownMax = 512;
    private const string IdRule = "1 to 64 of a-z 0-9 - _ would be right";

    /// <summary>What makes a topic unfit to publish to, whoever it is for; null when nothing does.</summary>
    public static string? Fault(string topic)
    {
        if (topic.Length == 0)
            return "topic: empty.";
        if (topic[0] == '$')
            return "topic: begins with $, which brokers keep for themselves.";
        for (int i = 0; i < topic.Length; i++)
        {
            char c = topic[i];
            if (c is '+' or '#')
                return $"topic: character {i + 1} is the wildcard {c}, which is for subscribing, not for publishing.";
            if (c < ' ' || c is >= '\u007f' and < '\u00a0')
                return $"topic: character {i + 1} is the control character U+{(int)c:X4}.";
            if (c == '\ufffd')
                return $"topic: character {i + 1} is U+FFFD, which stands for bytes that were not UTF-8.";
        }

        return null;
    }

    /// <summary>What makes an id wrong; null when it is right.</summary>
    public static string? IdFault(ReadOnlySpan<char> id)
    {
        if (id.IsEmpty)
            return $"is empty; {IdRule}";
        if (id.Length > IdLengthMax)
            return $"is {id.Length.ToString(CultureInfo.InvariantCulture)} characters long; {IdRule}";
        foreach (char c in id)
        {
            if (c is not (>= 'a' and <= 'z' or >= '0' and <= '9' or '-' or '_'))
                return $"\"{Shown(id)}\" has the character \"{Shown([c])}\"; {IdRule}";
        }

        return null;
    }

    /// <summary>A text for people: at most 512 characters, unprintable ones escaped.</summary>
    public static string Shown(ReadOnlySpan<char> text)
    {
        var shown = new StringBuilder(Math.Min(text.Length, ShownMax));
        foreach (char c in text)
        {
            bool plain = c >= ' ' && c is not (>= '\u007f' and < '\u00a0' or '\ufffd') && !char.IsSurrogate(c);
            string piece = plain ? c.ToString() : $"\\u{(int)c:x4}";
            if (shown.Length + piece.Length > ShownMax - 1)
                return shown.Append('…').ToString();
            shown.Append(piece);
        }

        return shown.ToString();
    }
}
