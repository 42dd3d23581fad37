using TankChem.Monitoring.Places;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Tests.Water;

public sealed class ProbeUncertaintyTests
{
    [Theory]
    [InlineData("ph", 7.2, 0, 0.1)]
    [InlineData("alkalinity", 2, 0, 0.1)]
    [InlineData("alkalinity", 2, 1, 0.2236067977)]
    [InlineData("alkalinity", 2, 5, 1.0049875621)]
    [InlineData("temperature", 14, 0, 0.2)]
    [InlineData("salinity", 35, 0, 0.7)]
    [InlineData("tan", 1, 0, 0.1)]
    [InlineData("tan", 1, 1, 0.3162277660)]
    public void Of_Defaults_AreThoseOfTheContract(string quantity, double value, double days, double expected) =>
        Assert.Equal(expected, ProbeUncertainty.Of(quantity, value, TimeSpan.FromDays(days), null)!.Value, 9);

    [Fact]
    public void Of_CalibratedPhProbe_IsBetter() =>
        Assert.Equal(0.05, ProbeUncertainty.Of("ph", 7.2, TimeSpan.Zero, new ProbeDefinition { Quantity = "ph", CalibratedAt = DateTimeOffset.UnixEpoch }));

    [Fact]
    public void Of_SetForTheProbe_StandsOverTheDefault()
    {
        var probe = new ProbeDefinition { Quantity = "alkalinity", StandardUncertainty = 0.03, DriftPerDay = 0.04 };

        Assert.Equal(0.05, ProbeUncertainty.Of("alkalinity", 2, TimeSpan.FromDays(1), probe)!.Value, 9);
    }

    [Fact]
    public void Of_ReadingAheadOfNow_IsFresh() =>
        Assert.Equal(0.1, ProbeUncertainty.Of("alkalinity", 2, TimeSpan.FromDays(-1), null));

    [Theory]
    [InlineData("turbidity")]
    [InlineData("injection-on")]
    public void Of_QuantityNobodyDescribed_IsUnknownAndNotZero(string quantity) =>
        Assert.Null(ProbeUncertainty.Of(quantity, 1, TimeSpan.Zero, null));
}
