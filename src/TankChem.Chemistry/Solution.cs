namespace TankChem.Chemistry;

/// <summary>A water apart from its carbonate system: temperature, salt, ions, nutrients, and the constants to compute it with.</summary>
/// <remarks>Amounts are per kg of solution, with <see cref="ConstantSet.Fresh"/> per kg of water.</remarks>
public sealed record Solution
{
    /// <summary>Temperature, °C. Valid −2…60.</summary>
    public required double TemperatureC { get; init; }

    /// <summary>Practical salinity. Valid 0…60; 0 is fresh.</summary>
    public double Salinity { get; init; }

    /// <summary>Barometric pressure at the water's surface, atm. Valid 0.4…1.2.</summary>
    public double PressureAtm { get; init; } = 1;

    /// <summary>Major ions one by one; null when they are not known. Used for fresh water only.</summary>
    public IonComposition? Ions { get; init; }

    /// <summary>Calcium + magnesium, mmol/kg, when the ions are not known one by one; null when not known either.</summary>
    public double? HardnessMmolKg { get; init; }

    /// <summary>Total dissolved phosphate, µmol/kg.</summary>
    public double PhosphateUmolKg { get; init; }

    /// <summary>Total dissolved silicate, µmol/kg.</summary>
    public double SilicateUmolKg { get; init; }

    /// <summary>Total ammonia (NH3 + NH4⁺), µmol/kg; counted in alkalinity.</summary>
    public double AmmoniaUmolKg { get; init; }

    /// <summary>The constants to use.</summary>
    public ConstantSet Constants { get; init; } = ConstantSet.Auto;
}
