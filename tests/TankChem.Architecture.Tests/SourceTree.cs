using System.Xml.Linq;

namespace TankChem.Architecture.Tests;

/// <summary>The files of this repository, without what builds and editors leave behind.</summary>
internal static class SourceTree
{
    private static readonly string[] Ignored = ["bin", "obj", "node_modules", "TestResults", "artifacts", "lib"];

    public static string Root => TestKit.Repository.Root;

    public static IEnumerable<string> Files(string pattern, params string[] folders) =>
        folders.SelectMany(f => FilesUnder(new DirectoryInfo(Path.Combine(Root, f)), pattern)).Select(f => f.FullName).Order(StringComparer.Ordinal);

    public static IEnumerable<string> Projects => Files("*.csproj", "src", "tests", "migrations");

    public static string Relative(string path) => Path.GetRelativePath(Root, path).Replace('\\', '/');

    public static string[] References(string project) =>
        [.. Items(project, "ProjectReference").Select(r => Path.GetFileNameWithoutExtension(r.Replace('\\', '/'))).Order(StringComparer.Ordinal)];

    public static string[] Items(string project, string item) =>
        [.. XDocument.Load(project).Descendants(item).Select(e => e.Attribute("Include")?.Value ?? throw new InvalidDataException($"{Relative(project)}: a {item} without Include."))];

    private static IEnumerable<FileInfo> FilesUnder(DirectoryInfo folder, string pattern) => folder.EnumerateFiles(pattern)
        .Concat(folder.EnumerateDirectories().Where(d => !Ignored.Contains(d.Name, StringComparer.Ordinal)).SelectMany(d => FilesUnder(d, pattern)));
}
