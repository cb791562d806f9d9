using System;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// The budget of a slope and its check by drawing, as every calibration makes it: the two standard uncertainties must agree within a stated tolerance,
/// or the record gets a finding.
/// </summary>
/// <param name="Table">The contributions, largest first.</param>
/// <param name="Text">How the check came out, for the record; null where nothing was adjusted and so nothing checked.</param>
/// <param name="Disagreement">What is said when the two disagree; null when they agree.</param>
internal sealed record CheckedBudget(RecordedContribution[] Table, string? Text, Finding? Disagreement)
{
    /// <summary>Seed of every check.</summary>
    public const int Seed = 101;

    /// <summary>The budget of a calibration; a check of a calibration in force has that one's.</summary>
    internal static CheckedBudget Of(CalibrationSetup setup, RecordedPoint slopePoint, Fit fit, ProbeCalibration calibration, CalibrationRecord? previous)
    {
        if (setup.Purpose == CalibrationRecord.CheckPurpose)
        {
            return new CheckedBudget(previous?.Budget ?? [], null, null);
        }

        if (fit.Several is RecordedFit several)
        {
            double? drawnFit = SeveralPointsBudget.DrawnPercent(setup, fit.Fitted, several, SeveralPointsBudget.Trials, new Random(Seed));
            return Judged(
                SeveralPointsBudget.Of(setup, fit.Fitted, several), SeveralPointsBudget.TotalPercent(setup, several), drawnFit, SeveralPointsBudget.Trials, SeveralPointsBudget.TolerancePercent);
        }

        RecordedContribution[] table = SlopeBudget.Of(setup, slopePoint, fit.Zero, calibration);
        double? drawn = SlopeBudget.DrawnPercent(setup, slopePoint, fit.Zero, calibration, table, SlopeBudget.Trials, new Random(Seed));
        return Judged(table, 100 * calibration.SlopeRelativeUncertainty(), drawn, SlopeBudget.Trials, SlopeBudget.TolerancePercent);
    }

    /// <summary>The two standard uncertainties beside each other.</summary>
    internal static CheckedBudget Judged(RecordedContribution[] table, double analyticPercent, double? drawnPercent, int trials, double tolerancePercent)
    {
        string drawn = drawnPercent is double percent ? Finding.Text($"{percent:F3} %") : "no value";
        string text = Finding.Text(
            $"Monte Carlo check of the slope's standard uncertainty (JCGM 101:2008): {drawn} in {trials} trials, seed {Seed}, against {analyticPercent:F3} % by the budget (tolerance {tolerancePercent} %)");
        bool agree = drawnPercent is double found && Math.Abs(found - analyticPercent) <= tolerancePercent / 100 * analyticPercent;
        return new CheckedBudget(table, text, agree ? null : new Finding(
            GuardNames.UncertaintyCheck,
            FindingSeverity.Note,
            text,
            PossibleError.Unknown("readings are not wrong by this, but the uncertainty stated with them is"),
            "take the larger of the two; an input whose uncertainty is a large part of its value is the usual reason"));
    }
}
