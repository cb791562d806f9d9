using System.Collections.Generic;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>Lets guards look, tells what they see, and asks for the reasons that some findings need.</summary>
internal sealed class GuardDesk
{
    private readonly CalibrationSession _session;
    private readonly ICalibrationDialogue _dialogue;
    private readonly HashSet<string> _told = [];
    private readonly Dictionary<string, string> _reasons;

    internal GuardDesk(CalibrationSession session, ICalibrationDialogue dialogue)
    {
        _session = session;
        _dialogue = dialogue;
        _reasons = new Dictionary<string, string>(session.Setup.Reasons);
    }

    /// <summary>Lets all guards look at a situation.</summary>
    /// <exception cref="InputException">What was entered cannot be, or wants a reason that nobody gave.</exception>
    /// <exception cref="WorkFailedException">The same about the fit, which nobody entered.</exception>
    internal async Task PassAsync(IReadOnlyList<Guard> guards, Situation situation, bool aboutEntries, CancellationToken cancellationToken)
    {
        // A note made before the first sample could not say how large the error would be; it is made again with the sample.
        bool early = situation.TemperatureCelsius == null || situation.PressureHectopascal == null;
        foreach (Guard guard in guards)
        {
            if (guard.Look(situation) is Finding finding && !(early && finding.Severity == FindingSeverity.Note))
            {
                await ResolveAsync(finding, aboutEntries, cancellationToken).ConfigureAwait(false);
            }
        }
    }

    private async Task ResolveAsync(Finding finding, bool aboutEntries, CancellationToken cancellationToken)
    {
        if (finding.Severity == FindingSeverity.Refuse)
        {
            throw Stop(finding, finding.Sentence, aboutEntries);
        }

        string? reason = null;
        bool asked = false;
        if (finding.Severity == FindingSeverity.NeedsReason)
        {
            reason = _reasons.GetValueOrDefault(finding.Guard);
            if (reason == null)
            {
                reason = await _dialogue.ReasonAsync(finding, cancellationToken).ConfigureAwait(false);
                asked = true;
            }

            if (string.IsNullOrWhiteSpace(reason))
            {
                throw Stop(finding, $"{finding.Sentence}; if it is right all the same, say why: --confirm {finding.Guard}=\"REASON\"", aboutEntries);
            }

            _reasons[finding.Guard] = reason;
        }

        _session.Keep(finding, reason);
        if (_told.Add(finding.Guard))
        {
            // Whoever was just asked has read the whole of it.
            _dialogue.Say(reason == null ? "note: " + finding.Sentence : $"accepted: {(asked ? finding.Guard : finding.Sentence)} (reason: {reason})");
        }
    }

    private static System.Exception Stop(Finding finding, string line, bool aboutEntries)
    {
        string whole = $"{finding.Guard}: {line}";
        return aboutEntries ? new InputException(whole) : new WorkFailedException(whole);
    }
}
