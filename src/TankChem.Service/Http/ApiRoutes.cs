using TankChem.Monitoring.Ports;

namespace TankChem.Service.Http;

/// <summary>All routes of docs/api.md.</summary>
internal static class ApiRoutes
{
    public static void MapTankChemApi(this IEndpointRouteBuilder routes)
    {
        RouteGroupBuilder api = routes.MapGroup("/api/v1");
        api.MapGet("/places", PlaceEndpoints.Places)
            .WithSummary("Every place with its worst alarm and latest water state").WithTags("places").Produces<PlaceSchema[]>();
        api.MapGet("/places/{site}/{place}/water", PlaceEndpoints.Water)
            .WithSummary("Latest water state").WithTags("places").Produces<WaterSchema>().ProducesProblem(StatusCodes.Status404NotFound);
        api.MapGet("/places/{site}/{place}/trend", HistoryEndpoints.TrendAsync)
            .WithSummary("Minimum, mean and maximum of a quantity per bucket").WithTags("history").Produces<TrendSchema>().ProducesProblem(StatusCodes.Status400BadRequest).ProducesProblem(StatusCodes.Status404NotFound);
        api.MapGet("/places/{site}/{place}/readings", HistoryEndpoints.ReadingsAsync)
            .WithSummary("Raw readings with their quality flag, paged").WithTags("history").Produces<ReadingsSchema>().ProducesProblem(StatusCodes.Status400BadRequest).ProducesProblem(StatusCodes.Status404NotFound);
        api.MapPost("/places/{site}/{place}/dose-plan", PlaceEndpoints.DosePlanAsync)
            .WithSummary("A dose plan for a target, or its refusal with the grounds").WithTags("dosing").Accepts<DosePlanRequestSchema>("application/json").Produces<DosePlanSchema>().ProducesProblem(StatusCodes.Status400BadRequest).ProducesProblem(StatusCodes.Status404NotFound);
        api.MapGet("/alarms", AlarmEndpoints.List)
            .WithSummary("Alarms, worst first").WithTags("alarms").Produces<AlarmSchema[]>().ProducesProblem(StatusCodes.Status400BadRequest);
        api.MapPost("/alarms/{site}/{place}/{rule}", AlarmEndpoints.CommandAsync)
            .WithSummary("Acknowledge, shelve, unshelve, take out of service, return to service, reset").WithTags("alarms").Accepts<AlarmCommandSchema>("application/json").Produces<AlarmSchema>().ProducesProblem(StatusCodes.Status400BadRequest).ProducesProblem(StatusCodes.Status404NotFound).ProducesProblem(StatusCodes.Status409Conflict);
        routes.MapGet("/health/live", () => Results.Json(new HealthSchema("live", [])))
            .WithSummary("The process answers").WithTags("health").Produces<HealthSchema>();
        routes.MapGet("/health/ready", Ready)
            .WithSummary("Store, broker and writer work").WithTags("health").Produces<HealthSchema>().Produces<HealthSchema>(StatusCodes.Status503ServiceUnavailable);
    }

    private static IResult Ready(IFarm farm) =>
        farm.ServiceTroubles is { Count: > 0 } troubles
            ? Results.Json(new HealthSchema("not ready", troubles), statusCode: StatusCodes.Status503ServiceUnavailable)
            : Results.Json(new HealthSchema("ready", []));
}
