using System.Collections.Generic;

namespace ProbeCal.Station.Correcting;

/// <summary>An error of the probe at one moment, in every form that it is taken back in.</summary>
/// <param name="Slope">Reading over truth: 1 without an error.</param>
/// <param name="Zero">For drift, change of the response in gas-free water, in the response's unit; for fouling, reading in it, mg/L.</param>
/// <param name="MilligramsPerLitre">The error as TM 1-D3 has it, to be added, mg/L.</param>
/// <param name="Percent">The same in per cent of the reading.</param>
internal sealed record ErrorState(double Slope, double Zero, double MilligramsPerLitre, double Percent)
{
    /// <summary>No error.</summary>
    internal static ErrorState Nothing { get; } = new(1, 0, 0, 0);
}

/// <summary>An error that grows linearly in time from an onset to a visit, and the time in which rows are corrected by it.</summary>
/// <param name="FromTicks">First moment, ticks of UTC.</param>
/// <param name="ToTicks">Moment at which it no longer applies.</param>
/// <param name="OnsetTicks">When it began: the last visit or calibration, or an event that was identified.</param>
/// <param name="VisitTicks">When it was found.</param>
/// <param name="Start">The error at the onset.</param>
/// <param name="End">The error at the visit.</param>
/// <param name="Found">Id of the entry of the log that found it.</param>
/// <param name="Held">True behind the last check, where the error is held as it was found last.</param>
internal sealed record ErrorRamp(
    long FromTicks, long ToTicks, long OnsetTicks, long VisitTicks, ErrorState Start, ErrorState End, string Found, bool Held)
{
    /// <summary>The ramp for a time; null when there is none. Ramps follow one another and do not overlap.</summary>
    internal static ErrorRamp? At(IReadOnlyList<ErrorRamp> ramps, long ticks)
    {
        int low = 0, high = ramps.Count - 1;
        while (low <= high)
        {
            int middle = (low + high) / 2;
            ErrorRamp ramp = ramps[middle];
            if (ticks < ramp.FromTicks)
            {
                high = middle - 1;
            }
            else if (ramp.ToTicks <= ticks)
            {
                low = middle + 1;
            }
            else
            {
                return ramp;
            }
        }

        return null;
    }
}
