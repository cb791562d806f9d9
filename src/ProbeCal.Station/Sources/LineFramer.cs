using System;
using System.Text;

namespace ProbeCal.Station.Sources;

/// <summary>A line as it was framed: its text, and why it cannot be trusted, if so.</summary>
internal readonly record struct FramedLine(string Text, string? Defect);

/// <summary>
/// Cuts a stream of bytes into lines at CR, LF or CR LF. Memory is bounded: what is longer than
/// <see cref="LineTemplate.LongestLine"/> bytes is cut and thrown away up to the next line end. Bytes become text only when a
/// line is whole. Empty lines are passed over.
/// </summary>
internal sealed class LineFramer
{
    internal const string CutAtStart = "it may be cut at its start, for the source was opened in the middle of it";
    internal const string CutAtEnd = "it may be cut, for it has no line end";

    private static readonly UTF8Encoding StrictUtf8 = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    private readonly byte[] _line = new byte[LineTemplate.LongestLine];
    private int _length;
    private long _overflow;
    private bool _mayStartInTheMiddle;

    /// <param name="mayStartInTheMiddle">
    /// True for a port or a connection that was sending before it was opened: a number that has lost its first digits still
    /// reads as a number, so the first line is not to be trusted.
    /// </param>
    internal LineFramer(bool mayStartInTheMiddle)
    {
        _mayStartInTheMiddle = mayStartInTheMiddle;
    }

    /// <summary>Says that the next byte starts a line: nothing had been under way for long enough.</summary>
    internal void StartsWhole()
    {
        _mayStartInTheMiddle = false;
    }

    /// <summary>Takes the next bytes and hands each line that they complete to <paramref name="found"/>.</summary>
    internal void Push(ReadOnlySpan<byte> bytes, Action<FramedLine> found)
    {
        while (!bytes.IsEmpty)
        {
            int end = bytes.IndexOfAny((byte)'\r', (byte)'\n');
            Keep(end < 0 ? bytes : bytes[..end]);
            if (end < 0)
            {
                return;
            }

            Finish(null, found);
            _mayStartInTheMiddle = false;
            bytes = bytes[(end + 1)..];
        }
    }

    /// <summary>Hands over what is left at the end of the stream: a line without its end, which may have lost digits.</summary>
    internal void End(Action<FramedLine> found)
    {
        Finish(CutAtEnd, found);
    }

    /// <summary>UTF-8 where it is UTF-8; otherwise each byte is one character (ISO 8859-1), so that nothing is lost.</summary>
    internal static string Decode(ReadOnlySpan<byte> bytes)
    {
        try
        {
            return StrictUtf8.GetString(bytes);
        }
        catch (DecoderFallbackException)
        {
            return Encoding.Latin1.GetString(bytes);
        }
    }

    private void Keep(ReadOnlySpan<byte> bytes)
    {
        int room = Math.Min(bytes.Length, _line.Length - _length);
        bytes[..room].CopyTo(_line.AsSpan(_length));
        _length += room;
        _overflow += bytes.Length - room;
    }

    private void Finish(string? defect, Action<FramedLine> found)
    {
        if (_length == 0)
        {
            return;
        }

        if (_overflow != 0)
        {
            defect = "it is longer than 1024 bytes and was cut there";
        }
        else if (_mayStartInTheMiddle)
        {
            defect = CutAtStart;
        }

        // Some editors put a byte order mark before the first line of a file.
        FramedLine line = new(Decode(_line.AsSpan(0, _length)).TrimStart('\uFEFF'), defect);
        _length = 0;
        _overflow = 0;
        found(line);
    }
}
