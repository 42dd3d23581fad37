using Microsoft.AspNetCore.Components;
using Microsoft.JSInterop;
using TankChem.Dashboard.Live;

namespace TankChem.Dashboard.Components.Parts;

/// <summary>Asks who acts; the device remembers the last name.</summary>
public sealed partial class PersonField
{
    /// <summary>The name.</summary>
    [Parameter, EditorRequired]
    public string Value { get; set; } = "";

    /// <summary>Told when the name changes.</summary>
    [Parameter]
    public EventCallback<string> ValueChanged { get; set; }

    /// <summary>What is wrong with it, or null.</summary>
    [Parameter]
    public string? Fault { get; set; }

    /// <summary>The browser.</summary>
    [Inject]
    public required IJSRuntime Browser { get; set; }

    /// <inheritdoc/>
    protected override async Task OnAfterRenderAsync(bool firstRender)
    {
        if (firstRender && Value.Length == 0 && await BrowserMemory.RememberedNameAsync(Browser) is { Length: > 0 } name)
            await ValueChanged.InvokeAsync(name);
    }
}
