using System.Globalization;
using TankChem.Service.CommandLine;
using TankChem.Service.Solve;

namespace TankChem.Service.Tests.Solve;

public class SolveTableTests
{
    [Fact]
    public void Row_WithPhAndAlkalinity_GetsEveryColumnOfTheAnswer()
    {
        var table = Run("temperature_c,salinity,ph,alkalinity_umol_kg\r\n15,0,7.2,2000\r\n");

        Assert.True(table.AllSolved);
        Assert.Equal(["temperature_c", "salinity", "ph", "alkalinity_umol_kg", .. SolveColumns.Answers.Where(a => a != "alkalinity_umol_kg")], table.Header);
        Assert.Equal("", table.Rows[0]["error"]);
        Assert.InRange(Number(table, 0, "co2_mg_l"), 12, 16);
    }

    [Fact]
    public void InputColumns_PassThroughAsGiven()
    {
        var table = Run("note,temperature_c,salinity,ph,alkalinity_umol_kg\n\"a \"\"b\"\", c\",15.0,0,7.20,2000.0\n");

        Assert.Equal("a \"b\", c", table.Rows[0]["note"]);
        Assert.Equal("15.0", table.Rows[0]["temperature_c"]);
        Assert.Equal("7.20", table.Rows[0]["ph"]);
        Assert.Equal("2000.0", table.Rows[0]["alkalinity_umol_kg"]);
    }

    [Fact]
    public void EmptyCellOfThePair_IsFilledWithWhatWasSolved()
    {
        var table = Run("temperature_c,salinity,ph,alkalinity_umol_kg,dic_umol_kg\n15,0,7.2,2000,\n15,0,,2000,2200\n");

        Assert.InRange(Number(table, 0, "dic_umol_kg"), 2200, 2500);
        Assert.InRange(Number(table, 1, "ph"), 7, 8);
    }

    [Fact]
    public void SolvedNumbers_ReadBackToTheSameAnswer()
    {
        var first = Run("temperature_c,salinity,ph,alkalinity_umol_kg,constants,ph_scale\n25,35,8.1,2300,millero2010,total\n");
        string dic = first.Rows[0]["dic_umol_kg"];

        var second = Run($"temperature_c,salinity,alkalinity_umol_kg,dic_umol_kg,constants,ph_scale\n25,35,2300,{dic},millero2010,total\n");

        Assert.Equal(8.1, Number(second, 0, "ph_total"), 1e-9);
    }

    [Theory]
    [InlineData("x,0,7.2,2000", "temperature_c")]
    [InlineData(",0,7.2,2000", "temperature_c")]
    [InlineData("15,,7.2,2000", "salinity")]
    [InlineData("15,0,7.2,", "exactly two")]
    [InlineData("15,0,NaN,2000", "ph")]
    [InlineData("15,0,7.2,1e400", "alkalinity_umol_kg")]
    [InlineData("999,0,7.2,2000", "999")]
    [InlineData("15,-1,7.2,2000", "-1")]
    public void RowThatCannotBeSolved_KeepsItsPlaceAndSaysWhichColumn(string row, string named)
    {
        var table = Run($"temperature_c,salinity,ph,alkalinity_umol_kg\n15,0,7.2,2000\n{row}\n16,0,7.2,2000\n");

        Assert.False(table.AllSolved);
        Assert.Equal(3, table.Rows.Count);
        Assert.Contains(named, table.Rows[1]["error"], StringComparison.Ordinal);
        Assert.Equal("", table.Rows[1]["co2_mg_l"]);
        Assert.Equal("", table.Rows[2]["error"]);
    }

    [Theory]
    [InlineData("ph_scale", "NBS2")]
    [InlineData("constants", "roy1993")]
    [InlineData("u_constants", "maybe")]
    public void UnknownWord_IsNamedWithTheRightOnes(string column, string word)
    {
        var table = Run($"temperature_c,salinity,ph,alkalinity_umol_kg,{column}\n15,0,7.2,2000,{word}\n");

        Assert.Contains(column, table.Rows[0]["error"], StringComparison.Ordinal);
        Assert.Contains("right would be", table.Rows[0]["error"], StringComparison.Ordinal);
    }

    [Fact]
    public void Uncertainties_AreGivenOnlyWhereInputsHaveThem()
    {
        var table = Run("temperature_c,salinity,ph,alkalinity_umol_kg,u_ph,u_alkalinity_umol_kg\n15,0,7.2,2000,0.05,\n15,0,7.2,2000,,\n");

        Assert.InRange(Number(table, 0, "u_co2_mg_l") / Number(table, 0, "co2_mg_l"), 0.10, 0.14);
        Assert.Equal("", table.Rows[1]["u_co2_mg_l"]);
        Assert.Equal("0.05", table.Rows[0]["u_ph"]);
    }

    [Theory]
    [InlineData("")]
    [InlineData("temperature_c,salinity,ph,ph,alkalinity_umol_kg\n15,0,7,7,2000\n")]
    [InlineData("temperature_c,ph,alkalinity_umol_kg\n15,7,2000\n")]
    [InlineData("temperature_c,salinity,ph\n15,0,7\n")]
    public void HeaderThatCannotBeUsed_IsWrongInput(string csv) =>
        Assert.Throws<UsageException>(() => SolveTable.Run(new StringReader(csv), new StringWriter()));

    private static double Number(Table table, int row, string column) => double.Parse(table.Rows[row][column], CultureInfo.InvariantCulture);

    private static Table Run(string csv)
    {
        using var output = new StringWriter();
        bool all = SolveTable.Run(new StringReader(csv), output);
        List<string[]> lines = [.. CsvText.Parse(output.ToString())];
        return new Table(all, lines[0], [.. lines.Skip(1).Select(l => lines[0].Zip(l).ToDictionary(p => p.First, p => p.Second, StringComparer.Ordinal))]);
    }

    private sealed record Table(bool AllSolved, IReadOnlyList<string> Header, IReadOnlyList<Dictionary<string, string>> Rows);
}
