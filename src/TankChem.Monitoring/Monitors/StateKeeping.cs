using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Monitors;

/// <summary>Decides which water states go to disk: at most one in 10 s, when a value has moved or the last is 5 min old; and at once when something came, went or turned stale.</summary>
internal sealed class StateKeeping
{
    private static readonly TimeSpan Shortest = TimeSpan.FromSeconds(10);
    private static readonly TimeSpan Longest = TimeSpan.FromMinutes(5);

    /// <summary>A move worth a row, in standard uncertainties; without one, as a share of the value.</summary>
    private const double Share = 0.2;
    private const double ShareWithoutUncertainty = 0.01;

    private WaterState? _kept;

    /// <summary>The state if it is to be kept, else null.</summary>
    public WaterState? Consider(WaterState state, bool alarmChanged)
    {
        if (state.Status == WaterStatus.None && _kept is null)
            return null;
        if (_kept is not { Time: { } keptAt } kept || state.Time is not { } at || alarmChanged || state.Status != kept.Status || !SameNames(state, kept))
            return _kept = state;
        if (at < keptAt || at - keptAt < Shortest)
            return null;
        return at - keptAt >= Longest || Moved(state, kept) ? _kept = state : null;
    }

    private static bool SameNames(WaterState state, WaterState kept)
    {
        if (state.Values.Count != kept.Values.Count)
            return false;
        var values = (Dictionary<string, WaterValue>)state.Values;
        foreach ((string name, WaterValue value) in values)
        {
            if (!kept.Values.TryGetValue(name, out WaterValue? other) || other.Stale != value.Stale)
                return false;
        }

        return true;
    }

    private static bool Moved(WaterState state, WaterState kept)
    {
        var values = (Dictionary<string, WaterValue>)state.Values;
        foreach ((string name, WaterValue value) in values)
        {
            double before = kept.Values[name].Value;
            double scale = value.U is { } u && u > 0 ? Share * u : ShareWithoutUncertainty * Math.Abs(before);
            if (Math.Abs(value.Value - before) > scale)
                return true;
        }

        return false;
    }
}
