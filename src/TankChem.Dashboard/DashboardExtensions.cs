using Microsoft.AspNetCore.Routing;
using Microsoft.Extensions.DependencyInjection;

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

    /// <summary>Maps the pages.</summary>
    public static void MapTankChemDashboard(this IEndpointRouteBuilder routes)
    {
    }
}
