using System.Buffers;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;
using System.Text;
using TankChem.Mqtt.Topics;

namespace TankChem.Mqtt.Payloads;

/// <summary>Reads a plain decimal number, as <c>7.24</c> or <c>-1.5e3</c>.</summary>
internal static class PlainNumber
{
    private const int LengthMax = 128;
    private static readonly SearchValues<byte> NumberWithComma = SearchValues.Create("0123456789,.+-"u8);

    /// <summary>Reads one; white space around it is allowed.</summary>
    public static bool TryRead(ReadOnlySpan<byte> utf8, out double value, [NotNullWhen(false)] out string? fault)
    {
        value = 0;
        ReadOnlySpan<byte> text = utf8.Trim(" \t\r\n"u8);
        if (text.Length > LengthMax)
        {
            fault = $"payload: {text.Length} bytes that begin with \"{Shown(text)}\" are no number; a plain decimal number, a JSON object or a SenML pack would be right.";
            return false;
        }

        if (!IsNumber(text))
        {
            fault = Fault(text);
            return false;
        }

        value = double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);
        fault = double.IsFinite(value) ? null : $"payload: {Shown(text)} is larger than any number here can be.";
        return fault is null;
    }

    private static bool IsNumber(ReadOnlySpan<byte> text)
    {
        int at = text.Length > 0 && text[0] is (byte)'+' or (byte)'-' ? 1 : 0;
        int whole = Digits(text, ref at);
        int part = 0;
        if (at < text.Length && text[at] == '.')
        {
            at++;
            part = Digits(text, ref at);
        }

        if (whole + part == 0)
            return false;
        if (at < text.Length && text[at] is (byte)'e' or (byte)'E')
        {
            at++;
            if (at < text.Length && text[at] is (byte)'+' or (byte)'-')
                at++;
            if (Digits(text, ref at) == 0)
                return false;
        }

        return at == text.Length;
    }

    private static int Digits(ReadOnlySpan<byte> text, ref int at)
    {
        int start = at;
        while (at < text.Length && text[at] is >= (byte)'0' and <= (byte)'9')
            at++;
        return at - start;
    }

    private static string Fault(ReadOnlySpan<byte> text)
    {
        string shown = Shown(text);
        if (text.IndexOf((byte)',') >= 0 && !text.ContainsAnyExcept(NumberWithComma))
            return $"payload: {shown} has a comma; a point, as in 7.24, would be right.";
        return shown.Trim('+', '-').ToUpperInvariant() is "NAN" or "INF" or "INFINITY"
            ? $"payload: {shown} is no measured value; send nothing when there is none."
            : $"payload: \"{shown}\" is no number; a plain decimal number as 7.24, a JSON object or a SenML pack would be right.";
    }

    private static string Shown(ReadOnlySpan<byte> text) => TopicText.Shown(Encoding.UTF8.GetString(text[..Math.Min(text.Length, 40)]));
}
