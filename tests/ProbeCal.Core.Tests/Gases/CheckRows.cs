using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using Xunit;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>Rows of a file of check values: comment lines begin with #, the first other line names the columns, no quoting.</summary>
internal sealed class CheckRow
{
    private readonly Dictionary<string, string> _fields;

    private CheckRow(Dictionary<string, string> fields)
    {
        _fields = fields;
    }

    internal string this[string column] => _fields[column];

    internal double Number(string column)
    {
        return double.Parse(_fields[column], NumberStyles.Float, CultureInfo.InvariantCulture);
    }

    internal decimal Exact(string column)
    {
        return decimal.Parse(_fields[column], NumberStyles.Float, CultureInfo.InvariantCulture);
    }

    public override string ToString()
    {
        return string.Join(' ', _fields.Where(f => f.Key is not ("source" or "confidence" or "tolerance")).Select(f => f.Value))
            + " [" + _fields["source"] + ", " + _fields["confidence"] + "]";
    }

    /// <summary>Reads a file and insists on the number of rows it must have, so that an emptied file cannot pass.</summary>
    internal static List<CheckRow> Read(string file, int count)
    {
        string[] lines = File.ReadAllLines(Path.Combine(AppContext.BaseDirectory, "CheckValues", file))
            .Where(l => l.Length != 0 && l[0] != '#').ToArray();
        string[] columns = lines[0].Split(',');
        List<CheckRow> rows = [];
        foreach (string line in lines.Skip(1))
        {
            string[] fields = line.Split(',');
            Assert.Equal(columns.Length, fields.Length);
            rows.Add(new CheckRow(columns.Zip(fields).ToDictionary(p => p.First, p => p.Second)));
        }

        Assert.Equal(count, rows.Count);
        Assert.All(rows, r => Assert.False(string.IsNullOrWhiteSpace(r["source"])));
        return rows;
    }
}
