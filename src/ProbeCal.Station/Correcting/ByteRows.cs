using System;
using System.Globalization;
using System.IO;
using System.Security.Cryptography;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Correcting;

/// <summary>
/// The rows of a table as the bytes they are, with the places of their cells: one pass over the file, one buffer, nothing allocated for a row. RFC 4180
/// as in the whole files: a quotation mark is one only where a cell begins, and one that is never closed costs its own row only.
/// </summary>
internal sealed class ByteRows : IDisposable
{
    private const int LongestRow = 1 << 20;

    /// <summary>Most lines that a cell in quotation marks may run over; more, and the mark was a mistake.</summary>
    private const int MostLines = 50;

    private readonly Stream _input;
    private readonly IncrementalHash _hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
    private readonly string _name;
    private byte[] _buffer;
    private int[] _starts = new int[32];
    private int[] _ends = new int[32];
    private int _at;
    private int _filled;
    private bool _ended;
    private int _rowStart;
    private int _rowLength;
    private int _endLength;

    /// <param name="input">The file's bytes from its start; left open.</param>
    /// <param name="name">What it is called in a message.</param>
    /// <param name="capacity">Bytes of the buffer; it holds at least one row.</param>
    internal ByteRows(Stream input, string name, int capacity = 1 << 18)
    {
        _input = input;
        _name = name;
        _buffer = new byte[capacity];
    }

    /// <summary>Number of the row's first line, from 1.</summary>
    internal long Line { get; private set; }

    /// <summary>Bytes of the file that have been taken.</summary>
    internal long BytesTaken { get; private set; }

    /// <summary>How many lines have been taken.</summary>
    internal long Lines { get; private set; }

    /// <summary>The row as it stands, without its end.</summary>
    internal ReadOnlySpan<byte> Row => _buffer.AsSpan(_rowStart, _rowLength);

    /// <summary>How it ends: LF, CR LF, CR, or nothing at the end of the file.</summary>
    internal ReadOnlySpan<byte> End => _buffer.AsSpan(_rowStart + _rowLength, _endLength);

    /// <summary>How many cells it has.</summary>
    internal int Count { get; private set; }

    /// <summary>True when a quotation mark is opened and never closed, or text stands behind a closed one.</summary>
    internal bool IsBroken { get; private set; }

    internal bool IsBlank => CellNumber.Trim(Row).IsEmpty;

    /// <summary>A cell without its quotation marks; doubled marks in it stay doubled, which no number or time has.</summary>
    internal ReadOnlySpan<byte> Cell(int index)
    {
        return _buffer.AsSpan(_starts[index], _ends[index] - _starts[index]);
    }

    /// <summary>Reads the next row; false at the end.</summary>
    /// <exception cref="InputException">It is longer than a row of text is.</exception>
    internal bool Read(byte separator)
    {
        if (!TakeLine(from: 0))
        {
            return false;
        }

        Line = Lines;
        if (Row.Contains((byte)'"'))
        {
            ReadQuoted(separator);
        }
        else
        {
            SplitPlain(separator);
        }

        return true;
    }

    /// <summary>Takes a line and does not look into it; false at the end.</summary>
    internal bool Skip()
    {
        return TakeLine(from: 0);
    }

    /// <summary>SHA-256 of the whole file, lower-case hex; of use when the end was reached.</summary>
    internal string Sha256()
    {
        return Convert.ToHexStringLower(_hash.GetHashAndReset());
    }

    public void Dispose()
    {
        _hash.Dispose();
    }

