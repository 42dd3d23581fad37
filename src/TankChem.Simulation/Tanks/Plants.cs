using TankChem.Simulation.Waters;

namespace TankChem.Simulation.Tanks;

/// <summary>Plants, algae or the symbionts of corals: photosynthesis by light, respiration always.</summary>
/// <remarks>Photosynthetic and respiratory quotient 1. Saturation in light and in CO2; half-saturation constants are common practice, no source.</remarks>
public sealed record Plants
{
    /// <summary>Gross photosynthesis where light and CO2 are ample, mmol C/(L·h).</summary>
    public required double PhotosynthesisMmolLH { get; init; }

    /// <summary>Respiration, mmol C/(L·h).</summary>
    public required double RespirationMmolLH { get; init; }

    /// <summary>Light at half of the full rate, µmol/(m² s).</summary>
    public double HalfSaturationLight { get; init; } = 60;

    /// <summary>CO2 at half of the full rate, mmol/L; small for those that use bicarbonate.</summary>
    public double HalfSaturationCo2MmolL { get; init; } = 0.05;

    /// <summary>Rates, mmol/(L·h).</summary>
    /// <param name="water">The water.</param>
    /// <param name="light">Light, µmol/(m² s).</param>
    public WaterAmounts Rates(WaterBody water, double light)
    {
        ArgumentNullException.ThrowIfNull(water);
        double co2 = water.Co2MmolL;
        double gross = PhotosynthesisMmolLH * light / (HalfSaturationLight + light) * co2 / (HalfSaturationCo2MmolL + co2);
        double net = gross - RespirationMmolLH;
        return new WaterAmounts(-net, 0, 0, 0, net, 0);
    }
}
