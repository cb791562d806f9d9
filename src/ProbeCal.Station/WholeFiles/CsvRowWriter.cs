using System;
using System.Collections.Generic;
using System.IO;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.WholeFiles;

/// <summary>The rows as they came, with the results behind them.</summary>
internal sealed class CsvRowWriter : IRowWriter
{
    private readonly StreamWriter _writer;
    private readonly IReadOnlyList<string> _names;
    private readonly bool _decimalComma;
    private char _separator = ',';
    private string _lineEnd = "\n";
    private bool _headerIsUtf8;
    private int _columns;

    /// <param name="output">Where to; left open.</param>
    /// <param name="names">Names of the appended columns, the status last.</param>
    /// <param name="decimalComma">True to write results as the file writes its numbers.</param>
    internal CsvRowWriter(Stream output, IReadOnlyList<string> names, bool decimalComma)
    {
        _writer = new StreamWriter(output, Encoding.Latin1, 1 << 16, leaveOpen: true);
        _names = names;
        _decimalComma = decimalComma;
    }

    public void Header(TableHeader header)
    {
        (_separator, _lineEnd, _headerIsUtf8, _columns) = (header.Separator, header.LineEnd, header.IsUtf8, header.Names.Count);
        _writer.Write(header.Mark);
        foreach (string line in header.Before)
        {
            _writer.Write(line);
            _writer.Write(_lineEnd);
        }

        _writer.Write(header.Bytes);
        foreach (string name in _names)
        {
            _writer.Write(_separator);
            Write(name, _headerIsUtf8);
        }

        _writer.Write(_lineEnd);
    }

    public void Blank(TableRow row)
    {
        _writer.Write(row.Bytes);
        _writer.Write(_lineEnd);
    }

    public void Row(TableRow row, ReadOnlySpan<double> results, RowOutcome outcome)
    {
        int cells = row.Count;
        if (row.Problem is null)
        {
            _writer.Write(row.Bytes);
        }
        else
        {
            // As it stands it would take what follows into its open cell.
            Quote(row.Bytes);
            cells = 1;
        }

        for (; cells < _columns; cells++)
        {
            _writer.Write(_separator);
        }

        bool refused = outcome.State == RowState.Refused;
        foreach (double result in results)
        {
            _writer.Write(_separator);
            if (!refused && double.IsFinite(result))
            {
                string number = Number.Print(result);
                Write(_decimalComma ? number.Replace('.', ',') : number, utf8: true);
            }
        }

        _writer.Write(_separator);
        string status = StatusText.Of(outcome);
        Write(status, _headerIsUtf8 && TableText.IsUtf8(row.Bytes));
        _writer.Write(_lineEnd);
    }

    public void Dispose()
    {
        _writer.Dispose();
    }

    private void Write(string text, bool utf8)
    {
        string bytes = TableText.Encode(text, utf8);
        if (bytes.AsSpan().IndexOfAny('"', '\r', '\n') < 0 && !bytes.Contains(_separator, StringComparison.Ordinal))
        {
            _writer.Write(bytes);
        }
        else
        {
            Quote(bytes);
        }
    }

    private void Quote(string bytes)
    {
        _writer.Write('"');
        _writer.Write(bytes.Replace("\"", "\"\"", StringComparison.Ordinal));
        _writer.Write('"');
    }
}
