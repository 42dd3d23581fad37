using System.Diagnostics;

namespace TankChem.TestKit;

/// <summary>A program run to its end.</summary>
/// <param name="ExitCode">Its exit status.</param>
/// <param name="Output">What it wrote to standard output.</param>
/// <param name="Error">What it wrote to standard error.</param>
public sealed record ProgramRun(int ExitCode, string Output, string Error)
{
    private static readonly TimeSpan Longest = TimeSpan.FromSeconds(60);

    /// <summary>Runs the service's command line.</summary>
    public static Task<ProgramRun> TankChemAsync(string input, params string[] arguments) =>
        RunAsync("dotnet", input, [Repository.ServiceAssembly, .. arguments]);

    /// <summary>Runs any program.</summary>
    public static async Task<ProgramRun> RunAsync(string program, string input, params string[] arguments)
    {
        using var process = new Process
        {
            StartInfo = new ProcessStartInfo(program, arguments)
            {
                UseShellExecute = false,
                RedirectStandardInput = true,
                RedirectStandardOutput = true,
                RedirectStandardError = true,
            },
        };
        process.Start();
        Task<string> output = process.StandardOutput.ReadToEndAsync();
        Task<string> error = process.StandardError.ReadToEndAsync();
        try
        {
            await process.StandardInput.WriteAsync(input);
            process.StandardInput.Close();
        }
        catch (IOException)
        {
            // The program ended before it had read everything; its exit status and its words tell why.
            process.StandardInput.Dispose();
        }

        using var limit = new CancellationTokenSource(Longest);
        try
        {
            await process.WaitForExitAsync(limit.Token);
        }
        catch (OperationCanceledException e)
        {
            process.Kill(true);
            throw new TimeoutException($"{program} {string.Join(' ', arguments)} did not end within {Longest.TotalSeconds} s.", e);
        }

        return new ProgramRun(process.ExitCode, await output, await error);
    }
}
