namespace TankChem.Service.Http;

/// <summary>Errors as <c>application/problem+json</c> (RFC 9457): what is wrong, where, and what would be right.</summary>
internal static class Problem
{
    public static IResult NotFound(string detail) => Of(StatusCodes.Status404NotFound, "Not found", detail);

    public static IResult BadRequest(string detail) => Of(StatusCodes.Status400BadRequest, "The request cannot be read", detail);

    public static IResult Refused(string detail) => Of(StatusCodes.Status409Conflict, "Refused", detail);

    public static IResult Of(int status, string title, string detail) => Results.Problem(detail: detail, statusCode: status, title: title);
}
