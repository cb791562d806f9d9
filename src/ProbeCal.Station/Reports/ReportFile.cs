using System;
using System.IO;
using System.Text;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Storage;

namespace ProbeCal.Station.Reports;

/// <summary>Puts a report into a file, whole or not at all.</summary>
public static class ReportFile
{
    /// <summary>Refuses a name that no form goes by, before any work is done.</summary>
    /// <param name="path">The file as typed.</param>
    /// <param name="forms">The endings there are, for example <c>.html</c>.</param>
    /// <exception cref="InputException">Its ending is none of them.</exception>
    public static string Form(string path, params string[] forms)
    {
        string ending = Path.GetExtension(path).ToLowerInvariant();
        return Array.IndexOf(forms, ending) < 0
            ? throw Wrong.Input("--output", path, $"the ending says what is written; there are {string.Join(", ", forms)}")
            : ending;
    }

    /// <summary>Writes the report as the ending of the file says: a page of HTML, or a PDF.</summary>
    /// <param name="path">The file, ending in <c>.html</c> or <c>.pdf</c>. One of that name is replaced.</param>
    /// <param name="report">The report.</param>
    /// <param name="paper">The paper of a PDF.</param>
    /// <param name="software">Program and version, for the properties of a PDF.</param>
    /// <param name="madeUtc">When it is made, UTC.</param>
    /// <exception cref="WorkFailedException">The system refuses the file.</exception>
    public static void Write(string path, Report report, PaperSize paper, string software, DateTimeOffset madeUtc)
    {
        Save(path, Form(path, ".html", ".pdf") == ".pdf" ? ReportPdf.Write(report, paper, software, madeUtc) : Encoding.UTF8.GetBytes(ReportHtml.Write(report)));
    }

    /// <summary>Puts bytes into the file's place.</summary>
    /// <exception cref="WorkFailedException">The system refuses the file.</exception>
    internal static void Save(string path, byte[] bytes)
    {
        try
        {
            using NewFile file = new(Path.GetFullPath(path));
            file.Stream.Write(bytes);
            file.Keep(replace: true);
        }
        catch (Exception refused) when (refused is IOException or UnauthorizedAccessException)
        {
            throw new WorkFailedException($"{path}: cannot be written ({refused.Message})", refused);
        }
    }
}
