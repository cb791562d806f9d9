using System;
using System.Globalization;

namespace ProbeCal.Station.Correcting;

/// <summary>
/// The number in a cell, from its bytes, by the rules of <see cref="Entry.Number"/> and to the same bits: a number of at most 19 digits and a small
/// exponent is exact in one division or multiplication of doubles that hold both exactly (Clinger 1990); the rest goes to the runtime.
/// </summary>
internal static class CellNumber
{
    /// <summary>Longest text that is looked at, as in <see cref="Entry.Number"/>.</summary>
    private const int LongestText = 64;

    /// <summary>Largest whole number up to which every whole number is a double.</summary>
    private const ulong LargestExact = 1UL << 53;

    /// <summary>Powers of ten that are doubles exactly.</summary>
    private static readonly double[] Powers =
    [
        1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16, 1e17, 1e18, 1e19, 1e20, 1e21, 1e22,
    ];

    /// <summary>Reads the whole cell as one finite number; blanks around it do not count.</summary>
    /// <param name="cell">The bytes of the cell.</param>
    /// <param name="mark">The decimal mark: a point or a comma.</param>
    /// <param name="value">The number; NaN when there is none.</param>
    internal static bool TryParse(ReadOnlySpan<byte> cell, byte mark, out double value)
    {
        value = double.NaN;
        ReadOnlySpan<byte> text = Trim(cell);
        if (text.IsEmpty || LongestText < text.Length)
        {
            return false;
        }

        int at = text[0] is (byte)'+' or (byte)'-' ? 1 : 0;
        bool negative = text[0] == (byte)'-';
        ulong digits = 0;
        int kept = 0, seen = 0, decimals = 0;
        bool exact = true, pastMark = false;
        for (; at < text.Length; at++)
        {
            byte c = text[at];
            uint digit = (uint)(c - '0');
            if (digit <= 9)
            {
                seen++;
                decimals += pastMark ? 1 : 0;
                if (kept == 18)
                {
                    exact = false;
                    continue;
                }

                digits = (digits * 10) + digit;
                kept += digits == 0 ? 0 : 1;
            }
            else if (c == mark && !pastMark)
            {
                pastMark = true;
            }
            else
            {
                break;
            }
        }

        if (seen == 0)
        {
            return false;
        }

        if (at == text.Length && exact && digits <= LargestExact && decimals < Powers.Length)
        {
            double magnitude = digits / Powers[decimals];
            value = negative ? -magnitude : magnitude;
            return true;
        }

        return (at == text.Length || IsExponent(text[at..])) && TryRuntime(text, mark, out value);
    }

    /// <summary>The bytes without the blanks around them.</summary>
    internal static ReadOnlySpan<byte> Trim(ReadOnlySpan<byte> text)
    {
        int start = 0, end = text.Length;
        while (start < end && text[start] is (byte)' ' or (byte)'\t')
        {
            start++;
        }

        while (start < end && text[end - 1] is (byte)' ' or (byte)'\t')
        {
            end--;
        }

        return text[start..end];
    }

    private static bool IsExponent(ReadOnlySpan<byte> text)
    {
        if (text[0] is not ((byte)'e' or (byte)'E'))
        {
            return false;
        }

        int at = 1 < text.Length && text[1] is (byte)'+' or (byte)'-' ? 2 : 1;
        return at < text.Length && text[at..].IndexOfAnyExceptInRange((byte)'0', (byte)'9') < 0;
    }

    private static bool TryRuntime(ReadOnlySpan<byte> text, byte mark, out double value)
    {
        Span<char> characters = stackalloc char[LongestText];
        bool zeroMantissa = true;
        bool inMantissa = true;
        for (int i = 0; i < text.Length; i++)
        {
            characters[i] = text[i] == mark ? '.' : (char)text[i];
            inMantissa &= text[i] is not ((byte)'e' or (byte)'E');
            zeroMantissa &= !inMantissa || text[i] is not (>= (byte)'1' and <= (byte)'9');
        }

        bool isNumber = double.TryParse(characters[..text.Length], NumberStyles.Float, CultureInfo.InvariantCulture, out value)
            && double.IsFinite(value) && (value != 0 || zeroMantissa);
        value = isNumber ? value : double.NaN;
        return isNumber;
    }
}
