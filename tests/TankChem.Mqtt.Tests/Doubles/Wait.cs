namespace TankChem.Mqtt.Tests.Doubles;

/// <summary>How long tests wait for what must come.</summary>
internal static class Wait
{
    /// <summary>Long enough for a busy machine; a test that waits this long has failed.</summary>
    public static readonly TimeSpan Long = TimeSpan.FromSeconds(30);
}
