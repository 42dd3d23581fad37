using Microsoft.JSInterop;

namespace TankChem.Dashboard.Live;

/// <summary>What the browser keeps for us.</summary>
internal static class BrowserMemory
{
    private const string Module = "./_content/TankChem.Dashboard/tankchem.js";

    /// <summary>The name that was typed last on this device; empty when there is none.</summary>
    public static async Task<string> RememberedNameAsync(IJSRuntime browser) => await CallAsync<string>(browser, "rememberedName") ?? "";

    /// <summary>Keeps a name.</summary>
    public static Task RememberNameAsync(IJSRuntime browser, string name) => CallAsync<object>(browser, "rememberName", name);

    /// <summary>Opens the print dialogue.</summary>
    public static Task PrintAsync(IJSRuntime browser) => CallAsync<object>(browser, "printPage");

    private static async Task<T?> CallAsync<T>(IJSRuntime browser, string function, params object[] arguments)
    {
        try
        {
            await using IJSObjectReference module = await browser.InvokeAsync<IJSObjectReference>("import", Module);
            return await module.InvokeAsync<T>(function, arguments);
        }
        catch (Exception e) when (e is JSDisconnectedException or OperationCanceledException)
        {
            // The page is gone; nobody waits for the answer.
            return default;
        }
    }
}
