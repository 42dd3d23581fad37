namespace TankChem.Mqtt.Outside;

/// <summary>How it stands with the outside broker.</summary>
/// <param name="IsConnected">Whether it is connected.</param>
/// <param name="Since">Since when.</param>
/// <param name="Reason">Why it is not connected; empty when it is.</param>
public sealed record ConnectionState(bool IsConnected, DateTimeOffset Since, string Reason);
