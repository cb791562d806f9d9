using System;
using System.Threading;

namespace ProbeCal.Station.TableWriting;

/// <summary>A table ready to be stored.</summary>
/// <param name="FileName">The file it belongs in.</param>
/// <param name="Content">Its text, lines ended by LF.</param>
/// <param name="Summary">One line about it for a person: size and largest error found.</param>
public sealed record WrittenTable(string FileName, string Content, string Summary);

/// <summary>Makes a table: chooses its steps, proves its error, writes it in the form asked for.</summary>
public static class TableWriter
{
    /// <summary>Makes the table that the options describe.</summary>
    /// <param name="options">What it shall be.</param>
    /// <param name="progress">Told the share of the present comparison that is done; null for nobody.</param>
    /// <param name="stop">Ends the work.</param>
    /// <exception cref="Entry.InputException">An option is wrong, outside the equation, or the error cannot be kept.</exception>
    public static WrittenTable Make(TableOptions options, Action<double>? progress, CancellationToken stop)
    {
        if (options.Format == TableRequest.Card)
        {
            return FieldCard.Make(options, progress, stop);
        }

        TableRequest request = TableRequest.Parse(options);
        StepSearch search = new(request.Subject, request.Precision, request.Allowed, progress, stop);
        (GasTable table, ErrorProof proof) = search.Find(request.Rows, request.Columns, request.Decimals);
        (string file, string content) = options.Format switch
        {
            "csv" => (request.Name + ".csv", CsvTable.Write(request.Name, table, proof, request.Allowed, options.Program)),
            "json" => (request.Name + ".json", JsonTable.Write(request.Name, table, proof, request.Allowed, options.Program)),
            "csharp" => (TableNames.Pascal(request.Name) + ".cs", CSharpSource.Write(request.Name, table, proof, request.Allowed, options.Program)),
            _ => (TableNames.Snake(request.Name) + ".h", CHeader.Write(request.Name, table, proof, request.Allowed, options.Program)),
        };
        return new WrittenTable(file, content, Summary(table, proof, request.Allowed));
    }

    internal static string Summary(GasTable table, ErrorProof proof, AllowedError? allowed)
    {
        string size = table.Columns is TableAxis columns
            ? Entry.Number.Print(table.Rows.Count) + " x " + Entry.Number.Print(columns.Count)
            : Entry.Number.Print(table.Rows.Count);
        return size + " values, largest error found " + TableStatements.Found(table, proof, allowed?.IsPercent ?? false);
    }
}
