namespace TankChem.TestKit;

/// <summary>Where the checkout and its built programs are.</summary>
public static class Repository
{
    /// <summary>The folder that holds TankChem.sln.</summary>
    public static string Root { get; } = FindRoot();

    /// <summary>The built service of the same configuration as the running tests.</summary>
    public static string ServiceAssembly => Path.Combine(Root, "src", "TankChem.Service", "bin", Configuration, "net10.0", "tankchem.dll");

    private static string Configuration => AppContext.BaseDirectory.Contains($"{Path.DirectorySeparatorChar}Release{Path.DirectorySeparatorChar}", StringComparison.Ordinal) ? "Release" : "Debug";

    private static string FindRoot()
    {
        for (DirectoryInfo? folder = new(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            if (File.Exists(Path.Combine(folder.FullName, "TankChem.sln")))
                return folder.FullName;
        }

        throw new InvalidOperationException($"TankChem.sln is in no folder above {AppContext.BaseDirectory}.");
    }
}
