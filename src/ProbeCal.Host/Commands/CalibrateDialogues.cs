using System;
using System.Collections.Generic;
using System.CommandLine;
using System.IO;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>What a calibration says while it runs: one line at a time on standard error, progress now and then.</summary>
internal sealed class CalibrationProgress
{
    private const double EverySeconds = 15;

    private readonly TextWriter _error;
    private CalibrationStep? _step;
    private DateTimeOffset _told;

    internal CalibrationProgress(TextWriter error)
    {
        _error = error;
    }

    internal void Say(string line)
    {
        _error.WriteLine(line);
    }

    internal void Instruct(IReadOnlyList<string> instructions)
    {
        foreach (string line in instructions)
        {
            TextTable.WriteWrapped(_error, "  ", "    ", line);
        }
    }

    internal void Report(WaitProgress wait)
    {
        bool due = _step != wait.Step || EverySeconds <= (wait.SampleTimeUtc - _told).TotalSeconds;
        if (!due)
        {
            return;
        }

        _step = wait.Step;
        _told = wait.SampleTimeUtc;
        string left = wait.SecondsLeft is double seconds ? "; about " + Clock(seconds) + " left" : "";
        string moving = wait.Moving.Count == 0 ? "" : "; " + string.Join(", ", wait.Moving);
        _error.WriteLine($"{Name(wait.Step)}: {Clock(wait.ElapsedSeconds)}, {Number.Print(wait.Samples)} {(wait.Samples == 1 ? "sample" : "samples")}, signal {Number.Fixed(wait.Signal, 3)}, {Number.Fixed(wait.TemperatureCelsius, 2)} °C{moving}{left}");
    }

    internal void Taken(RecordedPoint point)
    {
        string error = point.ErrorMilligramsPerLitre is double off ? $", off by {(off < 0 ? "" : "+")}{Number.Fixed(off, 3)} mg/L" : "";
        _error.WriteLine($"{CalibrationText.Role(point)} point taken: {(point.Typed ? "shown" : "signal")} {Number.Fixed(point.Signal.Mean, 3)} at {Number.Fixed(point.Temperature.Value, 2)} °C, reference {Number.Fixed(point.ReferenceMilligramsPerLitre, 2)} mg/L{error}");
    }

    private static string Name(CalibrationStep step)
    {
        return step switch
        {
            CalibrationStep.Zero => "zero point",
            CalibrationStep.AsLeft => "as left",
            _ => "100 % point",
        };
    }

    private static string Clock(double seconds)
    {
        int whole = (int)Math.Min(Math.Round(Math.Max(0, seconds)), 359_999);
        return TimeSpan.FromSeconds(whole).ToString(whole < 3600 ? "m\\:ss" : "h\\:mm\\:ss", System.Globalization.CultureInfo.InvariantCulture);
    }
}

/// <summary>A calibration without anybody to ask: reasons and readings come from options, or not at all.</summary>
internal sealed class UnattendedDialogue(CalibrationProgress progress, Func<CalibrationStep, double?> reading) : ICalibrationDialogue
{
    public void Say(string line)
    {
        progress.Say(line);
    }

    public void Report(WaitProgress wait)
    {
        progress.Report(wait);
    }

    public void Taken(RecordedPoint point)
    {
        progress.Taken(point);
    }

    public Task ReadyAsync(CalibrationStep step, IReadOnlyList<string> instructions, CancellationToken cancellationToken)
    {
        progress.Instruct(instructions);
        return Task.CompletedTask;
    }

    public Task<string> DropletsAsync(IReadOnlyList<string> instructions, CancellationToken cancellationToken)
    {
        progress.Say("note: nobody looks for droplets in an unattended calibration; the record says so");
        return Task.FromResult(Droplets.NotChecked);
    }

    public Task<string?> ReasonAsync(Finding finding, CancellationToken cancellationToken)
    {
        return Task.FromResult<string?>(null);
    }

    public Task<double?> ReadingAsync(CalibrationStep step, string unit, IReadOnlyList<string> instructions, CancellationToken cancellationToken)
    {
        progress.Instruct(instructions);
        return Task.FromResult(reading(step));
    }
}

/// <summary>A calibration with a person at the terminal.</summary>
internal sealed class InteractiveDialogue(CalibrationProgress progress, Questions questions, Func<CalibrationStep, double?> reading, Func<string, double> readShown) : ICalibrationDialogue
{
    private static readonly string[] Yes = ["y", "yes"];
    private static readonly string[] No = ["n", "no"];

    public void Say(string line)
    {
        progress.Say(line);
    }

    public void Report(WaitProgress wait)
    {
        progress.Report(wait);
    }

    public void Taken(RecordedPoint point)
    {
        progress.Taken(point);
    }

    public async Task ReadyAsync(CalibrationStep step, IReadOnlyList<string> instructions, CancellationToken cancellationToken)
    {
        progress.Instruct(instructions);
        await questions.EnterAsync("Press Enter when it is so.", cancellationToken).ConfigureAwait(false);
    }

    public async Task<string> DropletsAsync(IReadOnlyList<string> instructions, CancellationToken cancellationToken)
    {
        progress.Instruct(instructions);
        bool seen = await questions.AskAsync("Droplets on membrane or thermometer (yes or no)?", YesOrNo, cancellationToken).ConfigureAwait(false);
        if (seen)
        {
            progress.Say("Wipe them off; the point is taken again.");
        }

        return seen ? Droplets.Seen : Droplets.NoneSeen;
    }

    public async Task<string?> ReasonAsync(Finding finding, CancellationToken cancellationToken)
    {
        progress.Say(finding.Sentence);
        string reason = await questions.AskAsync("If it is right all the same, say why (empty stops):", static text => text, cancellationToken).ConfigureAwait(false);
        return reason.Length == 0 ? null : reason;
    }

    public async Task<double?> ReadingAsync(CalibrationStep step, string unit, IReadOnlyList<string> instructions, CancellationToken cancellationToken)
    {
        progress.Instruct(instructions);
        return reading(step)
            ?? await questions.AskAsync($"What does the meter show, in {unit}?", readShown, cancellationToken).ConfigureAwait(false);
    }

    private static bool YesOrNo(string text)
    {
        string answer = text.ToLowerInvariant();
        if (Array.IndexOf(Yes, answer) >= 0)
        {
            return true;
        }

        return Array.IndexOf(No, answer) >= 0 ? false : throw new InputException($"'{Wrong.Shown(text)}' is neither yes nor no");
    }
}
