using TankChem.Chemistry;
using TankChem.Simulation.Tanks;
using TankChem.Simulation.Waters;
using static TankChem.Simulation.Tests.TestWaters;

namespace TankChem.Simulation.Tests;

public sealed class VirtualTankTests
{
    private static readonly TankSettings Busy = Tank(Fresh) with
    {
        Temperature = new DailyTemperature(20, 1),
        Kla20PerHour = 1,
        DegasserKla20PerHour = 2,
        Stock = new Stock { FeedKgPerDay = 0.4, ProteinShare = 0.45 },
        Plants = new Plants { PhotosynthesisMmolLH = 0.1, RespirationMmolLH = 0.02 },
        Lamp = new Lamp(new Hours(new TimeOnly(9, 0), new TimeOnly(19, 0)), 120),
        Nitrification = new Nitrification { PerHour = 0.4 },
        Calcification = new Calcification { DarkMmolLH = 0.002, LightMmolLH = 0.005 },
        Injector = new Injector(4, new Hours(new TimeOnly(8, 0), new TimeOnly(18, 0))),
        Doser = new AlkalinityDoser(2, 0.5),
        Oxygen = new OxygenSupply(9, 2),
        SourceWater = Fresh,
        ExchangePerDay = 0.1,
    };

    [Fact]
    public void Advance_ThreeBusyDays_LedgerAccountsForEveryChange()
    {
        var tank = new VirtualTank(Busy, Start, OpenAir);
        WaterAmounts before = tank.Water.Amounts;
        tank.Advance(Start.AddDays(3), OpenAir);
        tank.Dose(1.5, 1.5);
        tank.ExchangeWater(0.2);
        WaterAmounts change = (tank.Water.Amounts - before) * tank.Water.VolumeM3;
        WaterAmounts booked = tank.Water.Ledger.Total;
        WaterAmounts turnover = Turnover(tank.Water.Ledger);
        AssertClose(change.Dic, booked.Dic, turnover.Dic);
        AssertClose(change.Alkalinity, booked.Alkalinity, turnover.Alkalinity);
        AssertClose(change.Tan, booked.Tan, turnover.Tan);
        AssertClose(change.Nitrate, booked.Nitrate, turnover.Nitrate);
        AssertClose(change.Oxygen, booked.Oxygen, turnover.Oxygen);
        AssertClose(change.Calcium, booked.Calcium, turnover.Calcium);
    }

    [Theory]
    [InlineData(false, 5.0)]
    [InlineData(false, 0.1)]
    [InlineData(true, 3.0)]
    public void Advance_NothingButAir_ComesToEquilibriumWithIt(bool sea, double co2OverAir)
    {
        WaterRecipe water = (sea ? Sea : Fresh) with { Co2OverAir = co2OverAir };
        var tank = new VirtualTank(Tank(water) with { Kla20PerHour = 5 }, Start, OpenAir);
        tank.Advance(Start.AddDays(20), OpenAir);
        CarbonateState state = tank.Solve();
        Assert.Equal(Atmosphere.Pco2Uatm(OpenAir.Co2Ppm, OpenAir.PressureAtm, 20, water.Salinity), state.Pco2Uatm, 0.5);
        Assert.Equal(DissolvedOxygen.SaturationMgL(20, water.Salinity, 1), tank.Water.Amounts.Oxygen * 31.998, 1e-6);
        Assert.Equal(water.AlkalinityMmolL, tank.Water.Amounts.Alkalinity, 1e-12);
    }
    private static WaterAmounts Turnover(WaterLedger ledger)
    {
        WaterAmounts sum = default;
        foreach (WaterProcess process in Enum.GetValues<WaterProcess>())
        {
            WaterAmounts mol = ledger[process];
            sum += new WaterAmounts(Math.Abs(mol.Dic), Math.Abs(mol.Alkalinity), Math.Abs(mol.Tan), Math.Abs(mol.Nitrate), Math.Abs(mol.Oxygen), Math.Abs(mol.Calcium));
        }

        return sum;
    }

    private static void AssertClose(double change, double booked, double turnover)
    {
        Assert.True(turnover > 0, "nothing was turned over");
        Assert.Equal(change, booked, 1e-9 * turnover);
    }
}
