namespace TankChem.EndToEnd.Tests;

/// <summary>Looks again and again until something holds, or says what it saw last.</summary>
internal static class Deadline
{
    private static readonly TimeSpan Between = TimeSpan.FromMilliseconds(25);

    /// <summary>The first result that holds.</summary>
    public static async Task<T> UntilAsync<T>(TimeSpan longest, Func<Task<T>> look, Func<T, bool> holds)
    {
        long start = TimeProvider.System.GetTimestamp();
        using var timer = new PeriodicTimer(Between, TimeProvider.System);
        while (true)
        {
            T seen = await look();
            if (holds(seen))
                return seen;
            if (TimeProvider.System.GetElapsedTime(start) > longest)
                throw new TimeoutException($"Not within {longest.TotalSeconds} s; seen last: {seen}");
            await timer.WaitForNextTickAsync();
        }
    }
}
