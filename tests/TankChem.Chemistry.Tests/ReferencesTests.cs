using System.Text.RegularExpressions;
using TankChem.TestKit;

namespace TankChem.Chemistry.Tests;

/// <summary>Source keys in comments of the code and entries of docs/references.md belong together.</summary>
public partial class ReferencesTests
{
    [Fact]
    public void References_KeysInCodeAndEntries_AreTheSame()
    {
        SortedSet<string> inCode = new(
            Directory.EnumerateFiles(Path.Combine(Repository.Root, "src", "TankChem.Chemistry"), "*.cs", SearchOption.AllDirectories)
                .Where(f => !f.Contains($"{Path.DirectorySeparatorChar}obj{Path.DirectorySeparatorChar}", StringComparison.Ordinal))
                .SelectMany(File.ReadLines)
                .Select(line => line.TrimStart())
                .Where(line => line.StartsWith("//", StringComparison.Ordinal))
                .SelectMany(line => Key().Matches(line).Select(m => m.Value)),
            StringComparer.Ordinal);
        string[] entries = [.. File.ReadLines(Path.Combine(Repository.Root, "docs", "references.md")).Select(line => Entry().Match(line)).Where(m => m.Success).Select(m => m.Groups["key"].Value)];

        Assert.Equal(entries.Length, entries.Distinct().Count());
        Assert.Equal(entries.Order(StringComparer.Ordinal), inCode);
    }

    [Fact]
    public void References_KeysOfTheModelDocument_HaveAnEntry()
    {
        string entries = File.ReadAllText(Path.Combine(Repository.Root, "docs", "references.md"));
        foreach (Match key in Key().Matches(File.ReadAllText(Path.Combine(Repository.Root, "docs", "chemistry.md"))))
            Assert.Contains($"- **{key.Value}** ", entries, StringComparison.Ordinal);
    }

    /// <summary>Letters of the authors, two digits of the year, perhaps a letter.</summary>
    [GeneratedRegex(@"\b[A-Z][A-Za-z]{0,3}\d{2}[a-z]?\b", RegexOptions.NonBacktracking | RegexOptions.CultureInvariant)]
    private static partial Regex Key();

    [GeneratedRegex(@"^- \*\*(?<key>[A-Za-z0-9]+)\*\* ", RegexOptions.NonBacktracking | RegexOptions.CultureInvariant)]
    private static partial Regex Entry();
}
