using System;

namespace ProbeCal.Station.WholeFiles;

/// <summary>Writes rows in one form.</summary>
internal interface IRowWriter : IDisposable
{
    void Header(TableHeader header);

    void Blank(TableRow row);

    /// <summary>A row with its results; they do not count when it was refused.</summary>
    void Row(TableRow row, ReadOnlySpan<double> results, RowOutcome outcome);
}
