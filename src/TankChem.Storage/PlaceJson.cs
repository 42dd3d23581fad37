using System.Text.Json;
using System.Text.Json.Serialization;

namespace TankChem.Storage;

/// <summary>How a place's set-up stands in the store: enumerations by name, so that renumbering the code changes nothing; stores of before this rule have numbers and are read too.</summary>
internal static class PlaceJson
{
    public static JsonSerializerOptions Options { get; } = new() { Converters = { new JsonStringEnumConverter(JsonNamingPolicy.KebabCaseLower) } };
}
