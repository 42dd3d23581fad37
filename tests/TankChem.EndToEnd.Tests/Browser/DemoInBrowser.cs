using System.Collections.Concurrent;
using Microsoft.Playwright;
using TankChem.TestKit;

namespace TankChem.EndToEnd.Tests.Browser;

/// <summary>The demo as a process, and the distribution's Chromium looking at it.</summary>
public sealed class DemoInBrowser : IAsyncLifetime
{
    private static readonly string[] Flags =
        ["--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run", "--disable-background-networking", "--disable-component-update", "--disable-sync"];

    private readonly TemporaryFolder data = new();
    private ServiceProcess? service;
    private IPlaywright? playwright;
    private IBrowser? browser;

    /// <summary>Address of the dashboard.</summary>
    public string Address => $"http://127.0.0.1:{service!.HttpPort}";

    /// <summary>A client of the demo's API.</summary>
    public HttpClient Http => service!.Http;

    /// <summary>Errors that any page wrote to the console, and answers that were errors.</summary>
    public ConcurrentQueue<string> Errors { get; } = new();

    public async ValueTask InitializeAsync()
    {
        service = await ServiceProcess.StartAsync("demo", data.FullName);
        playwright = await Playwright.CreateAsync();
        browser = await playwright.Chromium.LaunchAsync(new BrowserTypeLaunchOptions { ExecutablePath = "/usr/bin/chromium", Args = Flags });
    }

    /// <summary>A page of its own, as wide as a desk's screen or a phone's.</summary>
    public async Task<IPage> OpenAsync(string path, bool phone = false)
    {
        IBrowserContext context = await browser!.NewContextAsync(new BrowserNewContextOptions { ViewportSize = phone ? new ViewportSize { Width = 390, Height = 844 } : new ViewportSize { Width = 1280, Height = 900 } });
        IPage page = await context.NewPageAsync();
        page.Console += (_, message) =>
        {
            if (message.Type == "error")
                Errors.Enqueue($"{path}: {message.Text}");
        };
        page.PageError += (_, error) => Errors.Enqueue($"{path}: {error}");
        await page.GotoAsync(Address + path, new PageGotoOptions { WaitUntil = WaitUntilState.Load });

        // The page is drawn before it listens; it says when it does.
        await page.WaitForSelectorAsync("main[data-live=yes]");
        return page;
    }

    public async ValueTask DisposeAsync()
    {
        if (browser is not null)
            await browser.CloseAsync();
        playwright?.Dispose();
        if (service is not null)
            await service.DisposeAsync();
        data.Dispose();
    }
}
