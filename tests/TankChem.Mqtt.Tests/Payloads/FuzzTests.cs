using CsCheck;
using TankChem.Monitoring.Readings;

namespace TankChem.Mqtt.Tests.Payloads;

public sealed class FuzzTests
{
    private const int Rounds = 50_000;

    private static readonly string[] Topics =
    [
        "tankchem/in/s/p/ph", "tankchem/in/s/p", "tankchem/in/s/p/state/pump", "tankchem/in/s/p/tan/x", "tankchem/cmd/s/p/alarm/r", "tankchem/out/s/p/water", "a/b",
    ];

    private static readonly string[] Pieces =
    [
        "{", "}", "[", "]", ",", ":", "\"", "value", "unit", "time", "\"value\":", "\"n\":\"ph\"", "\"v\":7.2", "\"bt\":", "\"bver\":", "\"x_\":1", "7.2", "-", "1e309", "null", "true", "NaN", " ", "\n",
        "\\u", "\\ud800", "\ufeff", "é", "\0", "2026-05-01T10:00:00Z", "\"t\":1777629600", "[[[[[[[[[[[[[[[[[[[",
    ];

    /// <summary>Pieces of payloads in any order, some bytes of them replaced: closer to what breaks a reader than noise is.</summary>
    private static readonly Gen<byte[]> Payload =
        from pieces in OneOf(Pieces).Array[0, 12]
        from noise in Gen.Byte.Array[0, 3]
        from at in Gen.Int[0, 200]
        select Mix(pieces, noise, at);

    private static readonly Gen<string> Topic = Gen.Frequency(
        (5, OneOf(Topics)),
        (3, from start in OneOf(Topics) from end in Gen.String[0, 20] select start + end),
        (2, Gen.String[0, 400]));

    [Fact]
    public void Read_AnyTopicAndPayload_GivesReadingsOrAReason() =>
        Gen.Select(Topic, Payload).Sample(
            (topic, payload) =>
            {
                Arrival arrival = PayloadCase.Read(topic, payload);
                bool isFinite = arrival.Readings.All(r => double.IsFinite(r.RawValue));
                return isFinite && (arrival.Unreadable is { } unreadable
                    ? unreadable.Reason.Length is > 0 and < 2_000 && unreadable.Topic.Length <= 512 && unreadable.Head.Length <= 4096
                    : arrival.Readings.Count > 0);
            },
            iter: Rounds);

    private static Gen<string> OneOf(string[] choices) => Gen.Int[0, choices.Length - 1].Select(i => choices[i]);

    private static byte[] Mix(string[] pieces, byte[] noise, int at)
    {
        byte[] bytes = System.Text.Encoding.UTF8.GetBytes(string.Concat(pieces));
        for (int i = 0; i < noise.Length && bytes.Length > 0; i++)
            bytes[(at + i * 7) % bytes.Length] = noise[i];
        return bytes;
    }
}
