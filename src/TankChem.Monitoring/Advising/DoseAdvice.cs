using System.Globalization;
using TankChem.Chemistry;
using TankChem.Dosing;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Advising;

/// <summary>Lays a place's water before the dose planner.</summary>
public static class DoseAdvice
{
    /// <summary>Stock groups whose keepers do not measure TAN in daily work: plants and corals take it up, and there is no feed that would bound it.</summary>
    private static readonly string[] WithoutAmmonia = ["planted", "reef"];

    /// <summary>The problem of a place.</summary>
    /// <param name="place">The place that is asked for.</param>
    /// <param name="loop">The loop whose water it shares (or is); null when it is on its own.</param>
    /// <param name="loopTanks">All tanks of that loop; empty when there is none.</param>
    /// <param name="now">Now.</param>
    /// <param name="dosedTodayMmolL">What this water has had today, mmol/L.</param>
    public static DoseProblem Problem(PlaceSnapshot place, PlaceSnapshot? loop, IReadOnlyList<PlaceSnapshot> loopTanks, DateTimeOffset now, double dosedTodayMmolL)
    {
        ArgumentNullException.ThrowIfNull(place);
        ArgumentNullException.ThrowIfNull(loopTanks);
        var missing = new List<DoseGround>();
        if (!place.Definition.Assigned)
            missing.Add(new DoseGround("input", "place", $"{place.Definition.Name} is not set up yet: name its stock and volume first.", null));
        PlaceSnapshot sharing = loop ?? place;
        if (sharing.Definition.VolumeM3 is not > 0)
            missing.Add(new DoseGround("input", "volume", $"The volume of {sharing.Definition.Name} is not on record; set it up first.", null));

        // The tank asked for comes first; a loop that is asked for has no animals of its own, so its tanks are what counts.
        List<PlaceSnapshot> tanks = place.Definition.Kind == PlaceKind.Loop ? [.. loopTanks] : [place, .. loopTanks.Where(t => t.Definition.Key != place.Definition.Key)];
        if (tanks.Count == 0 && place.Definition.Assigned)
            missing.Add(new DoseGround("input", "place", $"No tank is set up in {place.Definition.Name}.", null));
        var waters = new List<DoseWater>();
        foreach (PlaceSnapshot tank in tanks)
        {
            List<DoseGround> gaps = Gaps(tank);
            if (gaps.Count > 0)
                missing.AddRange(gaps);
            else
                waters.Add(WaterOf(tank, loop));
        }

        return new DoseProblem
        {
            VolumeM3 = sharing.Definition.VolumeM3,
            Waters = waters,
            MissingInputs = [.. missing.DistinctBy(g => (g.Quantity, g.Text))],
            DosedTodayMmolL = dosedTodayMmolL,
            StepMmolLMax = place.Definition.Stock.Contains("reef", StringComparer.Ordinal) ? ReefDayMmolL / 2 : FishStepMmolL,
            DayMmolLMax = place.Definition.Stock.Contains("reef", StringComparer.Ordinal) ? ReefDayMmolL : FishDayMmolL,
        };
    }

    // Common practice, no source: fish at most 22 mg/L a portion and 50 mg/L a day as CaCO3; reef at most 1 dKH a day.
    private const double FishStepMmolL = 0.45;
    private const double FishDayMmolL = 1.0;
    private const double ReefDayMmolL = 0.357;

    private static List<DoseGround> Gaps(PlaceSnapshot tank)
    {
        var gaps = new List<DoseGround>();
        foreach (string quantity in new[] { "ph", "alkalinity", "temperature" })
        {
            if (tank.Water.Values.TryGetValue(quantity, out WaterValue? value) && !value.Stale)
                continue;
            gaps.Add(new DoseGround("input", quantity, GapText(tank, quantity, value), null));
        }

        return gaps;
    }

    private static string GapText(PlaceSnapshot tank, string quantity, WaterValue? lastKnown)
    {
        QuantityDefinition definition = QuantityCatalog.Get(quantity);
        if (lastKnown is not null)
            return $"{tank.Definition.Name}: {definition.Name} is too old, last known {lastKnown.Time.ToString("d MMM HH:mm", CultureInfo.InvariantCulture)} UTC. Measure it again.";
        Reading? kept = tank.Latest.FirstOrDefault(r => r.Series.Quantity == quantity && r.Reason == ReadingResolver.UnitNotConfirmed);
        return kept is not null
            ? $"{tank.Definition.Name}: the unit of {definition.Name} is not confirmed ({kept.RawValue.ToString(CultureInfo.InvariantCulture)} of what?). Confirm it first."
            : $"{tank.Definition.Name}: {definition.Name} is not known. Measure it first.";
    }

    private static DoseWater WaterOf(PlaceSnapshot tank, PlaceSnapshot? loop)
    {
        IReadOnlyDictionary<string, WaterValue> values = tank.Water.Values;
        double temperature = values["temperature"].Value;
        double salinity = Known(values, "salinity")?.Value ?? tank.Definition.Salinity ?? loop?.Definition.Salinity ?? 0;
        double pressureAtm = Known(values, "air-pressure")?.Value / 1013.25 ?? Atmosphere.PressureAtmAtElevation(tank.Site.ElevationM);
        double airPpm = Known(values, "air-co2")?.Value ?? tank.Definition.AirCo2Ppm ?? loop?.Definition.AirCo2Ppm ?? tank.Site.AirCo2Ppm;
        double density = Density.KgPerL(temperature, salinity);
        bool ownIons = tank.Definition.Ions is not null || tank.Definition.HardnessMmolL is not null;
        PlaceDefinition? ions = ownIons ? tank.Definition : loop?.Definition;
        WaterValue alkalinity = values["alkalinity"], ph = values["ph"];
        WaterValue? tan = Known(values, "tan");
        return new DoseWater
        {
            Name = tank.Definition.Name,
            Solution = IonConverter.WithIons(
                new Solution { TemperatureC = temperature, Salinity = salinity, PressureAtm = pressureAtm },
                ions?.Ions,
                ions?.HardnessMmolL,
                Known(values, "calcium")?.Value,
                density),
            PH = new Estimate(ph.Value, ph.U ?? 0),
            AlkalinityUmolKg = new Estimate(alkalinity.Value * 1000 / density, (alkalinity.U ?? 0) * 1000 / density),
            TanMgL = tan is null ? null : new Estimate(tan.Value, tan.U ?? 0),
            AirPco2Uatm = Atmosphere.Pco2Uatm(airPpm, pressureAtm, temperature, salinity),
            Limits = [.. tank.Limits.Where(l => l.Quantity is "ph" or "co2" or "nh3-n" or "alkalinity").Select(l => new DoseLimit(l.Quantity, l.IsUpper, l.Value, l.IsUrgent && (l.Quantity is "co2" or "nh3-n"), l.Text))],
            PhRisePerHourMax = 0.2,
            AmmoniaMatters = tank.Definition.Stock.Any(s => !WithoutAmmonia.Contains(s, StringComparer.Ordinal)),
        };
    }

    private static WaterValue? Known(IReadOnlyDictionary<string, WaterValue> values, string quantity) =>
        values.TryGetValue(quantity, out WaterValue? value) && !value.Stale ? value : null;
}
