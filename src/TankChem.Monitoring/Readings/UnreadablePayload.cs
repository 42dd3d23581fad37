namespace TankChem.Monitoring.Readings;

/// <summary>A message that could not be read, kept with its reason.</summary>
/// <param name="Topic">Its topic, at most 512 characters, unprintable ones escaped.</param>
/// <param name="ReceivedAt">When it came.</param>
/// <param name="Length">Its payload's length, bytes.</param>
/// <param name="Head">The first 4 KiB of its payload.</param>
/// <param name="Reason">What is wrong, where, and what would be right.</param>
/// <param name="Client">The client that sent it; null when not known.</param>
public sealed record UnreadablePayload(string Topic, DateTimeOffset ReceivedAt, long Length, ReadOnlyMemory<byte> Head, string Reason, string? Client);
