namespace TankChem.Alarms;

/// <summary>The condition of an alarm on a number: at or past a set-point, and gone only when clear of it by the deadband.</summary>
/// <remarks>
/// Where the standard uncertainty u of the number is known, the set-point may be moved towards the safe side by a guard band z·u (JCGM 106:2012, guarded acceptance),
/// so that the alarm is raised as soon as the probability of being past the limit reaches <see cref="RaiseProbability"/>.
/// The band is never wider than <see cref="WidestGuard"/>: doubt alone must not look like bad water; who cannot vouch for a number says so in an alarm of its own.
/// </remarks>
public sealed record LimitCondition
{
    private readonly double _z;
    private readonly double _raiseProbability = 0.5;

    /// <summary>True when the number must stay below the set-point, false when above.</summary>
    public required bool IsUpper { get; init; }

    /// <summary>The set-point, unit of the number.</summary>
    public required double SetPoint { get; init; }

    /// <summary>How far inside the set-point the number must come for the condition to be gone, ≥ 0, same unit.</summary>
    public double Deadband { get; init; }

    /// <summary>Widest guard band, ≥ 0, same unit.</summary>
    public double WidestGuard { get; init; }

    /// <summary>Probability of being past the set-point from which on the condition holds: 0.5 (no guard band) or 0.1.</summary>
    public double RaiseProbability
    {
        get => _raiseProbability;
        init
        {
            _raiseProbability = value;
            _z = value switch
            {
                0.5 => 0,
                0.1 => NinetyPercentQuantile,
                _ => throw new ArgumentOutOfRangeException(nameof(value), value, "The probability at which a limit is raised is 0.5 or 0.1."),
            };
        }
    }

    /// <summary>Quantile of the standard normal distribution at 0.9.</summary>
    public const double NinetyPercentQuantile = 1.2815515655446004;

    /// <summary>The guard band for a number of standard uncertainty <paramref name="u"/>, 0…<see cref="WidestGuard"/>; 0 when u is not known.</summary>
    public double Guard(double? u) => u is { } known && known > 0 && _z > 0 ? Math.Min(_z * known, WidestGuard) : 0;

    /// <summary>Whether the condition holds.</summary>
    /// <param name="value">The number; finite.</param>
    /// <param name="u">Its standard uncertainty, same unit; null when not known.</param>
    /// <param name="heldBefore">Whether it held at the step before.</param>
    public bool Holds(double value, double? u, bool heldBefore)
    {
        double beyond = IsUpper ? value - SetPoint : SetPoint - value;
        beyond += Guard(u);
        return beyond >= 0 || (heldBefore && beyond > -Deadband);
    }

    /// <summary>Whether the best value itself is at or past the set-point, whatever its uncertainty.</summary>
    public bool IsPast(double value) => IsUpper ? value >= SetPoint : value <= SetPoint;

    /// <summary>Whether doubt alone reaches the set-point: the probability asks for an alarm, but only beyond the widest guard band.</summary>
    public bool IsInDoubt(double value, double? u) => u is { } known && _z > 0 && _z * known > WidestGuard
        && (IsUpper ? value + _z * known >= SetPoint : value - _z * known <= SetPoint);
}
