using System.Globalization;

namespace TankChem.Service.Solve;

/// <summary>Writes cells per RFC 4180.</summary>
internal static class CsvCell
{
    private static readonly System.Buffers.SearchValues<char> NeedQuotes = System.Buffers.SearchValues.Create(",\"\r\n");

    /// <summary>Writes a text, quoted where it has to be.</summary>
    public static void Write(TextWriter output, ReadOnlySpan<char> text)
    {
        if (text.IndexOfAny(NeedQuotes) < 0)
        {
            output.Write(text);
            return;
        }

        output.Write('"');
        foreach (char c in text)
        {
            if (c == '"')
                output.Write('"');
            output.Write(c);
        }

        output.Write('"');
    }

    /// <summary>Writes a number so that it reads back to the same double; NaN as an empty cell.</summary>
    public static void Write(TextWriter output, double value)
    {
        if (double.IsNaN(value))
            return;
        Span<char> buffer = stackalloc char[32];
        if (value.TryFormat(buffer, out int length, "R", CultureInfo.InvariantCulture))
            output.Write(buffer[..length]);
        else
            output.Write(value.ToString("R", CultureInfo.InvariantCulture));
    }
}
