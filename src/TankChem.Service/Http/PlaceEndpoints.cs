using System.Text.Json;
using TankChem.Dosing;
using TankChem.Monitoring.Bodies;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Ports;

namespace TankChem.Service.Http;

/// <summary>Places, their water, dose plans.</summary>
internal static class PlaceEndpoints
{
    public static IResult Places(IFarm farm)
    {
        IReadOnlyList<PlaceSnapshot> places = farm.Places;
        return new JsonBody(w =>
        {
            w.WriteStartArray();
            foreach (PlaceSnapshot place in places)
                Write(w, place, farm);
            w.WriteEndArray();
        });
    }

    public static IResult Water(string site, string place, IFarm farm)
    {
        var key = new PlaceKey(site, place);
        return farm.Find(key) is { } snapshot
            ? new JsonBody(w => WaterBody.Write(w, snapshot.Water, farm.IsDemo))
            : Problem.NotFound($"There is no place {key}.");
    }

    public static async Task<IResult> DosePlanAsync(string site, string place, HttpRequest request, IFarm farm, IOperations operations, CancellationToken cancellationToken)
    {
        var key = new PlaceKey(site, place);
        if (farm.Find(key) is null)
            return Problem.NotFound($"There is no place {key}.");
        if (await BodyReader.ReadAsync(request, cancellationToken) is not { } body)
            return Problem.Of(StatusCodes.Status413PayloadTooLarge, "Too long", "The body is longer than 64 KiB.");
        if (!DosePlanBody.TryParse(body, out DoseTarget? target, out IReadOnlyList<string> reagents, out string? fault))
            return Problem.BadRequest(fault!);
        DosePlan plan = operations.PlanDose(key, target!, reagents);
        return new JsonBody(w => DosePlanBody.Write(w, plan, farm.Now, farm.IsDemo));
    }

    private static void Write(Utf8JsonWriter w, PlaceSnapshot place, IFarm farm)
    {
        w.WriteStartObject();
        w.WriteString("site", place.Definition.Key.Site);
        w.WriteString("id", place.Definition.Key.Place);
        w.WriteString("kind", PlaceKindNames.Of(place.Definition.Kind));
        w.WriteString("name", place.Definition.Name);
        w.WriteBoolean("assigned", place.Definition.Assigned);
        w.WriteString("sentence", place.Sentence);
        w.WritePropertyName("worstAlarm");
        if (place.Alarms.FirstOrDefault(a => a.IsActive || a.NeedsAcknowledgement) is { } worst)
            AlarmBody.Write(w, worst, farm.IsDemo);
        else
            w.WriteNullValue();
        w.WritePropertyName("water");
        WaterBody.Write(w, place.Water, farm.IsDemo);
        w.WriteEndObject();
    }
}
