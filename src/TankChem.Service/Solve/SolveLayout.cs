namespace TankChem.Service.Solve;

/// <summary>What the columns of an input are; −1 where a column is not of that kind.</summary>
/// <param name="Columns">How many columns the header has.</param>
/// <param name="NumberOf">Index into <see cref="SolveColumns.Numbers"/> of each column.</param>
/// <param name="WordOf">Index into <see cref="SolveColumns.Words"/> of each column.</param>
/// <param name="AnswerOf">Index into <see cref="SolveColumns.Answers"/> of each column.</param>
/// <param name="Appended">Answers that stand in no column of the input, in order.</param>
internal sealed record SolveLayout(int Columns, int[] NumberOf, int[] WordOf, int[] AnswerOf, IReadOnlyList<int> Appended);
