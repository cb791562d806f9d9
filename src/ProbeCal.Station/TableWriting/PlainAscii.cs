using System.Text;

namespace ProbeCal.Station.TableWriting;

/// <summary>Text for files that old compilers and spreadsheets read: every character beyond ASCII written by its nearest.</summary>
internal static class PlainAscii
{
    internal static string Of(string text)
    {
        StringBuilder plain = new();
        foreach (char c in text)
        {
            plain.Append(c switch
            {
                '–' or '—' or '−' => "-",
                '°' => "deg",
                'µ' or 'μ' => "u",
                '·' or '×' => "*",
                'ü' => "ue",
                'ö' => "oe",
                'ä' => "ae",
                'á' or 'à' or 'â' => "a",
                'é' or 'è' or 'ê' => "e",
                'ß' => "ss",
                < '\u0080' => c.ToString(),
                _ => "?",
            });
        }

        return plain.Replace("deg C", "degC").ToString();
    }
}
