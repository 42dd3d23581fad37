using TankChem.Chemistry;
using TankChem.Dosing;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Advising;

/// <summary>Lays a place's water before the dose planner.</summary>
public static class DoseAdvice
{
    // Common practice, no source: fish at most 22 mg/L a portion and 50 mg/L a day as CaCO3; reef at most 0.5 dKH a portion and 1 dKH a day.
    private const double FishStepMmolL = 0.45;
    private const double FishDayMmolL = 1.0;
    private const double ReefStepMmolL = 0.178;
    private const double ReefDayMmolL = 0.357;

    // Common practice, no source: pH at most 0.5 a day up for fish, 0.3 for early stages and sea life.
    private const double PHDay = 0.5;
    private const double PHDaySensitive = 0.3;

    // Common practice, no source: exchanges of CO2 an hour with a degasser, with strong diffused air, and with air in an aquarium.
    private const double LoopStripPerHour = 3;
    private const double TankStripPerHour = 2;
    private const double AquariumStripPerHour = 1;

    /// <summary>Less total ammonia than a test kit tells from nothing, mg/L (common practice, no source); a reading below it counts as this much.</summary>
    private const double TanSeenMgL = 0.05;

    /// <summary>Stock groups whose keepers do not measure TAN in daily work: plants and corals take it up, and there is no feed that would bound it.</summary>
    private static readonly string[] WithoutAmmonia = ["planted", "reef"];
    private static readonly string[] Sensitive = ["salmonid-early", "marine-fish", "shrimp", "reef"];

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
        List<DoseGround> missing = [.. OfSetUp(place, loop)];

        // The tank asked for comes first; a loop that is asked for has no animals of its own, so its tanks are what counts.
        List<PlaceSnapshot> tanks = place.Definition.Kind == PlaceKind.Loop ? [.. loopTanks] : [place, .. loopTanks.Where(t => t.Definition.Key != place.Definition.Key)];
        if (tanks.Count == 0 && place.Definition.Assigned)
            missing.Add(new DoseGround("input", "place", $"No tank is set up in {place.Definition.Name}, so nobody knows which limits its water must hold. Set its tanks up first.", null));
        var waters = new List<DoseWater>();
        foreach (PlaceSnapshot tank in tanks)
        {
            bool needsTan = NeedsTan(tank);
            IReadOnlyList<DoseGround> gaps = InputGaps.Of(tank, loop, now, needsTan);
            missing.AddRange(gaps);
            if (!gaps.Any(g => g.Quantity != "tan"))
                waters.Add(WaterOf(tank, loop, needsTan));
        }

        bool reef = tanks.Any(t => Has(t, "reef"));
        return new DoseProblem
        {
            VolumeM3 = (loop ?? place).Definition.VolumeM3,
            Waters = waters,
            MissingInputs = [.. missing.DistinctBy(g => (g.Quantity, g.Text))],
            DosedTodayMmolL = dosedTodayMmolL,
            StepMmolLMax = reef ? ReefStepMmolL : FishStepMmolL,
            DayMmolLMax = reef ? ReefDayMmolL : FishDayMmolL,
            StripPerHour = loop is not null ? LoopStripPerHour : WithoutAmmonia.Any(s => Has(place, s)) ? AquariumStripPerHour : TankStripPerHour,
        };
    }

    private static IEnumerable<DoseGround> OfSetUp(PlaceSnapshot place, PlaceSnapshot? loop)
    {
        if (!place.Definition.Assigned)
            yield return new DoseGround("input", "place", $"{place.Definition.Name} is not set up yet: name its stock and volume first.", null);
        PlaceSnapshot sharing = loop ?? place;
        if (place.Definition.Loop is { } id && loop is null)
            yield return new DoseGround("input", "volume", $"{place.Definition.Name} shares the water of loop \"{id}\", which is not set up; set it up first, with the volume of all its water.", null);
        else if (sharing.Definition.VolumeM3 is not > 0)
            yield return new DoseGround("input", "volume", $"The volume of {sharing.Definition.Name} is not on record; set it up first.", null);
        if (place.Definition is { Assigned: true, Kind: PlaceKind.Tank, Stock.Count: 0 })
            yield return new DoseGround("input", "place", $"{place.Definition.Name} has no stock on record, so there is no limit to hold. Name its stock first.", null);
    }

    private static bool Has(PlaceSnapshot tank, string stock) => tank.Definition.Stock.Contains(stock, StringComparer.Ordinal);

    private static bool NeedsTan(PlaceSnapshot tank) => tank.Definition.Stock.Any(s => !WithoutAmmonia.Contains(s, StringComparer.Ordinal));

    private static DoseWater WaterOf(PlaceSnapshot tank, PlaceSnapshot? loop, bool needsTan)
    {
        IReadOnlyDictionary<string, WaterValue> values = tank.Water.Values;
        WaterValue temperature = values["temperature"], alkalinity = values["alkalinity"], ph = values["ph"];
        double salinity = Known(values, "salinity")?.Value ?? tank.Definition.Salinity ?? loop?.Definition.Salinity ?? 0;
        double pressureAtm = Known(values, "air-pressure")?.Value / 1013.25 ?? Atmosphere.PressureAtmAtElevation(tank.Site.ElevationM);
        double airPpm = Known(values, "air-co2")?.Value ?? tank.Definition.AirCo2Ppm ?? loop?.Definition.AirCo2Ppm ?? tank.Site.AirCo2Ppm;
        double density = Density.KgPerL(temperature.Value, salinity);
        bool ownIons = tank.Definition.Ions is not null || tank.Definition.HardnessMmolL is not null;
        PlaceDefinition? ions = ownIons ? tank.Definition : loop?.Definition;
        return new DoseWater
        {
            Name = tank.Definition.Name,
            Solution = IonConverter.WithIons(
                new Solution { TemperatureC = temperature.Value, Salinity = salinity, PressureAtm = pressureAtm },
                ions?.Ions,
                ions?.HardnessMmolL,
                Known(values, "calcium")?.Value,
                density),
            TemperatureU = temperature.U ?? 0.2,
            PH = new Estimate(ph.Value, ph.U ?? 0.1),
            AlkalinityUmolKg = new Estimate(alkalinity.Value * 1000 / density, (alkalinity.U ?? 0.05 * alkalinity.Value) * 1000 / density),
            TanMgL = Known(values, "tan") is { } tan ? new Estimate(Math.Max(tan.Value, TanSeenMgL), Math.Max(tan.U ?? 0.1 * tan.Value, 0.1 * TanSeenMgL)) : null,
            AirPco2Uatm = Atmosphere.Pco2Uatm(airPpm, pressureAtm, temperature.Value, salinity),
            Limits = [.. tank.Limits.Where(l => l.Quantity is "ph" or "co2" or "nh3-n" or "alkalinity").Select(l => new DoseLimit(l.Quantity, l.IsUpper, l.Value, l.IsDanger, l.Text))],
            PhRisePerDayMax = Sensitive.Any(s => Has(tank, s)) ? PHDaySensitive : PHDay,
            AmmoniaMatters = needsTan,
        };
    }

    private static WaterValue? Known(IReadOnlyDictionary<string, WaterValue> values, string quantity) =>
        values.TryGetValue(quantity, out WaterValue? value) && !value.Stale ? value : null;
}
