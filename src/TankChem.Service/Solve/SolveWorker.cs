using System.Globalization;
using nietras.SeparatedValues;
using TankChem.Chemistry;

namespace TankChem.Service.Solve;

/// <summary>Solves rows one after the other on one thread and writes each as a line.</summary>
internal sealed class SolveWorker(SolveTable table) : IDisposable
{
    private const int Extra = -1;
    private static readonly int PH = Array.IndexOf(SolveColumns.Numbers, "ph");
    private readonly SolveLayout layout = table.Layout;
    private readonly SolveRow row = new();
    private readonly StringWriter line = new(CultureInfo.InvariantCulture);

    /// <summary>The row as it goes out, and whether it was solved.</summary>
    public (string Line, bool Solved) Solve(SepReader.Row cells)
    {
        row.Clear();
        int count = Math.Min(cells.ColCount, layout.Columns);
        for (int i = 0; i < count; i++)
        {
            if (layout.NumberOf[i] >= 0)
                row.SetNumber(layout.NumberOf[i], cells[i].Span);
            else if (layout.WordOf[i] >= 0)
                row.SetWord(layout.WordOf[i], cells[i].Span);
        }

        row.Solve();
        line.GetStringBuilder().Clear();
        Write(cells, count);
        return (line.ToString(), row.Error.Length == 0);
    }

    public void Dispose() => line.Dispose();

    private void Write(SepReader.Row cells, int count)
    {
        for (int i = 0; i < layout.Columns; i++)
        {
            if (i > 0)
                line.Write(',');
            ReadOnlySpan<char> given = i < count ? cells[i].Span : default;
            if (!given.Trim().IsEmpty)
                CsvCell.Write(line, given);
            else if (layout.AnswerOf[i] != Extra)
                WriteAnswer(layout.AnswerOf[i]);
            else if (layout.NumberOf[i] == PH && row.Error.Length == 0)
                CsvCell.Write(line, OnScale(row.State));
        }

        foreach (int answer in layout.Appended)
        {
            line.Write(',');
            WriteAnswer(answer);
        }

        line.Write("\r\n");
    }

    private double OnScale(in CarbonateState state) => row.Scale switch
    {
        PhScale.Nbs => state.PhNbs,
        PhScale.Total => state.PhTotal,
        PhScale.Seawater => state.PhSeawater,
        PhScale.Free => state.PhFree,
    };

    private void WriteAnswer(int answer)
    {
        if (answer == SolveColumns.Answers.Length - 1)
        {
            CsvCell.Write(line, row.Error);
            return;
        }

        if (row.Error.Length > 0)
            return;
        CarbonateState s = row.State;
        CsvCell.Write(line, answer switch
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
