using Microsoft.AspNetCore.Components;
using Microsoft.JSInterop;
using TankChem.Dashboard.Live;

namespace TankChem.Dashboard.Components.Parts;

/// <summary>One trend. The only place that knows the chart library.</summary>
public sealed partial class TrendChart : IAsyncDisposable
{
    private ElementReference element;
    private IJSObjectReference? module;
    private TrendSpec? drawn;

    /// <summary>What to draw.</summary>
    [Parameter, EditorRequired]
    public required TrendSpec Spec { get; set; }

    /// <summary>The browser.</summary>
    [Inject]
    public required IJSRuntime Browser { get; set; }

    /// <inheritdoc/>
    protected override async Task OnAfterRenderAsync(bool firstRender)
    {
        if (ReferenceEquals(drawn, Spec))
            return;
        drawn = Spec;
        try
        {
            module ??= await Browser.InvokeAsync<IJSObjectReference>("import", "./_content/TankChem.Dashboard/Components/Parts/TrendChart.razor.js");
            await module.InvokeVoidAsync("draw", element, Spec);
        }
        catch (Exception e) when (e is JSDisconnectedException or OperationCanceledException)
        {
            // The page is gone; nobody looks at the chart.
            drawn = null;
        }
    }

    /// <inheritdoc/>
    public async ValueTask DisposeAsync()
    {
        if (module is null)
            return;
        try
        {
            await module.InvokeVoidAsync("remove", element);
            await module.DisposeAsync();
        }
        catch (Exception e) when (e is JSDisconnectedException or OperationCanceledException)
        {
            // The page is gone, and the chart with it.
            module = null;
        }
    }
}
