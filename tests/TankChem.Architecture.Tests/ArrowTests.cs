namespace TankChem.Architecture.Tests;

/// <summary>The arrows of docs/architecture.md.</summary>
public sealed class ArrowTests
{
    [Theory]
    [InlineData("TankChem.Chemistry")]
    [InlineData("TankChem.Alarms")]
    [InlineData("TankChem.Dosing", "TankChem.Chemistry")]
    [InlineData("TankChem.Monitoring", "TankChem.Alarms", "TankChem.Chemistry", "TankChem.Dosing")]
    [InlineData("TankChem.Storage", "TankChem.Alarms", "TankChem.Dosing", "TankChem.Monitoring")]
    [InlineData("TankChem.Mqtt", "TankChem.Alarms", "TankChem.Dosing", "TankChem.Monitoring")]
    [InlineData("TankChem.Simulation", "TankChem.Chemistry")]
    [InlineData("TankChem.Dashboard", "TankChem.Alarms", "TankChem.Dosing", "TankChem.Monitoring")]
    public void Room_UsesOnlyTheRoomsItMay(string room, params string[] allowed) =>
        Assert.Empty(SourceTree.References(ProjectOf(room)).Except(allowed, StringComparer.Ordinal));

    [Fact]
    public void Rooms_AreThoseOfTheDocument()
    {
        string[] rooms = [.. SourceTree.Files("*.csproj", "src").Select(p => Path.GetFileNameWithoutExtension(p)!)];
        string document = File.ReadAllText(Path.Combine(SourceTree.Root, "docs", "architecture.md"));

        Assert.Equal(9, rooms.Length);
        Assert.All(rooms, room => Assert.Contains($"| `{room}` |", document, StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("TankChem.Chemistry")]
    [InlineData("TankChem.Alarms")]
    [InlineData("TankChem.Dosing")]
    [InlineData("TankChem.Monitoring")]
    [InlineData("TankChem.Simulation")]
    public void PureRoom_HasNoPackages(string room)
    {
        Assert.Empty(SourceTree.Items(ProjectOf(room), "PackageReference"));
        Assert.Empty(SourceTree.Items(ProjectOf(room), "FrameworkReference"));
    }

    [Theory]
    [InlineData("TankChem.Dashboard", "Sqlite")]
    [InlineData("TankChem.Dashboard", "MQTTnet")]
    [InlineData("TankChem.Storage", "MQTTnet")]
    [InlineData("TankChem.Mqtt", "Sqlite")]
    public void Shell_StaysWithItsOwnTechnique(string room, string package)
    {
        Assert.DoesNotContain(SourceTree.Items(ProjectOf(room), "PackageReference"), p => p.Contains(package, StringComparison.OrdinalIgnoreCase));
        Assert.DoesNotContain(
            SourceTree.Files("*.cs", $"src/{room}"),
            f => File.ReadLines(f).Any(l => l.StartsWith("using ", StringComparison.Ordinal) && l.Contains(package, StringComparison.OrdinalIgnoreCase)));
    }

    [Fact]
    public void Dashboard_UsesNoChemistry() => Assert.DoesNotContain(
        SourceTree.Files("*", "src/TankChem.Dashboard").Where(f => f.EndsWith(".cs", StringComparison.Ordinal) || f.EndsWith(".razor", StringComparison.Ordinal)),
        f => File.ReadAllText(f).Contains("TankChem.Chemistry", StringComparison.Ordinal));

    private static string ProjectOf(string room) => Path.Combine(SourceTree.Root, "src", room, room + ".csproj");
}
