using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Tests.Readings;

public class ReadingResolverTests
{
    private static readonly DateTimeOffset Now = new(2026, 5, 1, 10, 0, 0, TimeSpan.Zero);

    [Theory]
    [InlineData("alkalinity")]
    [InlineData("tan")]
    [InlineData("nitrite")]
    [InlineData("calcium")]
    [InlineData("oxygen")]
    public void Resolve_BareNumberOfAnAmbiguousQuantity_IsKeptAndNotUsed(string quantity)
    {
        Reading reading = Resolve(quantity, 5, null);

        Assert.Equal((QualityFlag.NotEvaluated, "unit not confirmed", (double?)null, 5.0), (reading.Flag, reading.Reason, reading.Value, reading.RawValue));
    }

    [Theory]
    [InlineData("dKH", 5, 1.78316)]
    [InlineData("mg/L CaCO3", 100, 1.99828)]
    [InlineData("meq/L", 2, 2)]
    [InlineData("umol/kg", 2300, 2.3)]
    public void Resolve_ConfirmedUnit_GivesTheCanonicalValue(string unit, double raw, double mmolL)
    {
        // 1 dKH = 0.3566 meq/L and 1 meq/L = 50.04 mg/L as CaCO3: Standard Methods 2320 in general use.
        Reading reading = Resolve("alkalinity", raw, null, confirmed: unit);

        Assert.True(reading.IsUsable);
        Assert.Equal(mmolL, reading.Value!.Value, 1e-4);
    }

    [Theory]
    [InlineData("ph", 7.2, "mg/L", "right would be")]
    [InlineData("ph", 14.5, null, "outside the physical range")]
    [InlineData("temperature", 1e308, null, "outside the physical range")]
    public void Resolve_WrongUnitOrImpossibleValue_FailsWithTheReason(string quantity, double raw, string? unit, string reason)
    {
        Reading reading = Resolve(quantity, raw, unit);

        Assert.Equal(QualityFlag.Fail, reading.Flag);
        Assert.Contains(reason, reading.Reason, StringComparison.Ordinal);
        Assert.False(reading.IsUsable);
    }

    [Fact]
    public void Resolve_OwnTimeAheadOfTheClock_IsSuspect() =>
        Assert.Equal((QualityFlag.Suspect, "clock ahead"), FlagOf(Resolve("ph", 7, null, own: Now.AddMinutes(6))));

    [Fact]
    public void Resolve_OwnTimeIn1970_IsSuspect() => Assert.Equal(QualityFlag.Suspect, Resolve("ph", 7, null, own: DateTimeOffset.UnixEpoch.AddDays(1)).Flag);

    [Theory]
    [InlineData(ReadingOrigin.Retained)]
    [InlineData(ReadingOrigin.Backlog)]
    public void Resolve_OfUnknownAge_IsSuspectUnlessItHasATimeOfItsOwn(ReadingOrigin origin)
    {
        Assert.Equal(QualityFlag.Suspect, Resolve("ph", 7, null, origin: origin).Flag);
        Assert.Equal(QualityFlag.Pass, Resolve("ph", 7, null, origin: origin, own: Now.AddHours(-2)).Flag);
    }

    [Fact]
    public void Resolve_QuantityWithoutAMeaning_IsTakenAsItIs() => Assert.True(Resolve("turbidity", 3.5, "NTU").IsUsable);

    [Fact]
    public void Rederive_AfterTheUnitIsConfirmed_IsTheReadingThatWouldHaveBeen()
    {
        Reading kept = Resolve("alkalinity", 6, null);

        Assert.Equal(Resolve("alkalinity", 6, null, confirmed: "dKH"), ReadingResolver.Rederive(kept, "dKH"));
    }

    [Theory]
    [InlineData("7.2", 7.2)]
    [InlineData("7,2", 7.2)]
    [InlineData(" -0,5 ", -0.5)]
    public void DecimalText_CommaAndPoint_AreTheSame(string text, double expected)
    {
        Assert.True(DecimalText.TryParse(text, out double value, out _));
        Assert.Equal(expected, value);
    }

    [Theory]
    [InlineData("")]
    [InlineData("7.2.1")]
    [InlineData("1.234,5")]
    [InlineData("1e5")]
    [InlineData("NaN")]
    [InlineData("seven")]
    public void DecimalText_AnythingElse_SaysWhatWouldBeRight(string text)
    {
        Assert.False(DecimalText.TryParse(text, out _, out string? fault));
        Assert.Contains("like", fault, StringComparison.Ordinal);
    }

    [Fact]
    public void UnitConverter_EveryUnitOfEveryChoice_ConvertsThereAndBack()
    {
        foreach (QuantityDefinition definition in QuantityCatalog.All)
        {
            foreach (string unit in definition.UnitChoices)
            {
                Assert.True(UnitConverter.TryConvert(definition.Id, unit, 3.7, out double canonical, out string? fault), fault);
                Assert.True(UnitConverter.TryConvertBack(definition.Id, unit, canonical, out double back));
                Assert.Equal(3.7, back, 1e-12);
            }
        }
    }

    private static (QualityFlag, string?) FlagOf(Reading reading) => (reading.Flag, reading.Reason);

    private static Reading Resolve(string quantity, double raw, string? unit, string? confirmed = null, DateTimeOffset? own = null, ReadingOrigin origin = ReadingOrigin.Live) =>
        ReadingResolver.Resolve(new ParsedReading(new SeriesKey(new PlaceKey("a", "t"), quantity, "main"), raw, unit, own), Now, origin, own ?? Now, confirmed);
}
