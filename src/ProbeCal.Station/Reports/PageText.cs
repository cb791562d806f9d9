using System.Text;

namespace ProbeCal.Station.Reports;

/// <summary>Foreign text made fit for a page.</summary>
internal static class PageText
{
    /// <summary>
    /// Text for HTML, SVG and XML attributes: the five characters that mean something there written as references, and what
    /// XML forbids or what turns the direction of writing shown by its code, so that a name can neither become markup nor
    /// rearrange the line it stands in.
    /// </summary>
    internal static string Escape(string text)
    {
        StringBuilder page = new(text.Length + 16);
        foreach (Rune rune in Shown(text).EnumerateRunes())
        {
            switch (rune.Value)
            {
                case '&':
                    page.Append("&amp;");
                    break;
                case '<':
                    page.Append("&lt;");
                    break;
                case '>':
                    page.Append("&gt;");
                    break;
                case '"':
                    page.Append("&quot;");
                    break;
                case '\'':
                    page.Append("&#39;");
                    break;
                default:
                    page.Append(rune.ToString());
                    break;
            }
        }

        return page.ToString();
    }

    /// <summary>The text with every character that steers a screen or a page, and every half of a pair, written as <c>[U+202E]</c>; line ends become blanks.</summary>
    internal static string Shown(string text)
    {
        StringBuilder shown = new(text.Length);
        foreach (Rune rune in text.EnumerateRunes())
        {
            bool steers = Rune.IsControl(rune) || rune.Value is 0x2028 or 0x2029 or 0x200E or 0x200F or 0x061C or 0xFEFF or 0xFFFE or 0xFFFF or (>= 0x202A and <= 0x202E) or (>= 0x2066 and <= 0x2069);
            if (rune.Value is '\n' or '\r' or '\t')
            {
                shown.Append(' ');
            }
            else if (steers)
            {
                shown.Append(Code(rune));
            }
            else
            {
                shown.Append(rune.ToString());
            }
        }

        return shown.ToString();
    }

    /// <summary>A character by its code: <c>[U+1F4A7]</c>.</summary>
    internal static string Code(Rune rune)
    {
        return "[U+" + rune.Value.ToString("X4", System.Globalization.CultureInfo.InvariantCulture) + "]";
    }
}
