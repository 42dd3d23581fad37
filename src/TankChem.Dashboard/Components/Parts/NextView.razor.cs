using Microsoft.AspNetCore.Components;
using TankChem.Dashboard.Live;
using TankChem.Monitoring.Advising;
using TankChem.Monitoring.Ports;

namespace TankChem.Dashboard.Components.Parts;

/// <summary>Where the water is going: the room left to the limits, and trends.</summary>
public sealed partial class NextView : IAsyncDisposable
{
    private const int Points = 240;
    private static readonly TimeSpan RefreshEvery = TimeSpan.FromSeconds(30);
    private static readonly (string, TimeSpan)[] Ranges = [("6 h", TimeSpan.FromHours(6)), ("24 h", TimeSpan.FromHours(24)), ("7 d", TimeSpan.FromDays(7)), ("30 d", TimeSpan.FromDays(30))];
    private static readonly string[] Quantities = ["co2", "ph", "nh3-n", "alkalinity", "oxygen-saturation", "oxygen", "temperature", "tan", "nitrite", "gas-pressure", "salinity", "light", "air-co2"];

    private readonly CancellationTokenSource leaving = new();
    private Task refreshing = Task.CompletedTask;
    private TimeSpan range = TimeSpan.FromHours(24);
    private IReadOnlyList<TrendSpec> trends = [];
    private CornerChart? corner;
    private bool loading = true;

    /// <summary>The place.</summary>
    [Parameter, EditorRequired]
    public required PlaceSnapshot Place { get; set; }

    /// <summary>What is on disk.</summary>
    [Inject]
    public required IHistory History { get; set; }

    /// <summary>What can be done.</summary>
    [Inject]
    public required IOperations Operations { get; set; }

    /// <summary>The live farm.</summary>
    [Inject]
    public required IFarm Farm { get; set; }

    /// <summary>The clock.</summary>
    [Inject]
    public required TimeProvider Clock { get; set; }

    /// <inheritdoc/>
    protected override void OnAfterRender(bool firstRender)
    {
        if (firstRender)
            refreshing = RefreshAsync();
    }

    /// <inheritdoc/>
    public async ValueTask DisposeAsync()
    {
        await leaving.CancelAsync();
        await refreshing;
        leaving.Dispose();
    }

    private async Task RefreshAsync()
    {
        using var timer = new PeriodicTimer(RefreshEvery, Clock);
        try
        {
            do
                await InvokeAsync(LoadAsync);
            while (await timer.WaitForNextTickAsync(leaving.Token));
        }
        catch (OperationCanceledException)
        {
            // The view went away while it waited or read.
            return;
        }
    }

    private Task ShowAsync(TimeSpan span)
    {
        range = span;
        return LoadAsync();
    }

    private async Task LoadAsync()
    {
        DateTimeOffset to = Farm.Now, from = to - range;
        TimeSpan asked = range;
        var made = new List<TrendSpec>();
        string[] others = [.. Place.Water.Values.Keys.Where(k => Place.Limits.Any(l => l.Quantity == k) && !Quantities.Contains(k))];
        foreach (string quantity in Quantities.Concat(others))
        {
            IReadOnlyList<TrendBucket> buckets = await History.TrendAsync(Place.Definition.Key, quantity, from, to, Points, leaving.Token);
            if (TrendMaker.Make(Place, quantity, buckets, from, to) is { } trend)
                made.Add(trend);
        }

        IReadOnlyList<StateValue> day = await History.StateValuesAsync(Place.Definition.Key, to - TimeSpan.FromDays(1), to, leaving.Token);
        if (asked != range)
            return;
        corner = CornerChart.Of(Place, day, Operations.Remedies(Place.Definition.Key));
        trends = made;
        loading = false;
        StateHasChanged();
    }
}
