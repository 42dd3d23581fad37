using System.Globalization;
using TankChem.Chemistry;
using TankChem.TestKit;

namespace TankChem.EndToEnd.Tests.Processes;

/// <summary>Rows of the reference tables as a tank's configuration and as what its probes send.</summary>
internal sealed record ReferenceWater(string Id, string Configuration, IReadOnlyList<(string Quantity, string Payload)> Readings, double Co2MgL, double Relative)
{
    /// <summary>Fresh waters with their ions (freshwater.csv, made with PHREEQC 3.7.3); CO2 within 2 %.</summary>
    public static IEnumerable<ReferenceWater> Fresh(int count) => GoldenTable.Read("freshwater.csv").Rows
        .Where(r => r.Text("kind") == "closed").Take(count)
        .Select((r, i) =>
        {
            // The table is per kg of water; for these dilute waters a litre holds density times that.
            double density = Density.KgPerL(r["T"], 0);
            string Ion(string column, double mass) => $"\"{N(r[column] * mass * density * 1000)} mg/L\"";
            return new ReferenceWater(
                $"fresh-{i}",
                $$"""{ "id": "fresh-{{i}}", "volume": "9 m3", "salinity": 0, "stock": "warm-water", "ions": { "calcium": {{Ion("Ca", 40.078)}}, "magnesium": {{Ion("Mg", 24.305)}}, "sodium": {{Ion("Na", 22.990)}}, "potassium": {{Ion("K", 39.098)}}, "chloride": {{Ion("Cl", 35.45)}}, "sulfate": {{Ion("SO4", 96.06)}} } }""",
                [("temperature", N(r["T"])), ("alkalinity", $$"""{"value":{{N(r["alkalinity"] * 1000 * density)}},"unit":"mmol/L"}"""), ("ph", N(r["pH"]))],
                r["CO2aq"] * 1000 * MolarMass.Co2 * density,
                0.02);
        });

    /// <summary>Sea waters above S 15 (seawater.csv, made with PyCO2SYS 1.8.3.4); CO2 within 0.1 %.</summary>
    public static IEnumerable<ReferenceWater> Sea(int count) => GoldenTable.Read("seawater.csv").Rows
        .Where(r => r.Text("set") == "M10-DR79" && r["S"] > 15 && r["total_phosphate"] == 0 && r["total_silicate"] == 0 && r["total_ammonia"] == 0 && r["pH_nbs"] is > 6 and < 9.5).Take(count)
        .Select((r, i) =>
        {
            double density = Density.KgPerL(r["T"], r["S"]);
            return new ReferenceWater(
                $"sea-{i}",
                $$"""{ "id": "sea-{{i}}", "volume": "2 m3", "stock": "marine-fish" }""",
                [("salinity", N(r["S"])), ("temperature", N(r["T"])), ("alkalinity", $$"""{"value":{{N(r["alkalinity"] / 1000 * density)}},"unit":"mmol/L"}"""), ("ph", N(r["pH_nbs"]))],
                r["CO2"] * 1e-3 * MolarMass.Co2 * density,
                0.001);
        });

    private static string N(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
