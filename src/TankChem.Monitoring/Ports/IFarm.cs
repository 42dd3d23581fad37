using TankChem.Monitoring.Places;

namespace TankChem.Monitoring.Ports;

/// <summary>The live farm: what every place is now. Reads never wait and never touch the disk.</summary>
public interface IFarm
{
    /// <summary>Whether the whole is an invented demo; every page and message then says so.</summary>
    bool IsDemo { get; }

    /// <summary>All places: tanks, loops, sites, and those not set up yet; worst first.</summary>
    IReadOnlyList<PlaceSnapshot> Places { get; }

    /// <summary>One place, or null when it is not known.</summary>
    PlaceSnapshot? Find(PlaceKey key);

    /// <summary>Grows by one with every change; poll it at most once a second to know whether to look again.</summary>
    long Version { get; }

    /// <summary>The service's own state for people: empty when all is well, otherwise plain sentences (disk full, broker lost, clock).</summary>
    IReadOnlyList<string> ServiceTroubles { get; }

    /// <summary>Messages that could not be read since the start.</summary>
    long UnreadableCount { get; }

    /// <summary>Now, by the service's clock.</summary>
    DateTimeOffset Now { get; }
}
