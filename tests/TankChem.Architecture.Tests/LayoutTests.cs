using System.Text.RegularExpressions;

namespace TankChem.Architecture.Tests;

/// <summary>What lies where, how long files are, and that documents point at something.</summary>
public sealed partial class LayoutTests
{
    private const int LinesMax = 500;

    private static readonly string[] TopLevel = ["DEVELOPERS.md", "LICENSE", "README.md", "TankChem.sln", "config", "docs", "migrations", "src", "tests"];

    private static readonly string[] TextKinds = [".cs", ".razor", ".md", ".csproj", ".props", ".targets", ".json", ".css", ".js", ".csv", ".txt", ".yml", ".sln", ".svg", ".html"];

    /// <summary>Folders every system has; a path below them says nothing about one machine.</summary>
    private static readonly string[] CommonFolders = ["bin", "etc", "home", "lib", "opt", "root", "src", "srv", "tmp", "usr", "var"];

    [Fact]
    public void TopLevel_HoldsOnlyWhatIsFixed()
    {
        string[] ignored = [.. File.ReadLines(Path.Combine(SourceTree.Root, ".gitignore")).Select(l => l.Trim().Trim('/'))];
        string[] found = [.. new DirectoryInfo(SourceTree.Root).EnumerateFileSystemInfos().Select(e => e.Name).Where(n => n[0] != '.' && !ignored.Contains(n, StringComparer.Ordinal))];

        Assert.Equal(TopLevel, found.Order(StringComparer.Ordinal));
    }

    [Fact]
    public void Solution_HoldsEveryProjectAndNoOther()
    {
        string solution = File.ReadAllText(Path.Combine(SourceTree.Root, "TankChem.sln"));
        string[] listed = [.. SolutionProject().Matches(solution).Select(m => m.Groups["path"].Value.Replace('\\', '/')).Order(StringComparer.Ordinal)];

        Assert.Equal(SourceTree.Projects.Select(SourceTree.Relative).Order(StringComparer.Ordinal), listed);
    }

    [Fact]
    public void SourceFile_IsShorterThanFiveHundredLines() =>
        Assert.Empty(SourceTree.Files("*.cs", "src").Where(f => File.ReadLines(f).Count() >= LinesMax).Select(SourceTree.Relative));

    [Fact]
    public void Document_RelativeLinks_LeadToSomething()
    {
        string[] documents = [Path.Combine(SourceTree.Root, "README.md"), Path.Combine(SourceTree.Root, "DEVELOPERS.md"), .. SourceTree.Files("*.md", "docs", "tests", "config")];
        string[] broken =
        [
            .. documents.SelectMany(d => Link().Matches(File.ReadAllText(d))
                .Select(m => m.Groups["target"].Value)
                .Where(t => !t.Contains("://", StringComparison.Ordinal) && !t.StartsWith('#') && !t.StartsWith("mailto:", StringComparison.Ordinal))
                .Where(t => !Path.Exists(Path.Combine(Path.GetDirectoryName(d)!, t.Split('#')[0])))
                .Select(t => $"{SourceTree.Relative(d)} -> {t}")),
        ];

        Assert.Empty(broken);
    }

    [Fact]
    public void NoFile_NamesTheMachineItWasMadeOnOrItsOrigins()
    {
        var forbidden = new List<string> { "lec" + "ture", "trans" + "cript" };
        for (DirectoryInfo? folder = new(SourceTree.Root); folder?.Parent is not null; folder = folder.Parent)
        {
            if (folder.Parent.Parent is not null || !CommonFolders.Contains(folder.Name, StringComparer.Ordinal))
                forbidden.Add(folder.FullName + Path.DirectorySeparatorChar);
        }

        IEnumerable<string> files = SourceTree.Files("*", "src", "tests", "migrations", "config", "docs")
            .Concat(Directory.EnumerateFiles(SourceTree.Root).Where(f => Path.GetFileName(f) != ".git"))
            .Where(f => TextKinds.Contains(Path.GetExtension(f), StringComparer.Ordinal) || Path.GetExtension(f).Length == 0);
        string[] found =
        [
            .. files.SelectMany(f => File.ReadLines(f)
                .Select((line, i) => (line, i))
                .Where(l => forbidden.Any(w => l.line.Contains(w, StringComparison.OrdinalIgnoreCase)) || HomeFolder().IsMatch(l.line))
                .Select(l => $"{SourceTree.Relative(f)}:{l.i + 1}")),
        ];

        Assert.Empty(found);
    }

    [GeneratedRegex("""^Project\("[^"]*"\) = "[^"]*", "(?<path>[^"]*\.csproj)""", RegexOptions.Multiline | RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex SolutionProject();

    [GeneratedRegex("""\]\((?<target>[^)\s]+)""", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex Link();

    [GeneratedRegex("""(?<![\w/.])(/home/|/Users/|[A-Z]:\\Users\\)\w+""", RegexOptions.ExplicitCapture, 1000)]
    private static partial Regex HomeFolder();
}
