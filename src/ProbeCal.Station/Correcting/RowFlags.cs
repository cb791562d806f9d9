using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Engine;

namespace ProbeCal.Station.Correcting;

/// <summary>What there is to know about a corrected row, in the words of its status.</summary>
internal static class RowFlags
{
    internal const string NotBracketed = "not between two passing checks";

    private static readonly Dictionary<(Status Status, string Form), string> Words = [];

    /// <summary>Sets the flags of what was corrected last; false when there is no value at all.</summary>
    internal static bool Set(RowCorrector corrector, ServicePlan plan, long utcTicks, RowStatus status)
    {
        Reading reading = corrector.Reading;
        Status ofPressure = reading.StatusOf(ReadingQuantity.PartialPressure);
        if (double.IsNaN(reading.Value(ReadingQuantity.PartialPressure)))
        {
            status.Refuse(Word(ofPressure, ""));
            return false;
        }

        if (ofPressure != Status.Ok)
        {
            status.Flag(Word(ofPressure, " so it is extrapolated"));
        }

        Status ofConcentration = reading.StatusOf(ReadingQuantity.MilligramsPerLitre);
        if (ofConcentration != Status.Ok && ofConcentration != ofPressure && StatusParts.Reason(ofConcentration) != RefusalReason.NotFinite)
        {
            status.Flag(Word(ofConcentration, double.IsNaN(reading.Value(ReadingQuantity.MilligramsPerLitre)) ? " so there is no concentration" : ""));
        }

        CalibrationInUse calibration = corrector.Calibration;
        if (utcTicks < calibration.Record.CompletedUtc.UtcTicks)
        {
            status.Flag("taken before its calibration was made");
        }

        if (calibration.StirringDiffers)
        {
            status.Flag("stirred otherwise than at its calibration");
        }

        BracketVerdict brackets = plan.Brackets.At(new DateTimeOffset(utcTicks, TimeSpan.Zero), reading.Value(ReadingQuantity.MilligramsPerLitre));
        if (!brackets.InTime)
        {
            status.Flag(NotBracketed);
        }
        else if (!brackets.InRange)
        {
            status.Flag("outside the range of the checks around it");
        }

        if (!plan.IsEmpty)
        {
            OfService(corrector, plan, utcTicks, status);
        }

        return true;
    }

    private static void OfService(RowCorrector corrector, ServicePlan plan, long utcTicks, RowStatus status)
    {
        for (int i = 0; i < plan.AtService.Count; i++)
        {
            if (plan.AtService[i].FromTicks < utcTicks && utcTicks < plan.AtService[i].ToTicks)
            {
                status.Flag("somebody was at the probe");
            }
        }

        if (corrector.DriftRamp is { Held: true })
        {
            status.Flag("drift held as it was last found");
        }

        if (plan.LastVisitTicks != 0 && plan.LastVisitTicks < utcTicks)
        {
            status.Flag("after the last visit so fouling is not known");
        }

        if (corrector.Rating == Rating.ConsiderDeletion && !double.IsNaN(corrector.Corrected))
        {
            status.Flag("corrected by more than is allowed");
        }
    }

    private static string Word(Status status, string behind)
    {
        lock (Words)
        {
            if (!Words.TryGetValue((status, behind), out string? word))
            {
                word = ReadingFlags.Explain(status) + behind;
                Words.Add((status, behind), word);
            }

            return word;
        }
    }
}
