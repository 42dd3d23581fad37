using nietras.SeparatedValues;
using TankChem.Chemistry;
using TankChem.Service.CommandLine;

namespace TankChem.Service.Solve;

/// <summary>Solves a CSV table: a row in, a row out, in the same order.</summary>
internal sealed class SolveTable
{
    private const int Extra = -1;
    private static readonly string[] Required = ["temperature_c", "salinity"];
    private readonly string[] header;
    private readonly int[] numberOf;
    private readonly int[] wordOf;
    private readonly int[] answerOf;
    private readonly List<int> appended = [];
    private readonly SolveRow row = new();

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
        foreach (SepReader.Row cells in reader)
        {
            row.Clear();
            int count = Math.Min(cells.ColCount, header.Length);
            for (int i = 0; i < count; i++)
            {
                if (numberOf[i] >= 0)
                    row.SetNumber(numberOf[i], cells[i].Span);
                else if (wordOf[i] >= 0)
                    row.SetWord(wordOf[i], cells[i].Span);
            }

            row.Solve();
            allSolved &= row.Error.Length == 0;
            WriteRow(cells, count, output);
        }

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

    private void WriteRow(SepReader.Row cells, int count, TextWriter output)
    {
        for (int i = 0; i < header.Length; i++)
        {
            if (i > 0)
                output.Write(',');
            ReadOnlySpan<char> given = i < count ? cells[i].Span : default;
            if (given.Trim().IsEmpty && answerOf[i] != Extra)
                WriteAnswer(answerOf[i], output);
            else if (given.Trim().IsEmpty && numberOf[i] == Array.IndexOf(SolveColumns.Numbers, "ph"))
                WriteSolvedPh(output);
            else
                CsvCell.Write(output, given);
        }

        foreach (int answer in appended)
        {
            output.Write(',');
            WriteAnswer(answer, output);
        }

        output.Write("\r\n");
    }

    private void WriteSolvedPh(TextWriter output)
    {
        if (row.Error.Length == 0)
            CsvCell.Write(output, OnScale(row.State));
    }

    private double OnScale(in CarbonateState state) => row.Scale switch
    {
        PhScale.Nbs => state.PhNbs,
        PhScale.Total => state.PhTotal,
        PhScale.Seawater => state.PhSeawater,
        PhScale.Free => state.PhFree,
    };

    private void WriteAnswer(int answer, TextWriter output)
    {
        if (answer == SolveColumns.Answers.Length - 1)
        {
            CsvCell.Write(output, row.Error);
            return;
        }

        if (row.Error.Length > 0)
            return;
        CarbonateState s = row.State;
        CsvCell.Write(output, answer switch
        {
            0 => s.PhTotal,
            1 => s.PhNbs,
            2 => s.AlkalinityUmolKg,
            3 => s.DicUmolKg,
            4 => s.Co2UmolKg,
            5 => s.Co2MgL,
            6 => s.Hco3UmolKg,
            7 => s.Co3UmolKg,
            8 => s.Pco2Uatm,
            9 => s.Fco2Uatm,
            10 => row.Air is { } air ? OnScale(air) : double.NaN,
            11 => row.Air?.Co2MgL ?? double.NaN,
            12 => s.BufferClosedUmolKg,
            13 => s.BufferOpenUmolKg,
            14 => s.OmegaCalcite,
            15 => s.OmegaAragonite,
            16 => s.Nh3Fraction,
            17 => s.IonicStrengthMolKg,
            18 => row.Uncertainty?.Co2MgL ?? double.NaN,
            19 => row.Uncertainty?.Pco2Uatm ?? double.NaN,
            20 => row.Uncertainty?.PhNbs ?? double.NaN,
            _ => throw new ArgumentOutOfRangeException(nameof(answer), answer, "Not a column of the answer."),
        });
    }
}
