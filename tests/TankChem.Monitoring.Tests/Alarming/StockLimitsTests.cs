using System.Globalization;
using System.Text;
using TankChem.Alarms;
using TankChem.Monitoring.Alarming;

namespace TankChem.Monitoring.Tests.Alarming;

public sealed class StockLimitsTests
{
    private static readonly string[] Marks = ["cited", "cited, second hand", "from memory", "common practice, no source"];

    [Fact]
    public void Groups_AreThoseThatConfigurationsName() =>
        Assert.Equal(["salmonid", "salmonid-early", "cool-water", "warm-water", "marine-fish", "shrimp", "reef", "planted"], StockLimits.Groups.Select(group => group.Id));

    [Fact]
    public void EveryLimit_HasItsEvidenceAndHowWellItIsFounded()
    {
        foreach (StockLimit limit in StockLimits.Groups.SelectMany(group => group.Limits))
        {
            Assert.NotEmpty(limit.Evidence);
            Assert.Contains(limit.Mark, Marks);
            if (limit.Mark != "common practice, no source")
                Assert.NotEmpty(limit.Source);
            Assert.Equal(limit.Value, LimitRules.For(limit).ConditionFor(limit).SetPoint);
        }
    }

    [Fact]
    public void EveryGroup_HasEachRuleOnceAndWorseLevelsFurtherOut()
    {
        foreach (StockGroup group in StockLimits.Groups)
        {
            Assert.Distinct(group.Limits.Select(limit => limit.Rule), StringComparer.Ordinal);
            foreach (IGrouping<(string, LimitSide), StockLimit> side in group.Limits.GroupBy(limit => (limit.Quantity, limit.Side)))
            {
                StockLimit[] levels = [.. side.OrderBy(limit => limit.Level)];
                for (int i = 1; i < levels.Length; i++)
                    Assert.True(levels[i].Side == LimitSide.High ? levels[i].Value > levels[i - 1].Value : levels[i].Value < levels[i - 1].Value, $"{group.Id} {levels[i].Rule}");
            }
        }
    }

    [Fact]
    public void EveryDeadbandAndGuardBand_LeavesRoomBetweenWarningAndUrgent()
    {
        foreach (StockGroup group in StockLimits.Groups)
        {
            foreach (StockLimit urgent in group.Limits.Where(limit => limit.Level == LimitLevel.Urgent))
            {
                StockLimit warn = group.Limits.Single(limit => limit.Quantity == urgent.Quantity && limit.Side == urgent.Side && limit.Level == LimitLevel.Warn);
                LimitCondition condition = LimitRules.For(urgent).ConditionFor(urgent);
                double widest = urgent.RaiseAt < 0.5 ? condition.WidestGuard : 0;
                Assert.True(Math.Abs(urgent.Value - warn.Value) >= widest - 1e-9, $"{group.Id}: the guard band of {urgent.Rule} reaches past its warning");
            }
        }
    }

    [Theory]
    [InlineData("co2-high", 15)]
    [InlineData("nh3-n-high", 0.0125)]
    [InlineData("nh3-n-high-urgent", 0.025)]
    [InlineData("oxygen-saturation-low", 80)]
    [InlineData("oxygen-saturation-low-urgent", 60)]
    public void Salmonids_HaveTheFiguresOfTheTrade(string rule, double expected) =>
        Assert.Equal(expected, StockLimits.Find("salmonid")!.Limits.Single(limit => limit.Rule == rule).Value);

    [Fact]
    public void Strictest_OfAnyGroups_IsNeverLaxerThanOneOfThem()
    {
        foreach (StockGroup one in StockLimits.Groups)
        {
            foreach (StockGroup other in StockLimits.Groups)
            {
                IReadOnlyList<EffectiveLimit> together = StockLimits.Strictest([one.Id, other.Id]);
                foreach (StockLimit limit in one.Limits.Concat(other.Limits))
                {
                    EffectiveLimit effective = together.Single(candidate => candidate.Limit.Rule == limit.Rule);
                    Assert.True(limit.Side == LimitSide.High ? effective.Limit.Value <= limit.Value : effective.Limit.Value >= limit.Value);
                }
            }
        }
    }

    [Fact]
    public void Strictest_UnknownGroup_NamesTheKnownOnes() =>
        Assert.Contains("salmonid-early", Assert.Throws<ArgumentException>(() => StockLimits.Strictest(["trout"])).Message, StringComparison.Ordinal);

    [Fact]
    public void LimitsTable_InTheDocument_IsTheDataFile()
    {
        var table = new StringBuilder();
        foreach (StockGroup group in StockLimits.Groups)
        {
            table.Append(CultureInfo.InvariantCulture, $"### {group.Name} (`{group.Id}`)\n\n| rule | limit | raised at | evidence | source | founded on |\n| --- | --- | --- | --- | --- | --- |\n");
            foreach (StockLimit limit in group.Limits)
                table.Append(CultureInfo.InvariantCulture, $"| `{limit.Rule}` | {limit.Value}{LimitRules.For(limit).Unit} | {limit.RaiseAt} | {limit.Evidence} | {(limit.Source.Length == 0 ? "–" : limit.Source)} | {limit.Mark} |\n");
            table.Append('\n');
        }

        AssertBlock("limits", table.ToString());
    }

    [Fact]
    public void RulesTable_InTheDocument_IsTheCode()
    {
        var table = new StringBuilder("| limit on | on-delay | off-delay | deadband | widest guard band | first action |\n| --- | --- | --- | --- | --- | --- |\n");
        foreach (LimitRule rule in LimitRules.All)
        {
            string deadband = rule.DeadbandAbsolute > 0 ? string.Create(CultureInfo.InvariantCulture, $"{rule.DeadbandAbsolute}{rule.Unit}") : string.Create(CultureInfo.InvariantCulture, $"{100 * rule.DeadbandShare:0} % of the limit");
            string guard = rule.GuardAbsolute is { } absolute ? string.Create(CultureInfo.InvariantCulture, $"{absolute}{rule.Unit}") : string.Create(CultureInfo.InvariantCulture, $"{100 * rule.GuardShare:0} % of the limit");
            table.Append(CultureInfo.InvariantCulture, $"| {rule.Name} {rule.Word} | {Minutes(rule.OnDelay)} | {Minutes(rule.OffDelay)} | {deadband} | {guard} | {rule.FirstAction} |\n");
        }

        AssertBlock("rules", table.ToString());
    }

    private static string Minutes(TimeSpan delay) => delay == TimeSpan.Zero ? "none" : string.Create(CultureInfo.InvariantCulture, $"{delay.TotalMinutes:0.#} min");

    private static void AssertBlock(string name, string expected)
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "TankChem.sln")))
            folder = folder.Parent;
        string text = File.ReadAllText(Path.Combine(folder!.FullName, "docs", "alarms.md"));
        string open = $"<!-- {name} -->\n";
        int start = text.IndexOf(open, StringComparison.Ordinal);
        int end = text.IndexOf($"<!-- end {name} -->", StringComparison.Ordinal);
        Assert.True(start >= 0 && end > start, $"docs/alarms.md has no block \"{name}\".");
        string actual = text[(start + open.Length)..end];
        Assert.True(expected.Trim() == actual.Trim(), $"docs/alarms.md, block \"{name}\", is out of date. It should read:\n{expected}");
    }
}
