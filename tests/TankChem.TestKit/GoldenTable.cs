using System.Globalization;

namespace TankChem.TestKit;

/// <summary>A reference table of tests/golden: comment lines begin with #, then a header, then rows without quotes.</summary>
public sealed class GoldenTable
{
    private readonly Dictionary<string, int> columns;

    private GoldenTable(string[] header, IReadOnlyList<GoldenRow> rows)
    {
        columns = header.Select((name, at) => (name, at)).ToDictionary(c => c.name, c => c.at, StringComparer.Ordinal);
        Rows = rows;
        foreach (GoldenRow row in rows)
            row.Columns = columns;
    }

    /// <summary>All rows in order.</summary>
    public IReadOnlyList<GoldenRow> Rows { get; }

    /// <summary>Reads a table by its file name.</summary>
    public static GoldenTable Read(string file)
    {
        string[] lines = [.. File.ReadLines(Path.Combine(Repository.Root, "tests", "golden", file)).Where(l => l.Length > 0 && l[0] != '#')];
        return new GoldenTable(lines[0].Split(','), [.. lines.Skip(1).Select(l => new GoldenRow(l.Split(',')))]);
    }
}

/// <summary>A row of a reference table.</summary>
public sealed class GoldenRow(string[] cells)
{
    internal IReadOnlyDictionary<string, int> Columns { get; set; } = new Dictionary<string, int>(StringComparer.Ordinal);

    /// <summary>A number; NaN for an empty cell.</summary>
    public double this[string column] => Text(column) is { Length: > 0 } text ? double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture) : double.NaN;

    /// <summary>A text.</summary>
    public string Text(string column) => cells[Columns[column]];
}
