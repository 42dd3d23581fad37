using System.Globalization;
using System.Text;
using System.Text.Json;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;
using TankChem.Mqtt.Topics;

namespace TankChem.Mqtt.Payloads;

/// <summary>Reads a SenML JSON pack (RFC 8428). A fault of the form rejects the pack; a record that cannot be taken leaves the others alone.</summary>
internal ref struct SenmlPack
{
    /// <summary>The newest version of the format that is understood (RFC 8428, section 4.4).</summary>
    private const double VersionMax = 10;

    /// <summary>Times below it are relative to now (RFC 8428, section 4.5.3).</summary>
    private const double FirstAbsoluteTime = 268_435_456;

    private readonly PlaceKey place;
    private readonly DateTimeOffset receivedAt;
    private readonly bool nowIsKnown;
    private readonly List<ParsedReading> readings = [];
    private Utf8JsonReader reader;

    private string baseName = "";
    private string? baseUnit;
    private double baseTime;
    private double baseValue;
    private SenmlRecord record;
    private SeriesKey last;
    private string? lastName;
    private int number;
    private int refusedCount;
    private string? firstRefusal;

    private SenmlPack(ReadOnlySpan<byte> utf8, PlaceKey place, DateTimeOffset receivedAt, bool nowIsKnown)
    {
        this.place = place;
        this.receivedAt = receivedAt;
        this.nowIsKnown = nowIsKnown;
        reader = new Utf8JsonReader(utf8, JsonNames.Options);
    }

    /// <summary>Reads a pack; throws <see cref="JsonException"/> where it is no JSON.</summary>
    /// <param name="utf8">The payload.</param>
    /// <param name="place">Whose readings they are.</param>
    /// <param name="receivedAt">What relative times count from.</param>
    /// <param name="nowIsKnown">False when the message waited for an unknown time on its way: its relative times then say nothing.</param>
    /// <param name="readings">What could be taken.</param>
    /// <returns>What could not be taken, or null.</returns>
    public static string? Read(ReadOnlySpan<byte> utf8, PlaceKey place, DateTimeOffset receivedAt, bool nowIsKnown, out List<ParsedReading> readings)
    {
        var pack = new SenmlPack(utf8, place, receivedAt, nowIsKnown);
        string? fault = pack.ReadRecords();
        readings = fault is null ? pack.readings : [];
        return fault ?? pack.Refusals();
    }

    private string? ReadRecords()
    {
        reader.Read();
        while (reader.Read() && reader.TokenType != JsonTokenType.EndArray)
        {
            number++;
            if (reader.TokenType != JsonTokenType.StartObject)
                return $"payload: record {number} is {JsonReading.Kind(reader.TokenType)}; a SenML record, an object, would be right.";
            record = default;
            if (ReadRecord() is { } fault)
                return $"payload: record {number}: {fault}";
            if (Take() is { } refusal)
            {
                refusedCount++;
                firstRefusal ??= $"record {number}: {refusal}";
            }
        }

        // Anything behind the closing bracket makes the reader throw.
        reader.Read();
        return number == 0 ? "payload: the pack has no record." : null;
    }

    private readonly string? Refusals() => refusedCount switch
    {
        0 => null,
        1 => $"payload: {firstRefusal}; {readings.Count} of {number} records taken.",
        _ => $"payload: {firstRefusal}, and {refusedCount - 1} more; {readings.Count} of {number} records taken.",
    };

    private string? ReadRecord()
    {
        var seen = SenmlLabel.Unknown;
        var names = default(JsonNames);
        while (reader.Read() && reader.TokenType == JsonTokenType.PropertyName)
        {
            SenmlLabel label = LabelOf(reader.ValueIsEscaped ? Encoding.UTF8.GetBytes(reader.GetString()!) : reader.ValueSpan);
            if (label == SenmlLabel.Unknown)
            {
                if (reader.GetString()!.EndsWith('_'))
                    return $"the field \"{TopicText.Shown(reader.GetString())}\" must be understood and is not (RFC 8428, section 4.4).";
                if (names.SkipUnknown(ref reader) is { } fault)
                    return fault["payload: ".Length..];
                continue;
            }

            if (seen.HasFlag(label))
                return $"the field \"{TopicText.Shown(reader.GetString())}\" stands twice; once would be right.";
            seen |= label;
            if (ReadField(label) is { } wrong)
                return wrong;
        }

        record.Has = seen;
        return null;
    }

    private string? ReadField(SenmlLabel label)
    {
        switch (label)
        {
            case SenmlLabel.BaseName:
                return ReadText("bn", out baseName);
            case SenmlLabel.Name:
                return ReadText("n", out record.Name);
            case SenmlLabel.Text:
                return ReadText("vs", out record.Text);
            case SenmlLabel.Data:
                return ReadText("vd", out _);
            case SenmlLabel.BaseUnit:
                return JsonReading.ReadUnit(ref reader, out baseUnit);
            case SenmlLabel.Unit:
                return JsonReading.ReadUnit(ref reader, out record.Unit);
            case SenmlLabel.BaseTime:
                return ReadNumber("bt", out baseTime);
            case SenmlLabel.Time:
                return ReadNumber("t", out record.Time);
            case SenmlLabel.UpdateTime:
                return ReadNumber("ut", out _);
            case SenmlLabel.BaseValue:
                return ReadNumber("bv", out baseValue);
            case SenmlLabel.Value:
                return ReadNumber("v", out record.Value);
            case SenmlLabel.BaseSum:
                return ReadNumber("bs", out _);
            case SenmlLabel.Sum:
                return ReadNumber("s", out _);
            case SenmlLabel.Version:
                return ReadVersion();
            default:
                reader.Read();
                record.Boolean = reader.TokenType == JsonTokenType.True;
                return reader.TokenType is JsonTokenType.True or JsonTokenType.False ? null : $"vb is {JsonReading.Kind(reader.TokenType)}; true or false would be right.";
        }
    }

    private string? ReadVersion()
    {
        string? fault = ReadNumber("bver", out double version);
        if (fault is null && (version < 1 || version != Math.Floor(version)))
            fault = $"bver is {version.ToString("R", CultureInfo.InvariantCulture)}; a whole number up to {VersionMax} would be right.";
        if (fault is null && version > VersionMax)
            fault = $"bver is {version.ToString("R", CultureInfo.InvariantCulture)}, a version newer than this service understands; up to {VersionMax} would be right.";
        return fault;
    }

    private string? ReadText(string label, out string text)
    {
        reader.Read();
        bool isText = reader.TokenType == JsonTokenType.String;
        text = isText ? reader.GetString()! : "";
        return isText ? null : $"{label} is {JsonReading.Kind(reader.TokenType)}; a text would be right.";
    }

    private string? ReadNumber(string label, out double value)
    {
        value = 0;
        reader.Read();
        if (reader.TokenType != JsonTokenType.Number)
            return $"{label} is {JsonReading.Kind(reader.TokenType)}; a number without quotes would be right.";
        value = reader.GetDouble();
        return double.IsFinite(value) ? null : $"{label} is larger than any number here can be.";
    }

    /// <summary>Turns the record, with what the base fields say, into a reading.</summary>
    /// <returns>Why it cannot be taken, or null.</returns>
    private string? Take()
    {
        if ((record.Has & (SenmlLabel.AnyValue | SenmlLabel.Sum)) == SenmlLabel.Unknown)
            return !record.Has.HasFlag(SenmlLabel.Name) ? null : "has a name but no value; v would be right.";
        string name = record.Name is null ? baseName : baseName.Length == 0 ? record.Name : baseName + record.Name;
        if (name != lastName)
        {
            if (SeriesOf(name, out SeriesKey series) is { } wrongName)
                return wrongName;
            last = series;
            lastName = name;
        }

        if (ValueOf(last, out double value) is { } wrongValue)
            return wrongValue;
        if (TimeOf(out DateTimeOffset? time) is { } wrongTime)
            return wrongTime;
        readings.Add(new ParsedReading(last, value, record.Unit ?? baseUnit, time));
        return null;
    }

    private readonly string? SeriesOf(string name, out SeriesKey series)
    {
        int slash = name.IndexOf('/', StringComparison.Ordinal);
        string quantity = slash < 0 ? name : name[..slash];
        string probe = slash < 0 ? SeriesKey.MainProbe : name[(slash + 1)..];
        series = new SeriesKey(place, quantity, probe);
        string? fault = TopicText.IdFault(quantity) ?? TopicText.IdFault(probe);
        if (fault is not null)
            return $"the name (bn and n) \"{TopicText.Shown(name)}\" is no <quantity> or <quantity>/<probe>: a part {fault}";
        return quantity == SeriesKey.DeviceState && slash < 0 ? "the name \"state\" names no device; state/<device> would be right" : null;
    }

    private readonly string? ValueOf(SeriesKey series, out double value)
    {
        value = 0;
        bool isState = series.Quantity == SeriesKey.DeviceState;
        switch (record.Has & SenmlLabel.AnyValue)
        {
            case SenmlLabel.Value when !isState:
                value = baseValue + record.Value;
                return double.IsFinite(value) ? null : "bv + v is larger than any number here can be";
            case SenmlLabel.Boolean when isState || series.Quantity == "injection-on":
                value = record.Boolean ? 1 : 0;
                return null;
            case SenmlLabel.Text when isState && record.Text is "on" or "off":
                value = record.Text == "on" ? 1 : 0;
                return null;
            case SenmlLabel.Unknown:
                return "has only a sum (s), which is not taken; v would be right";
            case SenmlLabel.Value or SenmlLabel.Boolean or SenmlLabel.Text or SenmlLabel.Data:
                return isState ? "a device's state takes vb, or vs with \"on\" or \"off\"" : $"{series.Quantity} takes a number, v";
            default:
                return "has more than one value; one of v, vb, vs, vd would be right";
        }
    }

    private readonly string? TimeOf(out DateTimeOffset? time)
    {
        time = null;
        double seconds = baseTime + record.Time;
        if (seconds == 0)
            return null;
        if (seconds < FirstAbsoluteTime)
        {
            if (!nowIsKnown)
                return null;
            double ms = Math.Round(seconds * 1000);
            double earliest = (DateTimeOffset.UnixEpoch - receivedAt).TotalMilliseconds;
            if (ms < earliest)
                return "bt + t is relative to now and goes back to before 1970";
            time = receivedAt.AddMilliseconds(ms);
            return null;
        }

        if (!TimeText.TryUnix(seconds, out DateTimeOffset absolute, out string? fault))
            return $"bt + t: {fault}";
        time = absolute;
        return null;
    }

    private static SenmlLabel LabelOf(ReadOnlySpan<byte> name) => name switch
    {
        [(byte)'n'] => SenmlLabel.Name,
        [(byte)'v'] => SenmlLabel.Value,
        [(byte)'u'] => SenmlLabel.Unit,
        [(byte)'t'] => SenmlLabel.Time,
        [(byte)'s'] => SenmlLabel.Sum,
        [(byte)'v', (byte)'b'] => SenmlLabel.Boolean,
        [(byte)'v', (byte)'s'] => SenmlLabel.Text,
        [(byte)'v', (byte)'d'] => SenmlLabel.Data,
        [(byte)'u', (byte)'t'] => SenmlLabel.UpdateTime,
        [(byte)'b', (byte)'n'] => SenmlLabel.BaseName,
        [(byte)'b', (byte)'t'] => SenmlLabel.BaseTime,
        [(byte)'b', (byte)'u'] => SenmlLabel.BaseUnit,
        [(byte)'b', (byte)'v'] => SenmlLabel.BaseValue,
        [(byte)'b', (byte)'s'] => SenmlLabel.BaseSum,
        [(byte)'b', (byte)'v', (byte)'e', (byte)'r'] => SenmlLabel.Version,
        _ => SenmlLabel.Unknown,
    };

    private struct SenmlRecord
    {
        public SenmlLabel Has;
        public string? Name;
        public string? Unit;
        public string Text;
        public double Value;
        public double Time;
        public bool Boolean;
    }
}
