using TankChem.Chemistry.Sea;

namespace TankChem.Chemistry.Tests;

/// <summary>Values that a person finds in a handbook or paper, the source beside each.</summary>
public class HandbookTests
{
    private const double MmHgToUatm = 1e6 / 760;

    public static TheoryData<double, double, double> TuckerFactors => new()
    {
        { 6.0, 5, 2.915 }, { 6.0, 15, 2.315 }, { 6.0, 25, 1.970 }, { 6.0, 35, 1.839 },
        { 6.8, 10, 0.402 }, { 6.8, 20, 0.335 }, { 6.8, 30, 0.298 },
        { 7.0, 5, 0.291 }, { 7.0, 25, 0.197 }, { 7.4, 15, 0.092 }, { 7.4, 35, 0.073 },
    };

    /// <summary>Tucker 1984, reprinted in SRAC 468 (Hargreaves and Brunson 1996): mg/L CO2 per mg/L of alkalinity as CaCO3, ionic strength left out, constants of another author (within 2.5 %), two or three digits.</summary>
    [Theory]
    [MemberData(nameof(TuckerFactors))]
    public void Co2_InVeryDiluteWater_IsTuckersFactor(double ph, double t, double factor)
    {
        // At 5 mg/L as CaCO3 the ionic strength takes 1 % off.
        CarbonateState state = Waters.Solved(new Solution { TemperatureC = t, Ions = Waters.NoIons }, new CarbonateInput { PH = ph, AlkalinityUmolKg = 5 / 50.043 * 1000 });

        Assert.InRange(state.Co2MgL / 5, factor * 0.955 - 0.0005, factor * 1.01);
    }

    /// <summary>Tucker's example in SRAC 468: alkalinity 50 mg/L, pH 6.8, 25 °C has 15.65 mg/L; activity takes 3 to 10 % off.</summary>
    [Fact]
    public void Co2_OfTuckersExample_IsAFewPercentLess()
    {
        CarbonateState state = Waters.Solved(new Solution { TemperatureC = 25 }, new CarbonateInput { PH = 6.8, AlkalinityUmolKg = 50 / 50.043 * 1000 });

        Assert.InRange(state.Co2MgL, 15.65 * 0.90, 15.65 * 0.97);
    }

    /// <summary>Fivelstad et al. 2018 (sea water of 34, 10 °C) and 1999 (fresh water near 5 °C): pressure of CO2 in mmHg beside mg/L, rounded in the papers.</summary>
    [Theory]
    [InlineData(34, 10, 5.5, 15)]
    [InlineData(34, 10, 8.0, 21)]
    [InlineData(34, 10, 11.6, 30)]
    [InlineData(0, 5, 2, 7)]
    [InlineData(0, 5, 5, 19)]
    [InlineData(0, 5, 9, 32)]
    public void Co2_FromItsPressure_IsThatOfTheExperiments(double salinity, double t, double mmHg, double mgL)
    {
        CarbonateState state = Waters.Solved(new Solution { TemperatureC = t, Salinity = salinity }, new CarbonateInput { AlkalinityUmolKg = 1500, Pco2Uatm = mmHg * MmHgToUatm });

        Assert.InRange(state.Co2MgL, mgL * 0.94, mgL * 1.06);
    }

    /// <summary>Rain in equilibrium with air has pH 5.6 (Boyd).</summary>
    [Fact]
    public void Ph_OfRainInEquilibriumWithAir_Is5Point6()
    {
        var rain = new Solution { TemperatureC = 25, Ions = Waters.NoIons };
        double pco2 = Atmosphere.Pco2Uatm(420, 1, 25, 0);

        Assert.Equal(5.6, Waters.Solved(rain, new CarbonateInput { AlkalinityUmolKg = 0, Pco2Uatm = pco2 }).PhNbs, 0.05);
    }

    /// <summary>Stumm and Morgan (from memory): calcite with air of 10^-3.5 atm at 25 °C has pH 8.3 and about 20 mg/L of calcium.</summary>
    [Fact]
    public void OmegaCalcite_OfCalciteWithAir_Is1()
    {
        var water = new Solution { TemperatureC = 25, Ions = new IonComposition { CalciumMmolKg = 19.4 / 40.078 } };
        CarbonateState state = Waters.Solved(water, new CarbonateInput { AlkalinityUmolKg = 2000 * 19.4 / 40.078, Pco2Uatm = 316.2 });

        Assert.Equal(8.3, state.PhNbs, 0.05);
        Assert.Equal(1, state.OmegaCalcite, 0.05);
    }

    /// <summary>Emerson et al. 1975, their table and the example of UF/IFAS (TAN 1, pH 8, 24 °C: 0.0502).</summary>
    [Theory]
    [InlineData(7, 6, 0.0013)]
    [InlineData(7, 10, 0.0018)]
    [InlineData(7, 20, 0.0039)]
    [InlineData(7, 30, 0.0080)]
    [InlineData(8, 6, 0.0133)]
    [InlineData(8, 10, 0.0182)]
    [InlineData(8, 20, 0.0381)]
    [InlineData(8, 24, 0.0502)]
    [InlineData(8, 30, 0.0743)]
    [InlineData(8.4, 28, 0.1495)]
    [InlineData(8.5, 20, 0.1112)]
    [InlineData(9, 25, 0.3619)]
    public void Nh3Fraction_OfVeryDiluteWater_IsEmersons(double ph, double t, double share)
    {
        CarbonateState state = Waters.Solved(new Solution { TemperatureC = t, Ions = Waters.NoIons }, new CarbonateInput { PH = ph, DicUmolKg = 1 });

        Assert.Equal(share, state.Nh3Fraction, Math.Max(0.0001, 0.005 * share));
    }

