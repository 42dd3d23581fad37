using System.Text;
using TankChem.Service.CommandLine;

namespace TankChem.Service.Solve;

/// <summary>The verb <c>solve</c>: files or standard streams around <see cref="SolveTable"/>.</summary>
internal static class SolveCommand
{
    private const string Standard = "-";
    private const int BufferSize = 1 << 16;

    public static int Run(string inputPath, string outputPath, TextWriter error)
    {
        if (inputPath != Standard && outputPath != Standard && Path.GetFullPath(inputPath) == Path.GetFullPath(outputPath))
            throw new UsageException($"Input and output are both {inputPath}; the input would be overwritten.");
        using TextReader input = OpenInput(inputPath);
        using TextWriter output = OpenOutput(outputPath);
        bool all;
        try
        {
            all = SolveTable.Run(input, output);
            output.Flush();
        }
        catch (DecoderFallbackException e)
        {
            throw new UsageException($"--input {inputPath} is not UTF-8 text: {e.Message}");
        }
        catch (IOException e)
        {
            throw new RunFailedException($"--output {outputPath} cannot be written: {e.Message}", e);
        }

        if (all)
            return ExitCode.Done;
        error.WriteLine("Some rows could not be solved; the column error of each says why.");
        return ExitCode.Failed;
    }

    private static StreamReader OpenInput(string path)
    {
        try
        {
            Stream stream = path == Standard ? Console.OpenStandardInput() : new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.Read, BufferSize);
            return new StreamReader(stream, new UTF8Encoding(false, true), true, BufferSize);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new UsageException($"--input {path} cannot be read: {e.Message}");
        }
    }

    private static StreamWriter OpenOutput(string path)
    {
        try
        {
            Stream stream = path == Standard ? Console.OpenStandardOutput() : new FileStream(path, FileMode.Create, FileAccess.Write, FileShare.None, BufferSize);
            return new StreamWriter(stream, new UTF8Encoding(false), BufferSize);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new UsageException($"--output {path} cannot be written: {e.Message}");
        }
    }
}
