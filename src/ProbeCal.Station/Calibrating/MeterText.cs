using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>What to set in a meter before its reading as left is taken.</summary>
internal static class MeterText
{
    internal static string Set(CalibrationSetup setup, RecordedPoint span)
    {
        (double value, double uncertainty) = Fitting.ValueToSet(setup, span);
        RecordedMeterSettings? meter = setup.Probe.MeterSettings;
        string unit = meter?.Shows switch
        {
            "%local" => "% of local saturation",
            "%1atm" => "% of saturation at 1 atm",
            string other => other,
            null => "",
        };
        // No digit that the display does not have.
        int decimals = meter is { Resolution: >= 0.1 } ? 1 : 2;
        return $"Set the meter to {Number.Fixed(value, decimals)} {unit} (standard uncertainty {Number.Fixed(uncertainty, 2)}), wait until it is steady, and read it again.";
    }
}