    /// <summary>Takes a line, or, with <paramref name="from"/> above 0, lets the row run on over the next line.</summary>
    private bool TakeLine(int from)
    {
        int start = from == 0 ? _at : _rowStart;
        int looked = from == 0 ? _at : _rowStart + from;
        while (true)
        {
            int found = _buffer.AsSpan(looked, _filled - looked).IndexOfAny((byte)'\r', (byte)'\n');
            // A CR at the end of the buffer may have its LF in the next block.
            bool isWhole = 0 <= found && (_buffer[looked + found] == (byte)'\n' || looked + found + 1 < _filled || _ended);
            if (isWhole || _ended)
            {
                int length = (found < 0 ? _filled : looked + found) - start;
                if (found < 0 && (from == 0 ? length == 0 : looked == _filled))
                {
                    return false;
                }

                _rowStart = start;
                _rowLength = length;
                _endLength = found < 0 ? 0 : _buffer[start + length] == (byte)'\r' && start + length + 1 < _filled && _buffer[start + length + 1] == (byte)'\n' ? 2 : 1;
                BytesTaken += start + length + _endLength - _at;
                _at = start + length + _endLength;
                Lines++;
                return true;
            }

            if (LongestRow < _filled - start)
            {
                throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{_name}, line {Lines + 1}: longer than {LongestRow} bytes; is this a text file with columns?"));
            }

            int distance = looked - start;
            Fill(ref start);
            looked = start + distance;
        }
    }

    /// <summary>Reads more behind what is there, moving the row to the front of the buffer first.</summary>
    private void Fill(ref int start)
    {
        if (start != 0)
        {
            Buffer.BlockCopy(_buffer, start, _buffer, 0, _filled - start);
            _filled -= start;
            _at -= start;
            _rowStart -= start;
            start = 0;
        }

        if (_filled == _buffer.Length)
        {
            Array.Resize(ref _buffer, _buffer.Length * 2);
        }

        int read = _input.Read(_buffer, _filled, _buffer.Length - _filled);
        _hash.AppendData(_buffer, _filled, read);
        _filled += read;
        _ended = read == 0;
    }

    private void SplitPlain(byte separator)
    {
        IsBroken = false;
        Count = 0;
        int at = _rowStart;
        int end = _rowStart + _rowLength;
        while (true)
        {
            int next = _buffer.AsSpan(at, end - at).IndexOf(separator);
            Add(at, next < 0 ? end : at + next);
            if (next < 0)
            {
                return;
            }

            at += next + 1;
        }
    }

    private void ReadQuoted(byte separator)
    {
        int firstLength = _rowLength;
        int firstEnd = _endLength;
        long firstLines = Lines;
        for (int lines = 0; !SplitQuoted(separator); lines++)
        {
            if (lines < MostLines && TakeLine(from: _rowLength + _endLength))
            {
                continue;
            }

            // The mark was a mistake: the row is its first line, and what followed is read again as rows.
            _rowLength = firstLength;
            _endLength = firstEnd;
            int behind = _at - (_rowStart + firstLength + firstEnd);
            _at -= behind;
            BytesTaken -= behind;
            Lines = firstLines;
            Count = 1;
            IsBroken = true;
            return;
        }
    }

    /// <summary>False when a quotation mark is still open at the end.</summary>
    private bool SplitQuoted(byte separator)
    {
        IsBroken = false;
        Count = 0;
        int at = _rowStart;
        int end = _rowStart + _rowLength;
        while (true)
        {
            bool quoted = at < end && _buffer[at] == (byte)'"';
            int from = quoted ? ClosingMark(at + 1, end) : at;
            if (from < 0)
            {
                return false;
            }

            int next = _buffer.AsSpan(from, end - from).IndexOf(separator);
            int stop = next < 0 ? end : from + next;
            if (quoted)
            {
                IsBroken |= !CellNumber.Trim(_buffer.AsSpan(from + 1, stop - from - 1)).IsEmpty;
                Add(at + 1, from);
            }
            else
            {
                Add(at, stop);
            }

            if (next < 0)
            {
                return true;
            }

            at = stop + 1;
        }
    }

    private int ClosingMark(int from, int end)
    {
        while (from < end)
        {
            int found = _buffer.AsSpan(from, end - from).IndexOf((byte)'"');
            if (found < 0)
            {
                return -1;
            }

            int at = from + found;
            if (at + 1 == end || _buffer[at + 1] != (byte)'"')
            {
                return at;
            }

            from = at + 2;
        }

        return -1;
    }

    private void Add(int start, int end)
    {
        if (Count == _starts.Length)
        {
            Array.Resize(ref _starts, Count * 2);
            Array.Resize(ref _ends, Count * 2);
        }

        _starts[Count] = start;
        _ends[Count++] = end;
    }
}
