using TankChem.Service.CommandLine;

namespace TankChem.Service.Hosting;

/// <summary>The folder that everything is written to.</summary>
internal static class DataFolder
{
    /// <summary>Makes it when it is not there, and tries to write in it.</summary>
    /// <exception cref="RunFailedException">It cannot be written to.</exception>
    public static void EnsureWritable(string folder)
    {
        string trial = Path.Combine(folder, $".trial-{Environment.ProcessId}");
        try
        {
            Directory.CreateDirectory(folder);
            File.WriteAllBytes(trial, []);
            File.Delete(trial);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new RunFailedException($"The data folder {folder} cannot be written to ({e.Message}); --data takes another.", e);
        }
    }
}
