using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Losses;

/// <summary>When a device was off within the window of a loss review.</summary>
/// <param name="Device">The device.</param>
/// <param name="Off">From when to when; open when it was off until the end.</param>
public sealed record DeviceBand(string Device, IReadOnlyList<(DateTimeOffset From, DateTimeOffset? To)> Off)
{
    /// <summary>The band of one device from its states, oldest first.</summary>
    public static DeviceBand Of(string device, IReadOnlyList<Reading> states, DateTimeOffset end)
    {
        ArgumentNullException.ThrowIfNull(states);
        var off = new List<(DateTimeOffset, DateTimeOffset?)>();
        DateTimeOffset? since = null;
        foreach (Reading state in states)
        {
            if (state.RawValue <= 0)
            {
                since ??= state.Time;
            }
            else if (since is { } from)
            {
                off.Add((from, state.Time));
                since = null;
            }
        }

        if (since is { } open && open < end)
            off.Add((open, null));
        return new DeviceBand(device, off);
    }
}
