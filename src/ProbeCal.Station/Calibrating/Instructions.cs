using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// What to do, look for and beware of at each step, as data. Waits and order from the field manual (TM 9-A6.2) where it has
/// them; the cautions are those of docs/safety.md.
/// </summary>
internal static class Instructions
{
    private static readonly string[] Water =
    [
        "Air-saturated water: aerate for 30 min or more, then stop the air and let bubbles rise; bubbles released under water supersaturate it.",
        "Put the probe in, not over bubbles, with none on the membrane; keep the water moving as a probe of this kind needs it; shade it.",
        "Caution: at open water wear a lifejacket and do not work alone.",
    ];

    private static readonly string[] Air =
    [
        "Water-saturated air: wet the chamber, drain it to a film, wipe drops off membrane and thermometer, put the probe in and leave the cap loose.",
        "Keep sun and wind off; vapour and temperature take 5 to 10 min.",
    ];

    private static readonly string[] Zero =
    [
        "Zero point: put the probe into fresh zero solution (about 2 g sodium sulfite in 1 L of water) or under flowing nitrogen; take a wiper off first.",
        "Caution: sulfite irritates, some people react strongly to it: gloves and goggles, read its safety data sheet, keep acid away.",
        "Caution: nitrogen suffocates without warning: ventilate, chain the cylinder, use an oxygen alarm.",
    ];

    private static readonly string[] WaterAgain = ["Leave the probe in the air-saturated water: fresh readings now check the new calibration (as left)."];
    private static readonly string[] AirAgain = ["Leave the probe in the chamber, or put it back as before: fresh readings now check the new calibration (as left)."];

    private static readonly string[] AfterZero =
    [
        "Rinse the probe several times with clean water (what is left of the zero solution would bias the next reading low), then put it back as for the 100 % point.",
    ];

    private static readonly string[] LookForDroplets =
    [
        "Take the probe out and look at membrane and thermometer: a drop on either spoils the point.",
    ];

    /// <summary>The instructions of a step.</summary>
    public static IReadOnlyList<string> For(SessionState state, CalibrationStep step)
    {
        bool air = state.Setup.Method == CalibrationIds.WaterSaturatedAir;
        return step switch
        {
            CalibrationStep.Span => air ? Air : Water,
            CalibrationStep.Droplets => LookForDroplets,
            CalibrationStep.Zero => Zero,
            CalibrationStep.AsLeft when Fitting.Point(state.Points, CalibrationIds.ZeroPoint) != null => AfterZero,
            CalibrationStep.AsLeft => air ? AirAgain : WaterAgain,
            _ => [],
        };
    }

    /// <summary>What to set in a meter before its reading as left is taken.</summary>
    internal static string SetMeter(CalibrationSetup setup, RecordedPoint span)
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
