using TankChem.Monitoring.Places;

namespace TankChem.Monitoring.Configuration;

/// <summary>The whole configuration file, valid.</summary>
public sealed record ServiceConfiguration
{
    /// <summary>Sites with their loops and tanks.</summary>
    public IReadOnlyList<SiteDefinition> Sites { get; init; } = [];

    /// <summary>The embedded broker; null when switched off.</summary>
    public EmbeddedBrokerOptions? EmbeddedBroker { get; init; } = new();

    /// <summary>An outside broker to join as a client; null when there is none.</summary>
    public OutsideBrokerOptions? OutsideBroker { get; init; }

    /// <summary>Mappings of other topics and payloads.</summary>
    public IReadOnlyList<TopicMapping> Mappings { get; init; } = [];

    /// <summary>Where the dashboard and the HTTP API listen; loopback only.</summary>
    public string HttpUrl { get; init; } = "http://127.0.0.1:5080";

    /// <summary>File name of the SQLite store, relative to the data folder or absolute.</summary>
    public string SqliteFile { get; init; } = "tankchem.db";
}

/// <summary>The embedded broker.</summary>
public sealed record EmbeddedBrokerOptions
{
    /// <summary>TCP port.</summary>
    public int Port { get; init; } = 1883;

    /// <summary>Address to listen on; loopback only.</summary>
    public string Bind { get; init; } = "127.0.0.1";
}

/// <summary>An outside broker.</summary>
public sealed record OutsideBrokerOptions
{
    /// <summary>Host name or address.</summary>
    public required string Host { get; init; }

    /// <summary>TCP port.</summary>
    public int Port { get; init; } = 1883;

    /// <summary>Client id; stays the same, so that the broker keeps the session.</summary>
    public string ClientId { get; init; } = "tankchem";

    /// <summary>User name; null for none.</summary>
    public string? User { get; init; }

    /// <summary>Password; null for none.</summary>
    public string? Password { get; init; }

    /// <summary>Whether to use TLS.</summary>
    public bool Tls { get; init; }
}

/// <summary>Takes readings from a topic and a JSON payload of another form.</summary>
public sealed record TopicMapping
{
    /// <summary>MQTT topic filter, <c>+</c> and <c>#</c> allowed.</summary>
    public required string Topic { get; init; }

    /// <summary>Series the value goes to.</summary>
    public required Readings.SeriesKey Series { get; init; }

    /// <summary>JSON Pointer (RFC 6901) of the value; empty for the whole payload.</summary>
    public string Value { get; init; } = "";

    /// <summary>JSON Pointer of the time; null for the time of receipt.</summary>
    public string? Time { get; init; }

    /// <summary>Unit of the value after factor and offset; null for a bare number.</summary>
    public string? Unit { get; init; }

    /// <summary>value · factor + offset.</summary>
    public double Factor { get; init; } = 1;

    /// <summary>value · factor + offset.</summary>
    public double Offset { get; init; }
}
