using System.Text;

namespace TankChem.Service.Tests.Solve;

/// <summary>An independent reader of RFC 4180, so that the tests do not read with what wrote.</summary>
internal static class CsvText
{
    public static IEnumerable<string[]> Parse(string text)
    {
        var cells = new List<string>();
        var cell = new StringBuilder();
        bool quoted = false;
        for (int i = 0; i < text.Length; i++)
        {
            char c = text[i];
            if (quoted && c == '"' && i + 1 < text.Length && text[i + 1] == '"')
            {
                cell.Append('"');
                i++;
            }
            else if (c == '"')
            {
                quoted = !quoted;
            }
            else if (!quoted && c == ',')
            {
                cells.Add(cell.ToString());
                cell.Clear();
            }
            else if (!quoted && c == '\n')
            {
                cells.Add(cell.ToString().TrimEnd('\r'));
                cell.Clear();
                yield return [.. cells];
                cells.Clear();
            }
            else
            {
                cell.Append(c);
            }
        }
    }
}
