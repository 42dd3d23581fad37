using System.Text;

namespace TankChem.Storage.Model;

/// <summary>Names of columns from names of properties: <c>TimeMs</c> is <c>time_ms</c>.</summary>
internal static class SnakeCase
{
    public static string Of(string name)
    {
        var text = new StringBuilder(name.Length + 8);
        for (int i = 0; i < name.Length; i++)
        {
            if (i > 0 && char.IsUpper(name[i]))
                text.Append('_');
            text.Append(char.ToLowerInvariant(name[i]));
        }

        return text.ToString();
    }
}
