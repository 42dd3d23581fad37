using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;

namespace TankChem.Architecture.Tests;

/// <summary>The pure rooms use no clock, no I/O, no logger, no threads: read from what their compiled code refers to.</summary>
public sealed class PurityTests
{
    private static readonly string[] ForbiddenTypes =
    [
        "System.IO.File", "System.IO.FileInfo", "System.IO.FileStream", "System.IO.Directory", "System.IO.DirectoryInfo", "System.TimeProvider", "System.Console",
        "System.Threading.Thread", "System.Threading.ThreadPool", "System.Threading.Timer", "System.Threading.PeriodicTimer", "System.Diagnostics.Stopwatch", "System.Diagnostics.Process",
    ];

    private static readonly string[] ForbiddenNamespaces = ["System.Net", "System.Data", "Microsoft.Extensions", "Microsoft.EntityFrameworkCore", "Microsoft.AspNetCore"];

    private static readonly string[] ForbiddenMembers =
    [
        "System.DateTime.get_Now", "System.DateTime.get_UtcNow", "System.DateTime.get_Today", "System.DateTimeOffset.get_Now", "System.DateTimeOffset.get_UtcNow",
        "System.Threading.Tasks.Task.Delay", "System.Threading.Tasks.Task.Run", "System.Random.get_Shared", "System.Guid.NewGuid", "System.Guid.CreateVersion7",
    ];

    [Theory]
    [InlineData("TankChem.Chemistry")]
    [InlineData("TankChem.Alarms")]
    [InlineData("TankChem.Dosing")]
    [InlineData("TankChem.Monitoring")]
    [InlineData("TankChem.Simulation")]
    public void PureRoom_RefersToNothingOfTheOutside(string room)
    {
        using FileStream stream = File.OpenRead(Path.Combine(AppContext.BaseDirectory, room + ".dll"));
        using var file = new PEReader(stream);

        string[] used = [.. UsedBy(file.GetMetadataReader())];

        Assert.Contains("System.Object", used);
        Assert.DoesNotContain(used, IsForbidden);
    }

    [Theory]
    [InlineData("System.IO.File")]
    [InlineData("System.DateTime.get_UtcNow")]
    [InlineData("System.Net.Http.HttpClient")]
    [InlineData("System.Environment.get_MachineName")]
    public void Check_SeesWhatIsForbidden(string name) => Assert.True(IsForbidden(name));

    /// <summary>Environment stays forbidden but for the thread's number, which the compiler itself reads in every iterator; an address of the network is only a value.</summary>
    private static bool IsForbidden(string name) =>
        ForbiddenTypes.Contains(name, StringComparer.Ordinal)
        || ForbiddenMembers.Contains(name, StringComparer.Ordinal)
        || (ForbiddenNamespaces.Any(n => name.StartsWith(n + ".", StringComparison.Ordinal)) && !name.StartsWith("System.Net.IPAddress", StringComparison.Ordinal))
        || (name.StartsWith("System.Environment.", StringComparison.Ordinal) && name != "System.Environment.get_CurrentManagedThreadId");

    private static IEnumerable<string> UsedBy(MetadataReader metadata)
    {
        foreach (TypeReferenceHandle handle in metadata.TypeReferences)
            yield return NameOf(metadata, handle);
        foreach (MemberReferenceHandle handle in metadata.MemberReferences)
        {
            MemberReference member = metadata.GetMemberReference(handle);
            if (member.Parent.Kind == HandleKind.TypeReference)
                yield return $"{NameOf(metadata, (TypeReferenceHandle)member.Parent)}.{metadata.GetString(member.Name)}";
        }
    }

    private static string NameOf(MetadataReader metadata, TypeReferenceHandle handle)
    {
        TypeReference type = metadata.GetTypeReference(handle);
        return $"{metadata.GetString(type.Namespace)}.{metadata.GetString(type.Name)}";
    }
}
