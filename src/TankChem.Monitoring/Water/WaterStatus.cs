namespace TankChem.Monitoring.Water;

/// <summary>How complete a water state is.</summary>
public enum WaterStatus
{
    /// <summary>Nothing to say: no usable reading.</summary>
    None,

    /// <summary>Some values cannot be computed; the reason says which and why.</summary>
    Partial,

    /// <summary>All values of this place are there.</summary>
    Ok,
}
