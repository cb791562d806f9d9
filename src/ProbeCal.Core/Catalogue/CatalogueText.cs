using System.Collections.Generic;
using System.Globalization;

namespace ProbeCal;

/// <summary>Numbers and names as text, the same in every culture.</summary>
internal static class CatalogueText
{
    internal static string Number(double value)
    {
        return value.ToString("R", CultureInfo.InvariantCulture);
    }

    internal static bool Same(string one, string other)
    {
        return string.Equals(one, other, System.StringComparison.OrdinalIgnoreCase);
    }

    internal static bool IsOneOf(string text, IReadOnlyList<string> names)
    {
        foreach (string name in names)
        {
            if (Same(text, name)) { return true; }
        }

        return false;
    }
}
