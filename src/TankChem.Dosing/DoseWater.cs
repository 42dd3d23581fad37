using TankChem.Chemistry;

namespace TankChem.Dosing;

/// <summary>One tank (or the loop itself) that a dose reaches: its water now and the limits that hold in it.</summary>
public sealed record DoseWater
{
    /// <summary>The place's name as people know it.</summary>
    public required string Name { get; init; }

    /// <summary>Temperature, salinity, ions, pressure.</summary>
    public required Solution Solution { get; init; }

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

    /// <summary>Largest rise of pH an hour that a dose may cause.</summary>
    public double PhRisePerHourMax { get; init; } = 0.2;

    /// <summary>Whether plants or corals use up TAN so that it is normally not measured there (planted, reef): then it is asked for, not assumed.</summary>
    public bool AmmoniaMatters { get; init; } = true;
}
