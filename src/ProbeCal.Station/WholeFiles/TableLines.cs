using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.WholeFiles;

/// <summary>
/// The lines of a file one by one, ended by CR LF, LF or CR, with the ends kept and the possibility to put lines back.
/// Memory is one buffer, whatever the size of the file.
/// </summary>
internal sealed class TableLines : IDisposable
{
    private const int LongestLine = 1 << 20;

    private readonly StreamReader _reader;
    private readonly char[] _buffer = new char[1 << 16];
    private readonly Stack<(string Text, string End)> _back = new();
    private readonly StringBuilder _open = new();
    private readonly string _name;
    private int _at;
    private int _filled;

    /// <param name="input">The file's bytes; left open.</param>
    /// <param name="name">What it is called in a message.</param>
    internal TableLines(Stream input, string name)
    {
        _reader = new StreamReader(input, Encoding.Latin1, detectEncodingFromByteOrderMarks: false, 1 << 16, leaveOpen: true);
        _name = name;
    }

    /// <summary>How many lines have been taken and not put back.</summary>
    internal long Number { get; private set; }

    /// <summary>The next line without its end; null when there is none.</summary>
    /// <param name="end">How it ended; empty at the end of the file.</param>
    /// <exception cref="InputException">It is longer than a line of text is.</exception>
    internal string? Next(out string end)
    {
        if (_back.TryPop(out (string Text, string End) line))
        {
            Number++;
            end = line.End;
            return line.Text;
        }

        end = "";
        _open.Clear();
        while (Fill())
        {
            ReadOnlySpan<char> rest = _buffer.AsSpan(_at, _filled - _at);
            int length = rest.IndexOfAny('\r', '\n');
            _open.Append(length < 0 ? rest : rest[..length]);
            if (LongestLine < _open.Length)
            {
                throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{_name}, line {Number + 1}: longer than {LongestLine} bytes; is this a text file with columns?"));
            }

            if (length < 0)
            {
                _at = _filled;
                continue;
            }

            _at += length;
            end = End();
            Number++;
            return _open.ToString();
        }

        if (_open.Length == 0)
        {
            return null;
        }

        Number++;
        return _open.ToString();
    }

    /// <summary>Gives lines back, the last one taken first.</summary>
    internal void PutBack(string text, string end)
    {
        _back.Push((text, end));
        Number--;
    }

    public void Dispose()
    {
        _reader.Dispose();
    }

    private string End()
    {
        bool carriageReturn = _buffer[_at] == '\r';
        _at++;
        if (!carriageReturn)
        {
            return "\n";
        }

        if (Fill() && _buffer[_at] == '\n')
        {
            _at++;
            return "\r\n";
        }

        return "\r";
    }

    private bool Fill()
    {
        if (_at < _filled)
        {
            return true;
        }

        _at = 0;
        _filled = _reader.Read(_buffer, 0, _buffer.Length);
        return _filled != 0;
    }
}
