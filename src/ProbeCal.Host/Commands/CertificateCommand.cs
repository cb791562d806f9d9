using System.CommandLine;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Reports;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal calibrations certificate</c>: one record on one page.</summary>
internal static class CertificateCommand
{
    internal static Command Create(Terminal terminal)
    {
        Argument<string> id = new("id") { Description = "Id of the calibration or check, as list shows it.", HelpName = "ID" };
        Option<string> data = CalibrationsCommand.DataOption();
        Option<string> output = new("--output") { Description = "File to write: a page for the browser and its printer, or a PDF. Without it the text is shown.", HelpName = "FILE.html|FILE.pdf" };
        Option<string> name = new("--name") { Description = "Your name as it should stand on it.", HelpName = "NAME" };
        Option<string> role = new("--role") { Description = "Your role.", HelpName = "ROLE" };
        Option<string> paper = new("--paper") { Description = "Paper of the PDF: A4 (default) or Letter. The page takes what the printer has.", HelpName = "A4|Letter" };
        Command command = new("certificate", "One record as a certificate on one page, with the head of the log: a field calibration record and no accredited certificate.") { id, data, output, name, role, paper };
        command.SetAction(parsed =>
        {
            PaperSize size = Paper(parsed.GetValue(paper));
            string? file = parsed.GetValue(output);
            if (file is not null)
            {
                ReportFile.Form(file, ".html", ".pdf");
            }

            CertificateSignature signature = new(Line("--name", parsed.GetValue(name)), Line("--role", parsed.GetValue(role)), terminal.Time.GetUtcNow(), ProgramIdentity.Release);
            using CalibrationLogStore log = CalibrationsCommand.Open(parsed.GetValue(data));
            string wanted = parsed.GetValue(id)!;
            StoredCalibration stored = log.Find(wanted)
                ?? throw new InputException($"calibration {Wrong.Shown(wanted)}: not in this log{NearestName.DidYouMean(wanted, log.Records.Select(static known => known.Record.Id))}; 'probecal calibrations list' shows the ids");
            Report report = Certificate.Of(log, stored, signature);
            if (file is null)
            {
                ReportPage.Write(terminal.Page(), report);
            }
            else
            {
                ReportFile.Write(file, report, size, signature.Software, signature.MadeUtc);
                terminal.Error.WriteLine($"{file}: certificate of {stored.Record.Id}");
            }

            return ExitCode.Done;
        });
        return command;
    }

    /// <summary>The paper of that name; A4 when nothing is said.</summary>
    /// <exception cref="InputException">There is none.</exception>
    internal static PaperSize Paper(string? name)
    {
        return (name ?? "A4").ToUpperInvariant() switch
        {
            "A4" => PaperSize.A4,
            "LETTER" => PaperSize.Letter,
            _ => throw Wrong.Input("--paper", name!, $"there is no such paper{NearestName.DidYouMean(name!, ["A4", "Letter"])}; there are A4 and Letter"),
        };
    }

    private static string? Line(string option, string? text)
    {
        return text is null ? null : PlainText.OneLine(option, text.Trim());
    }
}
