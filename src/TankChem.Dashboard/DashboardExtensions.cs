using Microsoft.AspNetCore.Builder;
using Microsoft.AspNetCore.Routing;
using Microsoft.Extensions.DependencyInjection;
using TankChem.Dashboard.Components;

namespace TankChem.Dashboard;

/// <summary>Puts the dashboard into a host.</summary>
public static class DashboardExtensions
{
    /// <summary>Adds what the pages need. The host adds IFarm, IHistory, IOperations and TimeProvider.</summary>
    public static IServiceCollection AddTankChemDashboard(this IServiceCollection services)
    {
        services.AddRazorComponents().AddInteractiveServerComponents();
        return services;
    }

    /// <summary>Maps the pages and their files; the host must use antiforgery.</summary>
    public static void MapTankChemDashboard(this IEndpointRouteBuilder routes)
    {
        routes.MapStaticAssets();
        routes.MapRazorComponents<App>().AddInteractiveServerRenderMode();
    }
}
