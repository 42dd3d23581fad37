using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Water;

/// <summary>The newest reading, and the newest usable one, of every series that matters to a place. A late reading never replaces a newer one.</summary>
public sealed class ReadingBook
{
    private readonly Dictionary<PlaceKey, PlaceBook> _places = [];

    /// <summary>Takes a reading.</summary>
    /// <returns>What it changed.</returns>
    public BookChange Take(Reading reading)
    {
        ArgumentNullException.ThrowIfNull(reading);
        if (!_places.TryGetValue(reading.Series.Place, out PlaceBook? place))
            _places.Add(reading.Series.Place, place = new PlaceBook());
        return place.Take(reading);
    }

    /// <summary>What is known of a place; empty when nothing was ever heard of it.</summary>
    internal PlaceBook Of(PlaceKey place)
    {
        if (!_places.TryGetValue(place, out PlaceBook? book))
            _places.Add(place, book = new PlaceBook());
        return book;
    }
}

/// <summary>What a reading changed in the book.</summary>
public enum BookChange
{
    /// <summary>Nothing: it is older than what is known, or the same.</summary>
    None,

    /// <summary>Its series was heard of again, but what is used stays.</summary>
    Heard,

    /// <summary>The value that is used is another.</summary>
    Value,

    /// <summary>A series showed up for the first time.</summary>
    NewSeries,
}

/// <summary>The series of one place, by quantity.</summary>
internal sealed class PlaceBook
{
    private readonly Dictionary<string, QuantityBook> _byQuantity = new(StringComparer.Ordinal);

    /// <summary>All quantities heard of, in the order of their first reading.</summary>
    public List<QuantityBook> Quantities { get; } = [];

    public QuantityBook? Find(string quantity) => _byQuantity.GetValueOrDefault(quantity);

    public BookChange Take(Reading reading)
    {
        if (!_byQuantity.TryGetValue(reading.Series.Quantity, out QuantityBook? quantity))
        {
            quantity = new QuantityBook(reading.Series.Quantity);
            _byQuantity.Add(quantity.Quantity, quantity);
            Quantities.Add(quantity);
        }

        return quantity.Take(reading);
    }
}

/// <summary>The probes of one quantity at one place.</summary>
internal sealed class QuantityBook(string quantity)
{
    public string Quantity { get; } = quantity;

    /// <summary>Its definition, looked up once.</summary>
    public QuantityDefinition Definition { get; } = QuantityCatalog.Get(quantity);

    public List<SeriesBook> Probes { get; } = [];

    public BookChange Take(Reading reading)
    {
        foreach (SeriesBook known in Probes)
        {
            if (known.Probe == reading.Series.Probe)
                return known.Take(reading);
        }

        Probes.Add(new SeriesBook(reading));
        return BookChange.NewSeries;
    }
}

/// <summary>One series: its newest reading, and its newest usable one.</summary>
internal sealed class SeriesBook(Reading first)
{
    public string Probe { get; } = first.Series.Probe;

    public Reading Latest { get; private set; } = first;

    public Reading? Usable { get; private set; } = first.IsUsable ? first : null;

    public BookChange Take(Reading reading)
    {
        BookChange change = BookChange.None;
        if (IsNewer(reading, Latest))
        {
            Latest = reading;
            change = BookChange.Heard;
        }

        if (reading.IsUsable)
        {
            if (Usable is null || IsNewer(reading, Usable))
            {
                Usable = reading;
                change = BookChange.Value;
            }
        }
        else if (Usable is not null && reading.Time == Usable.Time && reading.ReceivedAt >= Usable.ReceivedAt)
        {
            // A correction took the value back; the usable one before it is on disk, not here.
            Usable = null;
            change = BookChange.Value;
        }

        return change;
    }

    // Of two with the same time the one received last counts: it is a correction, or the same derived anew.
    private static bool IsNewer(Reading reading, Reading known) =>
        reading.Time > known.Time || (reading.Time == known.Time && reading.ReceivedAt >= known.ReceivedAt && !reading.Equals(known));
}
