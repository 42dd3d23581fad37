using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Bodies;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;

namespace TankChem.Service.Http;

/// <summary>Alarms and what people do to them.</summary>
internal static class AlarmEndpoints
{
    private static readonly string[] States = ["active", "unacknowledged", "all"];

    public static IResult List(string? state, IFarm farm)
    {
        if (state is not null && Array.IndexOf(States, state) < 0 && !AlarmBody.StateNames.Contains(state, StringComparer.Ordinal))
            return Problem.BadRequest($"state: \"{state}\" is not known; right would be {string.Join(", ", States)}, or one of {string.Join(", ", AlarmBody.StateNames)}.");
        AlarmView[] alarms = [.. farm.Places.SelectMany(p => p.Alarms).Where(a => Matches(a, state)).OrderByDescending(a => a.Priority).ThenByDescending(a => a.State.RaisedAt)];
        return new JsonBody(w =>
        {
            w.WriteStartArray();
            foreach (AlarmView alarm in alarms)
                AlarmBody.Write(w, alarm, farm.IsDemo);
            w.WriteEndArray();
        });
    }

    public static async Task<IResult> CommandAsync(string site, string place, string rule, HttpRequest request, IFarm farm, IOperations operations, CancellationToken cancellationToken)
    {
        var key = new AlarmKey(new PlaceKey(site, place), rule);
        if (farm.Find(key.Place) is null)
            return Problem.NotFound($"There is no place {key.Place}.");
        if (await BodyReader.ReadAsync(request, cancellationToken) is not { } body)
            return Problem.Of(StatusCodes.Status413PayloadTooLarge, "Too long", "The body is longer than 64 KiB.");
        if (!AlarmCommandBody.TryParse(body, key, out AlarmCommand? command, out string? fault))
            return Problem.BadRequest(fault!);
        OperationResult result = await operations.CommandAlarmAsync(command!, cancellationToken);
        if (!result.Done)
            return Problem.Refused(result.Fault!);
        AlarmView? now = farm.Find(key.Place)?.Alarms.FirstOrDefault(a => a.Key == key);
        return now is null ? Results.NoContent() : new JsonBody(w => AlarmBody.Write(w, now, farm.IsDemo));
    }

    private static bool Matches(AlarmView alarm, string? state) => state switch
    {
        null or "all" => true,
        "active" => alarm.IsActive,
        "unacknowledged" => alarm.NeedsAcknowledgement,
        _ => AlarmBody.StateName(alarm.State) == state,
    };
}
