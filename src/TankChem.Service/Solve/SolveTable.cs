using nietras.SeparatedValues;
using TankChem.Service.CommandLine;

namespace TankChem.Service.Solve;

/// <summary>Solves a CSV table: a row in, a row out, in the same order.</summary>
internal sealed class SolveTable
{
    private static readonly string[] Required = ["temperature_c", "salinity"];
    private readonly string[] header;
    private readonly int[] numberOf;
    private readonly int[] wordOf;
    private readonly int[] answerOf;
    private readonly List<int> appended = [];

    private SolveTable(string[] header)
    {
        this.header = header;
        numberOf = [.. header.Select(h => Array.IndexOf(SolveColumns.Numbers, h))];
        wordOf = [.. header.Select(h => Array.IndexOf(SolveColumns.Words, h))];
        answerOf = [.. header.Select(h => Array.IndexOf(SolveColumns.Answers, h))];
        for (int i = 0; i < SolveColumns.Answers.Length; i++)
        {
            if (!header.Contains(SolveColumns.Answers[i], StringComparer.Ordinal))
                appended.Add(i);
        }
    }

    /// <summary>Solves everything; true when every row was solved.</summary>
    /// <exception cref="UsageException">The header is not usable, or the text is not CSV.</exception>
    public static bool Run(TextReader input, TextWriter output)
    {
        SepReader reader;
        try
        {
            reader = Sep.New(',').Reader(o => o with { Unescape = true, DisableColCountCheck = true, ColNameComparer = StringComparer.Ordinal }).From(input);
        }
        catch (Exception e) when (e is ArgumentException or InvalidDataException or NotSupportedException)
        {
            throw new UsageException($"The input is no CSV table: {e.Message}");
        }

        using (reader)
        {
            if (reader.Header.IsEmpty || reader.Header.ColNames.Count == 0)
                throw new UsageException("The input is empty; a header row with column names is needed (temperature_c, salinity, …).");
            string[] names = [.. reader.Header.ColNames.Select(n => n.TrimStart('\uFEFF').Trim())];
            CheckHeader(names);
            var table = new SolveTable(names);
            return table.SolveAll(reader, output);
        }
    }

    private static void CheckHeader(string[] names)
    {
        string[] twice = [.. names.GroupBy(n => n, StringComparer.Ordinal).Where(g => g.Count() > 1).Select(g => g.Key)];
        if (twice.Length > 0)
            throw new UsageException([.. twice.Select(n => $"The column {n} stands in the header twice; each name may stand once.")]);
        List<string> missing = [.. Required.Where(n => !names.Contains(n, StringComparer.Ordinal)).Select(n => $"The column {n} is missing from the header.")];
        int pair = names.Count(n => n is "ph" or "alkalinity_umol_kg" or "dic_umol_kg" or "pco2_uatm");
        if (pair < 2)
            missing.Add("At least two of the columns ph, alkalinity_umol_kg, dic_umol_kg, pco2_uatm are needed.");
        if (missing.Count > 0)
            throw new UsageException(missing);
    }

    private bool SolveAll(SepReader reader, TextWriter output)
    {
        WriteHeader(output);
        bool allSolved = true;

        // Rows are solved on all cores and written in their order.
        using var workers = new ThreadLocal<SolveWorker>(() => new SolveWorker(this), trackAllValues: true);
        foreach ((string line, bool solved) in reader.ParallelEnumerate(cells => workers.Value!.Solve(cells)))
        {
            output.Write(line);
            allSolved &= solved;
        }

        foreach (SolveWorker worker in workers.Values)
            worker.Dispose();

        return allSolved;
    }

    private void WriteHeader(TextWriter output)
    {
        for (int i = 0; i < header.Length; i++)
        {
            if (i > 0)
                output.Write(',');
            CsvCell.Write(output, header[i]);
        }

        foreach (int answer in appended)
        {
            output.Write(',');
            output.Write(SolveColumns.Answers[answer]);
        }

        output.Write("\r\n");
    }

    /// <summary>What the columns of the input are, for the workers.</summary>
    internal SolveLayout Layout => new(header.Length, numberOf, wordOf, answerOf, appended);
}
