using System;
using System.Globalization;

namespace ProbeCal.Station.Correcting;

/// <summary>A double as the bytes of its decimal text, to the same digits as <see cref="Entry.Number"/>: fixed decimals, or the shortest that reads back.</summary>
internal static class FixedText
{
    /// <summary>Most decimals that a column may have.</summary>
    internal const int MostDecimals = 12;

    /// <summary>Decimals of a column in the shortest form that reads back as the same double.</summary>
    internal const int Shortest = -1;

    /// <summary>Room for any text made here.</summary>
    internal const int LongestText = 340;

    /// <summary>Above this a double scaled by a power of ten no longer tells which way to round.</summary>
    private const double LargestScaled = 1e15;

    /// <summary>Two roundings of a double, relative: how far the scaled value can be from the true one.</summary>
    private const double Doubt = 4.5e-16;

    private static readonly string[] Formats = ["F0", "F1", "F2", "F3", "F4", "F5", "F6", "F7", "F8", "F9", "F10", "F11", "F12"];

    private static readonly double[] Powers = [1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12];

    /// <summary>Writes a finite value.</summary>
    /// <param name="value">The value.</param>
    /// <param name="decimals">Decimals, or <see cref="Shortest"/>.</param>
    /// <param name="mark">The decimal mark.</param>
    /// <param name="text">Where to; at least <see cref="LongestText"/> long.</param>
    /// <returns>How many bytes were written.</returns>
    internal static int Write(double value, int decimals, byte mark, Span<byte> text)
    {
        if (0 <= decimals)
        {
            double scaled = Math.Abs(value) * Powers[decimals];
            double whole = Math.Floor(scaled);
            double rest = scaled - whole;
            // Where the scaled value is not clearly to one side of the half, the exact digits decide.
            if (scaled < LargestScaled && scaled * Doubt < Math.Abs(rest - 0.5))
            {
                return WriteWhole((ulong)whole + (0.5 < rest ? 1UL : 0UL), value < 0, decimals, mark, text);
            }
        }

        return ByRuntime(value, decimals, mark, text);
    }

    private static int WriteWhole(ulong scaled, bool negative, int decimals, byte mark, Span<byte> text)
    {
        int length = 0;
        if (negative && scaled != 0)
        {
            text[length++] = (byte)'-';
        }

        Span<byte> reversed = stackalloc byte[24];
        int digits = 0;
        while (scaled != 0 || digits <= decimals)
        {
            (scaled, ulong digit) = Math.DivRem(scaled, 10);
            reversed[digits++] = (byte)('0' + digit);
        }

        for (int i = digits - 1; 0 <= i; i--)
        {
            text[length++] = reversed[i];
            if (i == decimals && i != 0)
            {
                text[length++] = mark;
            }
        }

        return length;
    }

    private static int ByRuntime(double value, int decimals, byte mark, Span<byte> text)
    {
        string chosen = decimals < 0 ? "" : Formats[decimals];
        value.TryFormat(text, out int length, chosen, CultureInfo.InvariantCulture);
        if (0 <= decimals && text[0] == (byte)'-' && text[1..length].IndexOfAnyExcept((byte)'0', (byte)'.') < 0)
        {
            // What rounds to zero carries no sign.
            text[1..length].CopyTo(text);
            length--;
        }

        int point = mark == (byte)'.' ? -1 : text[..length].IndexOf((byte)'.');
        if (0 <= point)
        {
            text[point] = mark;
        }

        return length;
    }
}
