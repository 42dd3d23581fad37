using Microsoft.AspNetCore.Components;
using TankChem.Monitoring.Ports;

namespace TankChem.Dashboard.Live;

/// <summary>A component that shows the live farm: it looks once a second whether something changed and only then renders, and at least every ten seconds so that ages stay true.</summary>
public abstract class FarmView : ComponentBase, IAsyncDisposable
{
    private static readonly TimeSpan Every = TimeSpan.FromSeconds(1);
    private const int RenderAtLeastEvery = 10;

    private readonly CancellationTokenSource leaving = new();
    private Task watching = Task.CompletedTask;

    /// <summary>The live farm.</summary>
    [Inject]
    public required IFarm Farm { get; set; }

    /// <summary>The clock.</summary>
    [Inject]
    public required TimeProvider Clock { get; set; }

    /// <summary>Ends when the component goes away.</summary>
    protected CancellationToken Leaving => leaving.Token;

    /// <inheritdoc/>
    protected override void OnAfterRender(bool firstRender)
    {
        if (firstRender)
            watching = WatchAsync();
    }

    /// <summary>Something changed; called before rendering.</summary>
    protected virtual void OnFarmChanged()
    {
    }

    /// <inheritdoc/>
    public async ValueTask DisposeAsync()
    {
        await leaving.CancelAsync();
        await watching;
        leaving.Dispose();
        GC.SuppressFinalize(this);
    }

    private async Task WatchAsync()
    {
        using var timer = new PeriodicTimer(Every, Clock);
        long seen = Farm.Version;
        int quiet = 0;
        try
        {
            while (await timer.WaitForNextTickAsync(leaving.Token))
            {
                long version = Farm.Version;
                if (version == seen && ++quiet < RenderAtLeastEvery)
                    continue;
                seen = version;
                quiet = 0;
                await InvokeAsync(() =>
                {
                    OnFarmChanged();
                    StateHasChanged();
                });
            }
        }
        catch (OperationCanceledException)
        {
            // The component went away while it waited: there is nothing left to show.
            return;
        }
    }
}
