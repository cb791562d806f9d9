using System.Collections.Generic;
using System.Linq;

namespace ProbeCal.Station.Reports;

/// <summary>Tables of records of several versions and methods: a column in which no row has anything is left out.</summary>
internal static class ColumnChoice
{
    /// <summary>What an empty cell shows beside full ones.</summary>
    internal const string None = "–";

    /// <summary>The table without its empty columns.</summary>
    internal static ReportTable Table(IReadOnlyList<ReportColumn> columns, IEnumerable<string?[]> cells)
    {
        List<string?[]> rows = [.. cells];
        int[] kept = [.. Enumerable.Range(0, columns.Count).Where(i => rows.Exists(row => !string.IsNullOrEmpty(row[i])))];
        return new ReportTable([.. kept.Select(i => columns[i])], [.. rows.Select(row => kept.Select(i => string.IsNullOrEmpty(row[i]) ? None : row[i]!).ToArray())]);
    }
}
