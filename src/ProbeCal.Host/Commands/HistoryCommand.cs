using System.CommandLine;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Reports;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal calibrations history</c>: how a probe and its membranes change.</summary>
internal static class HistoryCommand
{
    private const string Entered = "entered";

    internal static Command Create(Terminal terminal)
    {
        Option<string> probe = new("--probe") { Description = "Id of the probe.", HelpName = "ID", Required = true };
        Option<string> data = CalibrationsCommand.DataOption();
        Option<string> output = new("--output") { Description = "File to write: page, PDF, picture or table. Without it the text is shown.", HelpName = "FILE.html|pdf|svg|csv" };
        Option<string> slope = new("--slope-window") { Description = "Slope that the probe's maker allows; without it the one that the newest calibration was judged by.", HelpName = "LOW..HIGH" };
        Option<string> zero = new("--zero-window") { Description = "Zero signal that the probe's maker allows.", HelpName = "LOW..HIGH" };
        Option<string> paper = new("--paper") { Description = "Paper of the PDF: A4 (default) or Letter.", HelpName = "A4|Letter" };
        Command command = new("history", "Slope, zero and error as found of a probe and each membrane over time, with the trend and when it leaves its window.") { probe, data, output, slope, zero, paper };
        command.SetAction(parsed =>
        {
            PaperSize size = CertificateCommand.Paper(parsed.GetValue(paper));
            string? file = parsed.GetValue(output);
            if (file is not null)
            {
                ReportFile.Form(file, ".html", ".pdf", ".svg", ".csv");
            }

            HistoryWindow? slopeWindow = Window("--slope-window", parsed.GetValue(slope));
            HistoryWindow? zeroWindow = Window("--zero-window", parsed.GetValue(zero));
            using CalibrationLogStore log = CalibrationsCommand.Open(parsed.GetValue(data));
            ProbeHistory history = ProbeHistory.Of(log, parsed.GetValue(probe)!, slopeWindow, zeroWindow);
            if (file is null)
            {
                ReportPage.Write(terminal.Page(), HistoryReport.Of(history, terminal.Time.GetUtcNow(), ProgramIdentity.Release));
            }
            else
            {
                HistoryReport.Write(file, history, size, terminal.Time.GetUtcNow(), ProgramIdentity.Release);
                terminal.Error.WriteLine($"{file}: history of probe {parsed.GetValue(probe)}");
            }

            return ExitCode.Done;
        });
        return command;
    }

    private static HistoryWindow? Window(string option, string? text)
    {
        if (text is null)
        {
            return null;
        }

        string[] ends = text.Split("..");
        if (ends.Length != 2)
        {
            throw Wrong.Input(option, text, "write LOW..HIGH, for example 0.4..0.6");
        }

        HistoryWindow window = new(Number.Parse(option, ends[0]), Number.Parse(option, ends[1]), Entered);
        return window.Low < window.High ? window : throw Wrong.Input(option, text, "the lower end comes first");
    }
}