    /// <summary>Bower and Bidwell 1978, sea water of 34 at an NBS pH of 8.0. Their table rests on an older constant on the free scale; the measured constant used here (CW95, total scale) agrees within a tenth.</summary>
    [Theory]
    [InlineData(10, 0.0144)]
    [InlineData(15, 0.0207)]
    [InlineData(20, 0.0298)]
    [InlineData(25, 0.0428)]
    public void Nh3Fraction_OfSeaWaterAtAnNbsPh_IsNearBowerAndBidwell(double t, double share)
    {
        CarbonateState state = Waters.Solved(new Solution { TemperatureC = t, Salinity = 34 }, new CarbonateInput { PH = 8, AlkalinityUmolKg = 2300 });

        Assert.InRange(state.Nh3Fraction, 0.9 * share, 1.1 * share);
    }

    /// <summary>Standard Methods / USGS tables of oxygen in fresh water at 1 atm (from memory).</summary>
    [Theory]
    [InlineData(0, 14.62)]
    [InlineData(5, 12.77)]
    [InlineData(10, 11.29)]
    [InlineData(15, 10.08)]
    [InlineData(20, 9.09)]
    [InlineData(25, 8.26)]
    [InlineData(30, 7.56)]
    [InlineData(35, 6.95)]
    public void Oxygen_OfFreshWater_IsTheTables(double t, double mgL) => Assert.Equal(mgL, DissolvedOxygen.SaturationMgL(t, 0, 1), 0.00501);

    /// <summary>BK84 with its pressure term, θ in °C: fresh water at 20 °C and 0.9 atm; sea water of 35 (computed from the published equation).</summary>
    [Theory]
    [InlineData(20, 0, 0.9, 8.16)]
    [InlineData(10, 35, 1, 9.02)]
    [InlineData(20, 35, 1, 7.40)]
    [InlineData(25, 35, 1, 6.77)]
    public void Oxygen_AtPressureAndSalinity_IsThePublishedEquation(double t, double s, double atm, double mgL) => Assert.Equal(mgL, DissolvedOxygen.SaturationMgL(t, s, atm), 0.00501);

    /// <summary>FM83, p. 22: density at temperatures of the scale of 1968.</summary>
    [Theory]
    [InlineData(0, 0, 999.842594)]
    [InlineData(0, 30, 995.651134)]
    [InlineData(35, 0, 1028.106331)]
    [InlineData(35, 30, 1021.728639)]
    public void Density_AtOneAtmosphere_IsTheCheckValue(double s, double t68, double kgPerM3) => Assert.Equal(kgPerM3, 1000 * Density.KgPerL(t68 / 1.00024, s), 1e-6);

    /// <summary>FM83, p. 9 and 14: conductivity ratios at the surface. The first of p. 14 is printed 0.498088, recomputed 0.498008.</summary>
    [Theory]
    [InlineData(1, 15, 35)]
    [InlineData(0.498008, 0, 25)]
    [InlineData(0.654990, 10, 25)]
    [InlineData(1.000073, 10, 40)]
    [InlineData(1.529967, 30, 40)]
    public void FromConductivity_RatioOfTheCheckTable_GivesTheSalinity(double ratio, double t68, double s) => Assert.Equal(s, PracticalSalinity.FromConductivity(42.914 * ratio, t68 / 1.00024), 5e-5);

    /// <summary>FM83: sea water of 35 conducts 42.914 mS/cm at 15 °C and 1.23653 times that at 25 °C (1968). A conductivity referred to 25 °C is one measured there.</summary>
    [Fact]
    public void FromConductivityAt25C_OfSeaWater_Gives35() => Assert.Equal(35, PracticalSalinity.FromConductivityAt25C(42_914 * 1.23653), 0.006);

    /// <summary>WP80: vapour over sea water of 35 at 25 °C is 0.03066 atm, so 420 ppm of dry air is 407 µatm.</summary>
    [Fact]
    public void Pco2_OfAirOverSeaWater_LeavesRoomForWaterVapour()
    {
        Assert.Equal(0.03066, WaterVapourWP80.PressureAtm(298.15, 35), 5e-6);
        Assert.Equal(420 * (1 - 0.03066), Atmosphere.Pco2Uatm(420, 1, 25, 35), 0.005);
        Assert.Equal(420 * (0.9 - 0.03066), Atmosphere.Pco2Uatm(420, 0.9, 25, 35), 0.005);
    }

    /// <summary>ISO75 (from memory): 1013.25 hPa at sea level, 898.75 at 1,000 m, 795.0 at 2,000 m.</summary>
    [Theory]
    [InlineData(0, 1013.25)]
    [InlineData(1000, 898.75)]
    [InlineData(2000, 795.0)]
    public void PressureAtmAtElevation_OfTheStandardAtmosphere_IsTheTables(double elevationM, double hPa) => Assert.Equal(hPa, 1013.25 * Atmosphere.PressureAtmAtElevation(elevationM), 0.1);

    /// <summary>Solubility of pure CO2 in fresh water from pKH 1.468 at 25 °C (PB82) and a fugacity of 0.994 of the pressure: 1.49 g/L under one atmosphere.</summary>
    [Fact]
    public void Co2_UnderAnAtmosphereOfPureGas_Is1Point49GramsPerLitre()
    {
        CarbonateState state = Waters.Solved(new Solution { TemperatureC = 25, Ions = Waters.NoIons }, new CarbonateInput { AlkalinityUmolKg = 0, Pco2Uatm = 1e6 });

        Assert.Equal(1490, state.Co2MgL, 5.0);
    }
}
