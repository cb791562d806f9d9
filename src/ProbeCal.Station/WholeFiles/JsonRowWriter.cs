using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Text.Encodings.Web;
using System.Text.Json;

namespace ProbeCal.Station.WholeFiles;

/// <summary>One JSON object a row, one row a line; the fields are in <c>docs/schemas/equilibrium-row.schema.json</c>.</summary>
internal sealed class JsonRowWriter : IRowWriter
{
    private readonly Stream _output;
    private readonly Utf8JsonWriter _writer;
    private readonly IReadOnlyList<ResultColumn> _results;
    private readonly IReadOnlyList<(string Key, string Value)> _about;
    private string[] _names = [];

    /// <param name="output">Where to; left open.</param>
    /// <param name="results">Names of the results.</param>
    /// <param name="about">What holds for all rows.</param>
    internal JsonRowWriter(Stream output, IReadOnlyList<ResultColumn> results, IReadOnlyList<(string Key, string Value)> about)
    {
        _output = new BufferedStream(output, 1 << 16);
        // Read by programs as a file of its own, never put into a page: µ and ° stay as they are.
        _writer = new Utf8JsonWriter(_output, new JsonWriterOptions { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping });
        _results = results;
        _about = about;
    }

    public void Header(TableHeader header)
    {
        HashSet<string> taken = [];
        _names = new string[header.Names.Count];
        for (int i = 0; i < _names.Length; i++)
        {
            string name = header.Names[i];
            string number = "#" + (i + 1).ToString(CultureInfo.InvariantCulture);
            _names[i] = name.Length == 0 || !taken.Add(name) ? name + number : name;
        }
    }

    public void Blank(TableRow row)
    {
        // Nothing to say.
    }

    public void Row(TableRow row, ReadOnlySpan<double> results, RowOutcome outcome)
    {
        _writer.Reset();
        _writer.WriteStartObject();
        _writer.WriteString("format", "probecal-equilibrium-row");
        _writer.WriteNumber("version", 1);
        _writer.WriteNumber("line", row.Line);
        foreach ((string key, string value) in _about)
        {
            _writer.WriteString(key, value);
        }

        WriteInput(row);
        WriteResult(results, outcome);
        _writer.WriteString("status", StatusText.Word(outcome.State));
        if (outcome.Reason.Length != 0)
        {
            _writer.WriteString("reason", outcome.Reason);
        }

        if (outcome.Text.Length != 0)
        {
            _writer.WriteString("text", outcome.Text);
        }

        _writer.WriteEndObject();
        _writer.Flush();
        _output.WriteByte((byte)'\n');
    }

    public void Dispose()
    {
        _writer.Dispose();
        _output.Flush();
    }

    private void WriteInput(TableRow row)
    {
        if (row.Problem is not null)
        {
            _writer.WriteString("unreadable", TableText.Decode(row.Bytes));
            return;
        }

        _writer.WriteStartObject("input");
        for (int i = 0; i < row.Count; i++)
        {
            _writer.WriteString(i < _names.Length ? _names[i] : "#" + (i + 1).ToString(CultureInfo.InvariantCulture), row.Cell(i));
        }

        _writer.WriteEndObject();
    }

    private void WriteResult(ReadOnlySpan<double> results, RowOutcome outcome)
    {
        if (outcome.State == RowState.Refused)
        {
            _writer.WriteNull("result");
            return;
        }

        _writer.WriteStartObject("result");
        for (int i = 0; i < results.Length; i++)
        {
            if (double.IsFinite(results[i]))
            {
                _writer.WriteNumber(_results[i].Key, results[i]);
            }
            else
            {
                _writer.WriteNull(_results[i].Key);
            }
        }

        _writer.WriteEndObject();
    }
}
