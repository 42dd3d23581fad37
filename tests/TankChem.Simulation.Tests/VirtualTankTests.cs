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

    [Fact]
    public void Advance_SameSettings_SameWaterToTheBit()
    {
        var first = new VirtualTank(Busy, Start, OpenAir);
        var second = new VirtualTank(Busy, Start, OpenAir);
        first.Advance(Start.AddHours(30), OpenAir);
        for (int hour = 1; hour <= 30; hour++)
        {
            second.Advance(Start.AddHours(hour), OpenAir);
            second.Solve();
        }

        Assert.Equal(first.Water.Amounts, second.Water.Amounts);
    }

    [Fact]
    public void Advance_ToThePast_IsRefused()
    {
        var tank = new VirtualTank(Tank(Fresh), Start, OpenAir);
        var error = Assert.Throws<ArgumentOutOfRangeException>(() => tank.Advance(Start.AddMinutes(-1), OpenAir));
        Assert.Contains("cannot go back", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Constructor_ExchangeWithoutSourceWater_IsRefused()
    {
        var error = Assert.Throws<ArgumentException>(() => new VirtualTank(Tank(Fresh) with { ExchangePerDay = 0.2 }, Start, OpenAir));
        Assert.Contains("SourceWater", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Advance_Nitrification_UsesWhatEbelingAndOthersPublished()
    {
        var tank = new VirtualTank(Tank(Fresh with { TanMmolL = 0.2 }) with { Nitrification = new Nitrification { PerHour = 0.5 } }, Start, OpenAir);
        tank.Advance(Start.AddHours(12), OpenAir);
        WaterAmounts turned = tank.Water.Ledger[WaterProcess.Nitrification];
        double gramsN = -turned.Tan * MolarMass.Nitrogen;
        Assert.True(gramsN > 1, $"only {gramsN} g N turned");

        // Ebeling, Timmons and Bisogni 2006: 4.18 g O2, 7.05 g alkalinity as CaCO3 per g N; 0.976 of the nitrogen ends as nitrate.
        Assert.Equal(7.05, -turned.Alkalinity * MolarMass.CalciumCarbonate / 2 / gramsN, 0.02);
        Assert.Equal(4.18, -turned.Oxygen * 31.998 / gramsN, 0.005);
        Assert.Equal(0.976, turned.Nitrate * MolarMass.Nitrogen / gramsN, 1e-9);
    }

    [Fact]
    public void Advance_NitrificationForAMonth_LeavesNoNegativeAmmonia()
    {
        var tank = new VirtualTank(Tank(Fresh with { TanMmolL = 0.1 }) with { Nitrification = new Nitrification { PerHour = 40 } }, Start, OpenAir);
        tank.Advance(Start.AddDays(30), OpenAir);
        Assert.InRange(tank.Water.Amounts.Tan, 0, 1e-6);
    }

    [Fact]
    public void Advance_FedStock_BreathesAndExcretesInProportionToItsFeed()
    {
        var stock = new Stock { FeedKgPerDay = 1, ProteinShare = 0.4, OxygenPerFeed = 0.45, Co2PerOxygen = 1.375, DailySwing = 0.3 };
        var tank = new VirtualTank(Tank(Fresh) with { Stock = stock, Kla20PerHour = 20 }, Start, OpenAir);
        tank.Advance(Start.AddDays(1), OpenAir);
        WaterAmounts given = tank.Water.Ledger[WaterProcess.Respiration];
        Assert.Equal(0.092 * 0.4 * 1000, given.Tan * MolarMass.Nitrogen, 1e-6);

        // A little less than in ample oxygen, since breathing slows where it runs short.
        double oxygenGrams = -given.Oxygen * 31.998;
        Assert.InRange(oxygenGrams, 0.93 * 450, 450);
        Assert.Equal(1.375 * oxygenGrams, given.Dic * MolarMass.Co2, 1e-6);
        Assert.Equal(given.Tan, given.Alkalinity, 1e-12);
    }

    [Fact]
    public void Advance_Injector_DissolvesItsGramsInItsHoursOnly()
    {
        var tank = new VirtualTank(Tank(Fresh) with { Injector = new Injector(4, new Hours(new TimeOnly(8, 0), new TimeOnly(18, 0))) }, Start, OpenAir);
        tank.Advance(Start.AddHours(8), OpenAir);
        Assert.Equal(0, tank.Water.Ledger[WaterProcess.Injection].Dic);
        Assert.True(tank.InjectionOn);
        tank.Advance(Start.AddHours(24), OpenAir);
        Assert.False(tank.InjectionOn);
        Assert.Equal(40, tank.Water.Ledger[WaterProcess.Injection].Dic * MolarMass.Co2, 1e-6);
    }

    [Fact]
    public void Advance_ValveStuckOpen_GasFlowsOutsideItsHours()
    {
        var tank = new VirtualTank(Tank(Fresh) with { Injector = new Injector(4, new Hours(new TimeOnly(8, 0), new TimeOnly(18, 0))) }, Start, OpenAir);
        tank.Controls.ValveStuck = true;
        tank.Controls.InjectionShare = 1.5;
        tank.Advance(Start.AddHours(2), OpenAir);
        Assert.Equal(12, tank.Water.Ledger[WaterProcess.Injection].Dic * MolarMass.Co2, 1e-6);
    }

    [Fact]
    public void Advance_Calcification_TakesTwoEquivalentsAndOneCalciumForEachCarbon()
    {
        var tank = new VirtualTank(Tank(Sea) with { Calcification = new Calcification { DarkMmolLH = 0.004, LightMmolLH = 0.01 } }, Start, OpenAir);
        tank.Advance(Start.AddDays(1), OpenAir);
        WaterAmounts laid = tank.Water.Ledger[WaterProcess.Calcification];
        Assert.Equal(-0.004 * 24 * tank.Water.VolumeM3, laid.Dic, 1e-9);
        Assert.Equal(2 * laid.Dic, laid.Alkalinity, 1e-9);
        Assert.Equal(laid.Dic, laid.Calcium, 1e-9);
    }

    [Fact]
    public void Advance_PlantsInLight_TakeAsMuchCo2AsTheyGiveOxygen()
    {
        var tank = new VirtualTank(
            Tank(Fresh with { Co2OverAir = 20 }) with
            {
                Plants = new Plants { PhotosynthesisMmolLH = 0.1, RespirationMmolLH = 0.02 },
                Lamp = new Lamp(new Hours(new TimeOnly(6, 0), new TimeOnly(18, 0)), 150),
            },
            Start,
            OpenAir);
        tank.Advance(Start.AddHours(6), OpenAir);
        WaterAmounts night = tank.Water.Ledger[WaterProcess.Photosynthesis];
        Assert.Equal(0.02 * 6 * tank.Water.VolumeM3, night.Dic, 1e-9);
        tank.Advance(Start.AddHours(18), OpenAir);
        WaterAmounts day = tank.Water.Ledger[WaterProcess.Photosynthesis] - night;
        Assert.True(day.Oxygen > 0.1, $"only {day.Oxygen} mol of oxygen");
        Assert.Equal(-day.Dic, day.Oxygen, 1e-12);
        Assert.Equal(0, day.Alkalinity);
    }

    [Fact]
    public void Advance_DegasserOn_RaisesPhAndLeavesAlkalinity()
    {
        TankSettings settings = Tank(Fresh with { Co2OverAir = 15 }) with { Kla20PerHour = 0.1, DegasserKla20PerHour = 5 };
        var on = new VirtualTank(settings, Start, OpenAir);
        var off = new VirtualTank(settings, Start, OpenAir);
        off.Controls.DegasserOn = false;
        on.Advance(Start.AddHours(2), OpenAir);
        off.Advance(Start.AddHours(2), OpenAir);
        Assert.True(on.Solve().PhNbs > off.Solve().PhNbs + 0.5, $"{on.Solve().PhNbs} against {off.Solve().PhNbs}");
        Assert.Equal(off.Water.Amounts.Alkalinity, on.Water.Amounts.Alkalinity);
    }

    [Fact]
    public void Advance_DoserRunsShortWater_ReachesItsSetPoint()
    {
        var tank = new VirtualTank(Tank(Fresh with { AlkalinityMmolL = 1 }) with { Doser = new AlkalinityDoser(2, 0.5) }, Start, OpenAir);
        tank.Advance(Start.AddDays(2), OpenAir);
        Assert.Equal(2, tank.Water.Amounts.Alkalinity, 1e-3);
        WaterAmounts dosed = tank.Water.Ledger[WaterProcess.Dosing];
        Assert.Equal(dosed.Alkalinity, dosed.Dic, 1e-12);
    }

    [Fact]
    public void ExchangeWater_All_IsSourceWater()
    {
        var tank = new VirtualTank(Tank(Fresh) with { SourceWater = Fresh with { AlkalinityMmolL = 3 } }, Start, OpenAir);
        tank.ExchangeWater(1);
        Assert.Equal(3, tank.Water.Amounts.Alkalinity, 1e-12);
        Assert.Throws<ArgumentOutOfRangeException>(() => tank.ExchangeWater(1.1));
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
