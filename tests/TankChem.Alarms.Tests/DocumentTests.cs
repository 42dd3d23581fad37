namespace TankChem.Alarms.Tests;

public sealed class DocumentTests
{
    [Fact]
    public void PhaseTable_InTheDocument_IsWhatTheMachineDoes() => AssertBlock("phases", AlarmTables.Life());

    [Fact]
    public void SuppressionTable_InTheDocument_IsWhatTheMachineDoes() => AssertBlock("suppression", AlarmTables.Suppression());

    [Fact]
    public void Diagram_InTheDocument_HasEveryMoveOfTheMachineAndNoOther()
    {
        string[] drawn = [.. Block("diagram").Split('\n')
            .Select(line => line.Trim())
            .Where(line => line.Contains("-->", StringComparison.Ordinal) && !line.StartsWith("[*]", StringComparison.Ordinal))
            .Select(line => line.Split(':')[0].Replace(" ", "", StringComparison.Ordinal))
            .Distinct(StringComparer.Ordinal)
            .Order(StringComparer.Ordinal)];

        Assert.Equal(Moves(), drawn);
    }

    private static string[] Moves()
    {
        var moves = new SortedSet<string>(StringComparer.Ordinal);
        foreach (AlarmPhase phase in Enum.GetValues<AlarmPhase>())
        {
            foreach (AlarmEventKind kind in Enum.GetValues<AlarmEventKind>())
            {
                foreach (AlarmSettings settings in new[] { AlarmTables.Plain, AlarmTables.Latching })
                {
                    AlarmState before = AlarmTables.InPhase(phase);
                    foreach (AlarmState prepared in new[] { before, before with { PendingSince = AlarmTables.Now.AddHours(-1) }, before with { ClearSince = AlarmTables.Now.AddHours(-1) } })
                    {
                        AlarmPhase after = AlarmMachine.Step(settings, prepared, AlarmTables.EventOf(kind), AlarmTables.Now).State.Phase;
                        if (after != phase)
                            moves.Add($"{phase}-->{after}");
                    }
                }
            }
        }

        return [.. moves];
    }

    private static void AssertBlock(string name, string expected)
    {
        string actual = Block(name);
        Assert.True(expected.Trim() == actual.Trim(), $"docs/alarms.md, block \"{name}\", is out of date. It should read:\n{expected}");
    }

    private static string Block(string name)
    {
        string text = File.ReadAllText(Path.Combine(Root(), "docs", "alarms.md"));
        string open = $"<!-- {name} -->\n";
        int start = text.IndexOf(open, StringComparison.Ordinal);
        int end = text.IndexOf($"<!-- end {name} -->", StringComparison.Ordinal);
        Assert.True(start >= 0 && end > start, $"docs/alarms.md has no block \"{name}\".");
        return text[(start + open.Length)..end];
    }

    private static string Root()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "TankChem.sln")))
            folder = folder.Parent;
        return folder?.FullName ?? throw new InvalidOperationException("TankChem.sln is not above the test's folder.");
    }
}
