using System.Globalization;
using System.Text;

namespace ProbeCal.Station.TableWriting;

/// <summary>The name of a table in the spellings of the languages it is written in.</summary>
internal static class TableNames
{
    /// <summary><c>oxygen_fresh_water</c></summary>
    internal static string Snake(string name)
    {
        return name.Replace('-', '_');
    }

    /// <summary><c>OXYGEN_FRESH_WATER</c></summary>
    internal static string Capitals(string name)
    {
        return Snake(name).ToUpper(CultureInfo.InvariantCulture);
    }

    /// <summary><c>OxygenFreshWater</c></summary>
    internal static string Pascal(string name)
    {
        StringBuilder pascal = new();
        foreach (string word in name.Split('-'))
        {
            pascal.Append(char.ToUpperInvariant(word[0])).Append(word, 1, word.Length - 1);
        }

        return pascal.ToString();
    }
}
