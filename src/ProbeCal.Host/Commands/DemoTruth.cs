using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;

namespace ProbeCal.Host.Commands;

/// <summary>The true concentrations that the simulation writes beside its lines, looked up by time.</summary>
internal sealed class DemoTruth(string file) : IDisposable
{
    private const string TimeColumn = "timeUtc";
    private const string ValueColumn = "milligramsPerLitre";

    private readonly StreamReader _reader = new(new FileStream(file, FileMode.Open, FileAccess.Read, FileShare.ReadWrite));
    private readonly Dictionary<DateTimeOffset, double> _known = [];
    private string[]? _header;

    /// <summary>True concentration at a time, mg/L; null when the simulation has no line of that time.</summary>
    internal double? At(DateTimeOffset time)
    {
        while (_reader.ReadLine() is string row)
        {
            string[] cells = row.Split(',');
            if (row.StartsWith('#'))
            {
                continue;
            }

            if (_header is null)
            {
                _header = cells;
            }
            else if (cells.Length == _header.Length)
            {
                DateTimeOffset at = DateTimeOffset.Parse(cells[Array.IndexOf(_header, TimeColumn)], CultureInfo.InvariantCulture);
                _known[at] = double.Parse(cells[Array.IndexOf(_header, ValueColumn)], CultureInfo.InvariantCulture);
            }
        }

        return _known.Remove(time, out double value) ? value : null;
    }

    public void Dispose()
    {
        _reader.Dispose();
    }
}
