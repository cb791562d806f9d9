using System.Text;

namespace ProbeCal.Station.WholeFiles;

/// <summary>
/// Text of a file that is handed on byte for byte: read as ISO 8859-1, one character a byte, so that nothing is lost
/// whatever its encoding is; decoded only where somebody reads it.
/// </summary>
internal static class TableText
{
    private static readonly UTF8Encoding Strict = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    /// <summary>True when the bytes are UTF-8, as plain ASCII is too.</summary>
    internal static bool IsUtf8(string bytes)
    {
        if (Ascii.IsValid(bytes))
        {
            return true;
        }

        try
        {
            Strict.GetCharCount(Encoding.Latin1.GetBytes(bytes));
            return true;
        }
        catch (DecoderFallbackException)
        {
            return false;
        }
    }

    /// <summary>What a person reads: UTF-8, or else ISO 8859-1.</summary>
    internal static string Decode(string bytes)
    {
        return Ascii.IsValid(bytes) || !IsUtf8(bytes) ? bytes : Encoding.UTF8.GetString(Encoding.Latin1.GetBytes(bytes));
    }

    /// <summary>Text as the bytes of the file's encoding; what ISO 8859-1 has no character for becomes <c>?</c>.</summary>
    internal static string Encode(string text, bool utf8)
    {
        if (Ascii.IsValid(text))
        {
            return text;
        }

        return Encoding.Latin1.GetString(utf8 ? Encoding.UTF8.GetBytes(text) : Encoding.Latin1.GetBytes(text));
    }
}
