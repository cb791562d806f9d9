using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Simulation;

namespace ProbeCal.Host.Commands;

/// <summary>The true concentrations that the simulation writes beside its lines, looked up by time.</summary>
internal sealed class DemoTruth(string file) : IDisposable
{
    private const string TimeColumn = "timeUtc";
    private const string ValueColumn = "milligramsPerLitre";

    private readonly StreamReader _reader = new(new FileStream(file, FileMode.Open, FileAccess.Read, FileShare.ReadWrite));
    private readonly Dictionary<DateTimeOffset, double> _known = [];
    private bool _formatSeen;
    private string[]? _header;
    private string _unfinished = "";

    /// <summary>True concentration at a time, mg/L; null when the simulation has no line of that time.</summary>
    internal double? At(DateTimeOffset time)
    {
        // The last row may still be half written: it waits for its line end.
        string[] rows = (_unfinished + _reader.ReadToEnd()).Split('\n');
        _unfinished = rows[^1];
        foreach (string row in rows.AsSpan(0, rows.Length - 1))
        {
            if (!_formatSeen)
            {
                _formatSeen = row == SimulationRun.TruthFormat ? true
                    : throw new WorkFailedException($"{file}: it begins with '{Wrong.Shown(row)}'; this program reads files that begin with '{SimulationRun.TruthFormat}'");
                continue;
            }

            string[] cells = row.Split(',');
            if (_header is null)
            {
                _header = cells;
            }
            else if (cells.Length == _header.Length)
            {
                DateTimeOffset at = DateTimeOffset.Parse(cells[Array.IndexOf(_header, TimeColumn)], CultureInfo.InvariantCulture);
                _known[at] = Number.Parse(ValueColumn, cells[Array.IndexOf(_header, ValueColumn)]);
            }
        }

        return _known.Remove(time, out double value) ? value : null;
    }

    public void Dispose()
    {
        _reader.Dispose();
    }
}
