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
    private readonly bool _inHectopascal;
    private ProcedureStep? _step;
    private DateTimeOffset _told;

    /// <param name="error">Where to.</param>
    /// <param name="inHectopascal">True where errors are those of a pressure, see <see cref="ErrorScale"/>.</param>
    internal CalibrationProgress(TextWriter error, bool inHectopascal)
    {
        _error = error;
        _inHectopascal = inHectopascal;
    }

    internal void Say(string line)
    {
        _error.WriteLine(line);
    }

    /// <summary>Shows a step of a procedure: what it is, what to do, what to beware of, how long it takes.</summary>
    internal void Instruct(ProcedureStep step)
    {
        ProcedureText.Write(_error, step, withSource: false);
    }

    internal void Report(WaitProgress wait)
    {
        bool due = _step?.Id != wait.Step.Id || EverySeconds <= (wait.SampleTimeUtc - _told).TotalSeconds;
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
        string error = _inHectopascal
            ? point.ErrorHectopascal is double hectopascal ? $", off by {CalibrationText.Signed(hectopascal, 2)} hPa" : ""
            : point.ErrorMilligramsPerLitre is double off ? $", off by {CalibrationText.Signed(off, 3)} mg/L" : "";
        string reference = _inHectopascal ? $"{Number.Fixed(point.ReferencePartialPressureHectopascal, 2)} hPa" : $"{Number.Fixed(point.ReferenceMilligramsPerLitre, 2)} mg/L";
        _error.WriteLine($"{CalibrationText.Role(point)} point taken: {(point.Typed ? "shown" : "signal")} {Number.Fixed(point.Signal.Mean, 3)} at {Number.Fixed(point.Temperature.Value, 2)} °C, reference {reference}{error}");
    }

    private static string Name(ProcedureStep step)
    {
        return step.Role switch
        {
            CalibrationIds.ZeroPoint => "zero point",
            CalibrationIds.AsLeftPoint => "as left",
            CalibrationIds.SpanPoint => "100 % point",
            string level => level + " point",
            null => step.Title,
        };
    }

    private static string Clock(double seconds)
    {
        int whole = (int)Math.Min(Math.Round(Math.Max(0, seconds)), 359_999);
        return TimeSpan.FromSeconds(whole).ToString(whole < 3600 ? "m\\:ss" : "h\\:mm\\:ss", System.Globalization.CultureInfo.InvariantCulture);
    }
}

/// <summary>A calibration without anybody to ask: reasons and readings come from options, or not at all.</summary>
internal sealed class UnattendedDialogue(CalibrationProgress progress, Func<ProcedureStep, double?> reading) : ICalibrationDialogue
{
    /// <summary>What the record says of a step that no person has done or looked at.</summary>
    internal const string NotConfirmed = "unattended: no person confirmed it";

    private readonly HashSet<string> _cautioned = [];

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

    public Task<string?> DoAsync(ProcedureStep step, CancellationToken cancellationToken)
    {
        // Whoever started the script may stand beside the probe all the same.
        foreach (string caution in step.Cautions)
        {
            if (_cautioned.Add(caution))
            {
                progress.Say("Caution: " + caution);
            }
        }

        return Task.FromResult<string?>(NotConfirmed);
    }

    public Task<string> DropletsAsync(ProcedureStep step, CancellationToken cancellationToken)
    {
        progress.Say("note: nobody looks for droplets in an unattended calibration; the record says so");
        return Task.FromResult(Droplets.NotChecked);
    }

    public Task<string?> ReasonAsync(Finding finding, CancellationToken cancellationToken)
    {
        return Task.FromResult<string?>(null);
    }

    public Task<double?> ReadingAsync(ProcedureStep step, string unit, CancellationToken cancellationToken)
    {
        progress.Instruct(step);
        return Task.FromResult(reading(step));
    }

    public Task<PlannedPoint?> ReferenceAsync(ProcedureStep step, PlannedPoint planned, CancellationToken cancellationToken)
    {
        return Task.FromResult<PlannedPoint?>(null);
    }
}

/// <summary>A calibration with a person at the terminal.</summary>
/// <param name="progress">Where lines go.</param>
/// <param name="questions">Who asks.</param>
/// <param name="reading">Readings given as options.</param>
/// <param name="readShown">Reads what a meter shows.</param>
/// <param name="readReference">Reads what the truth of a planned point rests on.</param>
internal sealed class InteractiveDialogue(
    CalibrationProgress progress, Questions questions, Func<ProcedureStep, double?> reading, Func<string, double> readShown, Func<PlannedPoint, string, PlannedPoint?> readReference) : ICalibrationDialogue
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

    public async Task<string?> DoAsync(ProcedureStep step, CancellationToken cancellationToken)
    {
        progress.Instruct(step);
        if (step.WriteDown == null)
        {
            await questions.EnterAsync(step.Role != null ? "Press Enter when it is so." : "Press Enter when it is done.", cancellationToken).ConfigureAwait(false);
            return null;
        }

        string note = await questions.AskAsync("Write down (Enter for nothing):", static text => PlainText.OneLine("note", text), cancellationToken).ConfigureAwait(false);
        return note.Length == 0 ? null : note;
    }

    public async Task<string> DropletsAsync(ProcedureStep step, CancellationToken cancellationToken)
    {
        progress.Instruct(step);
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

    public async Task<double?> ReadingAsync(ProcedureStep step, string unit, CancellationToken cancellationToken)
    {
        progress.Instruct(step);
        return reading(step)
            ?? await questions.AskAsync($"What does the meter show, in {unit}?", readShown, cancellationToken).ConfigureAwait(false);
    }

    public async Task<PlannedPoint?> ReferenceAsync(ProcedureStep step, PlannedPoint planned, CancellationToken cancellationToken)
    {
        string question = planned.Method == MethodIds.Titration
            ? "Titres and what they rest on (for example 8.02mL,8.05mL,8.03mL flask 300.2mL titrant 0.025mol/L u 0.0001mol/L drawn 20.1C; Enter when not titrated yet)?"
            : "What did the standard show (for example STD-3 8.41mg/L u 0.05mg/L; Enter when nobody has read it yet)?";
        return await questions.AskAsync(question, text => text.Length == 0 ? null : readReference(planned, text), cancellationToken).ConfigureAwait(false);
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
