using TankChem.TestKit;

namespace TankChem.Chemistry.Tests;

/// <summary>Against conductivity.csv: salinity from TEOS-10 GSW 3.6.16 (which carries PSS-78 and its extension), density and oxygen from the published coefficients.</summary>
public class ConductivityTableTests
{
    private static readonly GoldenTable Table = GoldenTable.Read("conductivity.csv");

    [Fact]
    public void FromConductivity_EachRow_GivesThePracticalSalinity()
    {
        // Below 2 the reference joins the extension to PSS-78 by a factor of its own, which moves it by up to 0.0005.
        foreach (GoldenRow row in Table.Rows)
            Assert.Equal(row["SP"], PracticalSalinity.FromConductivity(row["C"], row["T"]), row["SP"] < 2 ? 6e-4 : 1e-6);
    }

    [Fact]
    public void KgPerL_EachRow_GivesTheDensity()
    {
        foreach (GoldenRow row in Table.Rows)
            Assert.Equal(row["rho_eos80"], 1000 * Density.KgPerL(row["T"], row["SP"]), 1e-9);
    }

    [Fact]
    public void SaturationMgL_EachRow_GivesTheOxygen()
    {
        foreach (GoldenRow row in Table.Rows)
            Assert.Equal(row["o2_bk_mg_L"], DissolvedOxygen.SaturationMgL(row["T"], row["SP"], 1), 1e-9);
    }
}
