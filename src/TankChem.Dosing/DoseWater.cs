using TankChem.Chemistry;

namespace TankChem.Dosing;

/// <summary>One tank (or the loop itself) that a dose reaches: its water now and the limits that hold in it.</summary>
public sealed record DoseWater
{
    /// <summary>The place's name as people know it.</summary>
    public required string Name { get; init; }

    /// <summary>Temperature, salinity, ions, pressure.</summary>
    public required Solution Solution { get; init; }

    /// <summary>Standard uncertainty of the temperature, °C.</summary>
    public double TemperatureU { get; init; } = 0.2;

    /// <summary>pH, NBS.</summary>
    public required Estimate PH { get; init; }

    /// <summary>Alkalinity, µmol/kg.</summary>
    public required Estimate AlkalinityUmolKg { get; init; }

    /// <summary>Total ammonia nitrogen, mg/L as N, or an upper bound from the feed; null when nothing bounds it. Never zero for want of knowledge.</summary>
    public Estimate? TanMgL { get; init; }

    /// <summary>pCO2 of the air above it, µatm.</summary>
    public required double AirPco2Uatm { get; init; }

    /// <summary>Its limits, strictest of its stock groups.</summary>
    public required IReadOnlyList<DoseLimit> Limits { get; init; }

    /// <summary>Largest rise of pH an hour that a dose may cause (common practice, no source: 0.2 for fish).</summary>
    public double PhRisePerHourMax { get; init; } = 0.2;

    /// <summary>Largest rise of pH a day that a dose may cause (common practice, no source: 0.5 for fish, 0.3 for early stages and sea life).</summary>
    public double PhRisePerDayMax { get; init; } = 0.5;

    /// <summary>Whether a plan needs to know total ammonia. False only where plants or corals use it up, so that nobody measures it (planted, reef): the plan then says so in its cautions.</summary>
    public bool AmmoniaMatters { get; init; } = true;
}
