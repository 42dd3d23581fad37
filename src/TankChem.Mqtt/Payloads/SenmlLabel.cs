namespace TankChem.Mqtt.Payloads;

/// <summary>The labels of a SenML record (RFC 8428, table 1), one bit each.</summary>
[Flags]
internal enum SenmlLabel
{
    /// <summary>None of them.</summary>
    Unknown = 0,

    /// <summary>Base name.</summary>
    BaseName = 1,

    /// <summary>Base time.</summary>
    BaseTime = 1 << 1,

    /// <summary>Base unit.</summary>
    BaseUnit = 1 << 2,

    /// <summary>Base value.</summary>
    BaseValue = 1 << 3,

    /// <summary>Base sum.</summary>
    BaseSum = 1 << 4,

    /// <summary>Version.</summary>
    Version = 1 << 5,

    /// <summary>Name.</summary>
    Name = 1 << 6,

    /// <summary>Unit.</summary>
    Unit = 1 << 7,

    /// <summary>Value.</summary>
    Value = 1 << 8,

    /// <summary>Text value.</summary>
    Text = 1 << 9,

    /// <summary>Boolean value.</summary>
    Boolean = 1 << 10,

    /// <summary>Data value.</summary>
    Data = 1 << 11,

    /// <summary>Sum.</summary>
    Sum = 1 << 12,

    /// <summary>Time.</summary>
    Time = 1 << 13,

    /// <summary>Update time.</summary>
    UpdateTime = 1 << 14,

    /// <summary>Every kind of value.</summary>
    AnyValue = Value | Text | Boolean | Data,
}
