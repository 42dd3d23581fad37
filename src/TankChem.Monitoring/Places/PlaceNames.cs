namespace TankChem.Monitoring.Places;

/// <summary>Ids of sites, places, probes and quantities.</summary>
public static class PlaceNames
{
    /// <summary>Longest id.</summary>
    public const int LengthMax = 64;

    /// <summary>Whether a text is 1 to 64 of <c>a-z 0-9 - _</c>.</summary>
    public static bool IsValidId(ReadOnlySpan<char> text)
    {
        if (text.Length is 0 or > LengthMax)
            return false;
        foreach (char c in text)
        {
            if (c is not ((>= 'a' and <= 'z') or (>= '0' and <= '9') or '-' or '_'))
                return false;
        }

        return true;
    }
}
